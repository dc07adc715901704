import { useDeferredValue } from 'react';
import type { BlendOutcome, Order } from '../../src';
import { LazyViscosityChart } from '../chart/LazyViscosityChart';
import { Section } from '../parts/Section';
import styles from './AnswerPanel.module.css';
import { apiGroupsInWords } from './apiGroups';
import { Cautions } from './Cautions';
import { Cost } from './Cost';
import { PropertyTable } from './PropertyTable';
import { RecipeTable } from './RecipeTable';
import { recipeRows } from './recipeRows';
import { SpreadTable } from './SpreadTable';

/** A recipe and everything said of it. Only ever drawn where there is one. */
export function Recipe({
  order,
  outcome,
  laboratoryOnly,
  currency,
}: {
  order: Order;
  outcome: BlendOutcome & Required<Pick<BlendOutcome, 'recipe'>>;
  laboratoryOnly: readonly string[];
  currency: string;
}) {
  const { rows, totals, batch } = recipeRows(order, outcome);
  // The chart may lag behind while a limit is dragged; numbers may not.
  const charted = useDeferredValue(outcome);
  const chartedOrder = useDeferredValue(order);
  return (
    <>
      <Cost outcome={outcome} order={order} batch={batch} currency={currency} />
      <Cautions cautions={outcome.cautions} />
      <RecipeTable rows={rows} totals={totals} batch={batch} />
      <Section title="Predicted properties" level={3} className={styles.part}>
        <PropertyTable order={order} outcome={outcome} laboratoryOnly={laboratoryOnly} />
        <SpreadTable spread={outcome.properties?.spread ?? []} ownRule={order.viscosityRule ?? 'wright'} />
        <p className={styles.soft}>
          API groups of the stocks, by mass: {apiGroupsInWords(order, outcome.recipe)}. The groups class stocks, not
          mixes.
        </p>
      </Section>
      <Section title="Viscosity and temperature" level={3} className={styles.part}>
        <LazyViscosityChart order={chartedOrder} outcome={charted} />
      </Section>
    </>
  );
}
