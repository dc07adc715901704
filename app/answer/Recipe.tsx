import { memo } from 'react';
import type { BlendOutcome, OmittedProduct, Order } from '../../src';
import { LazyViscosityChart } from '../chart/LazyViscosityChart';
import { OtherRecipes } from '../explain/OtherRecipes';
import { Rounded } from '../explain/Rounded';
import { WhatWouldChange } from '../explain/WhatWouldChange';
import { Section } from '../parts/Section';
import styles from './AnswerPanel.module.css';
import { apiGroupsInWords } from './apiGroups';
import { Cautions, TrialCalls } from './Cautions';
import { Cost } from './Cost';
import { gradesInWords } from './gradesInWords';
import { PropertyTable } from './PropertyTable';
import { RecipeTable } from './RecipeTable';
import { recipeRows } from './recipeRows';
import { recipeText } from './recipeText';
import { SpreadTable } from './SpreadTable';

/** A recipe and everything said of it; nothing where there is none. Drawn anew for another answer only. */
export const Recipe = memo(function Recipe({
  orderId,
  title,
  proof,
  order,
  outcome,
  omitted,
  laboratoryOnly,
  currency,
}: {
  orderId: string;
  /** Name of the order, and what is proven: both go with a recipe that is copied. */
  title: string;
  proof: string;
  order: Order;
  outcome: BlendOutcome;
  omitted: readonly OmittedProduct[];
  laboratoryOnly: readonly string[];
  currency: string;
}) {
  if (!outcome.recipe) return null;
  const { rows, totals, batch } = recipeRows(order, outcome);
  const { cautions, leftOut } = outcome;
  const remarks = [...cautions, ...omitted, ...leftOut].map(({ message }) => message);
  return (
    <>
      <Cost outcome={outcome} order={order} batch={batch} currency={currency} />
      <TrialCalls cautions={cautions} />
      <RecipeTable
        rows={rows}
        totals={totals}
        batch={batch}
        text={() => recipeText({ title, proof, remarks, rows, totals, batch })}
      />
      <Rounded orderId={orderId} title={title} batchTonnes={order.batchTonnes} />
      <Section title="Viscosity and temperature" level={3} className={styles.part}>
        <LazyViscosityChart order={order} outcome={outcome} />
      </Section>
      <Section title="Predicted properties" level={3} className={styles.part}>
        <p className={styles.grades}>{gradesInWords(outcome)}</p>
        <Cautions cautions={cautions} />
        <PropertyTable order={order} outcome={outcome} laboratoryOnly={laboratoryOnly} />
        <SpreadTable spread={outcome.properties?.spread ?? []} ownRule={order.viscosityRule ?? 'wright'} />
        <p className={styles.soft}>
          API groups of the stocks, by mass: {apiGroupsInWords(order, outcome.recipe)}. The groups class stocks, not
          mixes.
        </p>
      </Section>
      <WhatWouldChange orderId={orderId} />
      <OtherRecipes orderId={orderId} />
    </>
  );
});
