import { memo } from 'react';
import { type BlendOutcome, type Order, predictBlend, type RecipeInSteps } from '../../src';
import { CopyRecipe } from '../answer/CopyRecipe';
import { recipeRows } from '../answer/recipeRows';
import { recipeText } from '../answer/recipeText';
import { formatNumber } from '../parts/numberText';
import { Select } from '../parts/Select';
import { setRounding } from '../state/explaining';
import { type Rounding, useExplain, useExplained } from '../state/explainStore';
import { roundingsOf } from '../state/rounding';
import { useWorkbook } from '../state/workbookStore';
import { costPer, difference } from './costWords';
import styles from './Explain.module.css';
import { namesOf } from './stockNames';
import { Told } from './Told';

/** The recipe in amounts that can be weighed, and what the rounding costs. */
export const Rounded = memo(function Rounded({
  orderId,
  title,
  batchTonnes,
}: {
  orderId: string;
  title: string;
  batchTonnes: Order['batchTonnes'];
}) {
  const rounding = useExplain((state) => state.rounding);
  const roundedTo = useExplain(({ explained }) => explained[orderId]?.roundedTo);
  const { part, stale, due } = useExplained(orderId, 'rounded');
  const choices = roundingsOf({ batchTonnes });
  const chosen = choices.includes(rounding) ? rounding : '';
  return (
    <>
      <Select
        label="Round to what can be weighed"
        inline
        value={chosen === '' ? 'no' : chosen}
        options={[
          { value: 'no', label: 'not rounded' },
          ...choices.map((choice) => ({ value: choice, label: roundingInWords(choice) })),
        ]}
        onChange={(choice) => setRounding(choice === 'no' ? '' : choice)}
      />
      {chosen !== '' && (
        <Told part={roundedTo === chosen ? part : undefined} stale={stale} due={due} waiting="Rounding the recipe …">
          {(rounded, { order: explained, outcome }) => (
            <RoundedRecipe rounded={rounded} rounding={chosen} title={title} order={explained} outcome={outcome} />
          )}
        </Told>
      )}
    </>
  );
});

/** "0.1 %", "5 kg", in the user's own decimal sign. */
function roundingInWords(rounding: Rounding): string {
  const [size = '', unit = ''] = rounding.split(' ');
  return `${formatNumber(Number(size), size.split('.')[1]?.length ?? 0)} ${unit}`;
}

function decimals(rounding: Rounding): number {
  return rounding.split(' ')[0]?.split('.')[1]?.length ?? 0;
}

const MOST_DIGITS = 6;

/** A weighed amount with every decimal it has: what is off its step must not look as if it were on it. */
export function everyDigit(value: number, least: number): string {
  let digits = least;
  while (digits < MOST_DIGITS && Math.abs(Number(value.toFixed(digits)) - value) > 1e-7) digits++;
  return formatNumber(value, digits);
}

/** The mix that the rounded shares make, as an outcome whose rows can be shown and copied. */
function outcomeOfRounded({ recipe, costPerTonne }: RecipeInSteps, order: Order, outcome: BlendOutcome): BlendOutcome {
  const { viscosityRule, depressant, ownProperties } = order;
  const properties = predictBlend(order.stocks, recipe, { viscosityRule, depressant, ownProperties });
  return { ...outcome, recipe, costPerTonne, properties };
}

function RoundedRecipe({
  rounded,
  rounding,
  title,
  order,
  outcome,
}: {
  rounded: RecipeInSteps | undefined;
  rounding: Rounding;
  title: string;
  order: Order;
  outcome: BlendOutcome;
}) {
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const to = roundingInWords(rounding);
  if (!rounded) return <p>No recipe in steps of {to} was found that meets the order. Try a finer step.</p>;
  const { rows, totals, batch } = recipeRows(order, outcomeOfRounded(rounded, order, outcome));
  const proof = rounded.proven ? 'proven best' : 'not proven best';
  const inKilograms = rounding.endsWith('kg');
  const percentDigits = inKilograms ? 2 : decimals(rounding);
  const kilogramDigits = inKilograms ? decimals(rounding) : 0;
  const offStep = rounded.offStep.length > 0 && `Not in steps of ${to}: ${namesOf(order, rounded.offStep)}.`;
  const text = () =>
    recipeText({
      title: `${title}, rounded to ${to}`,
      proof: `In steps of ${to}, ${proof} of the recipes in these steps.`,
      remarks: offStep ? [offStep] : [],
      rows,
      totals,
      batch,
    });
  return (
    <>
      <table className={styles.table}>
        <caption className="visually-hidden">Recipe rounded to {to}</caption>
        <thead>
          <tr>
            <th scope="col">Rounded to {to}</th>
            <th scope="col">% mass</th>
            <th scope="col">kg</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ stockId, name, massFraction, kilograms }) => (
            <tr key={stockId}>
              <th scope="row">{name}</th>
              <td>{everyDigit(massFraction * 100, percentDigits)}</td>
              <td>{everyDigit(kilograms, kilogramDigits)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p>
        <b>{costPer(rounded.costPerTonne, currency)}</b>; rounding costs {difference(rounded.roundingCosts, currency)};{' '}
        {proof} in these steps.
      </p>
      {offStep && <p className={styles.soft}>{offStep}</p>}
      <p className={styles.row}>
        <span className={styles.soft}>Kilograms {batch.words}.</span>
        <CopyRecipe text={text} label="Copy rounded recipe" />
      </p>
    </>
  );
}
