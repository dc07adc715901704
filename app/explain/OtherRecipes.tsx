import { memo } from 'react';
import type { Alternative, Alternatives, BlendOutcome, Order, Product } from '../../src';
import { Button } from '../parts/Button';
import { formatNumber } from '../parts/numberText';
import { Section } from '../parts/Section';
import { useExplained } from '../state/explainStore';
import { useWorkbook } from '../state/workbookStore';
import { added, costPer } from './costWords';
import styles from './Explain.module.css';
import { nameOf, namesOf } from './stockNames';
import { Told } from './Told';
import { productsToKeepOut, stocksToKeepOut, takeAlternative } from './takeAlternative';

/** Recipes that do without a stock of the cheapest, with what they cost more. */
export const OtherRecipes = memo(function OtherRecipes({ orderId }: { orderId: string }) {
  const { part, stale, due } = useExplained(orderId, 'alternatives');
  return (
    <Section title="Other recipes" level={3} className={styles.part}>
      <Told part={part} stale={stale} due={due} waiting="Looking for other recipes …">
        {(alternatives, { order, outcome }) => (
          <List orderId={orderId} alternatives={alternatives} order={order} outcome={outcome} stale={stale} />
        )}
      </Told>
    </Section>
  );
});

function endInWords({ list, stopped }: Alternatives): string | undefined {
  if (stopped !== 'finished') return 'The time ran out: there may be more.';
  return list.length === 0 ? 'No other set of stocks within 5 % of this cost.' : undefined;
}

function List({
  orderId,
  alternatives,
  order,
  outcome,
  stale,
}: {
  orderId: string;
  alternatives: Alternatives;
  order: Order;
  outcome: BlendOutcome;
  stale: boolean;
}) {
  const products = useWorkbook(({ workbook }) => workbook.products);
  const end = endInWords(alternatives);
  return (
    <>
      <ol className={styles.choices}>
        {alternatives.list.map((alternative, place) => (
          <Choice
            key={alternative.recipe.map(({ stockId }) => stockId).join('\n')}
            orderId={orderId}
            alternative={alternative}
            order={order}
            keepOut={stocksToKeepOut(outcome, alternatives.list, place)}
            products={products}
            stale={stale}
          />
        ))}
      </ol>
      {end && <p className={styles.soft}>{end}</p>}
    </>
  );
}

/** "SN 150 64.74 %, SN 500 34.21 %": largest share first. */
export function sharesInWords({ recipe }: Pick<Alternative, 'recipe'>, order: Order): string {
  return recipe
    .filter(({ massFraction }) => massFraction > 0)
    .toSorted((a, b) => b.massFraction - a.massFraction)
    .map(({ stockId, massFraction }) => `${nameOf(order, stockId)} ${formatNumber(massFraction * 100, 2)} %`)
    .join(', ');
}

/** "without SN 500; Bright stock instead". */
export function differenceInWords({ without, instead }: Alternative, order: Order): string {
  const out = `without ${namesOf(order, without)}`;
  return instead.length > 0 ? `${out}; ${namesOf(order, instead)} instead` : out;
}

function Choice({
  orderId,
  alternative,
  order,
  keepOut,
  products,
  stale,
}: {
  orderId: string;
  alternative: Alternative;
  order: Order;
  keepOut: readonly string[];
  products: readonly Product[];
  stale: boolean;
}) {
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const used = alternative.recipe.map(({ stockId }) => stockId);
  const productIds = productsToKeepOut(products, keepOut, used);
  const words = differenceInWords(alternative, order);
  return (
    <li className={styles.choice}>
      <p>
        <b>{costPer(alternative.costPerTonne, currency)}</b>, {added(alternative.dearerBy, currency)}: {words}
        {!alternative.proven && ' (not proven to be the next cheapest)'}
      </p>
      <p className={styles.soft}>{sharesInWords(alternative, order)}</p>
      {productIds ? (
        <Button
          disabled={stale}
          aria-label={`Use instead: the recipe ${words}`}
          title={`Keeps ${namesOf(order, keepOut)} out of this order`}
          onClick={() => takeAlternative(orderId, productIds)}
        >
          Use instead
        </Button>
      ) : (
        <p className={styles.soft}>It differs in the lots of a product, which cannot be kept out one by one.</p>
      )}
    </li>
  );
}
