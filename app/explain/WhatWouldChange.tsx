import { memo } from 'react';
import type { Explanation, Order } from '../../src';
import { Disclosure } from '../answer/Disclosure';
import { formatMoney } from '../parts/money';
import { Section } from '../parts/Section';
import { useExplained } from '../state/explainStore';
import { useWorkbook } from '../state/workbookStore';
import { costUnit } from './costWords';
import styles from './Explain.module.css';
import { nameOf } from './stockNames';
import { byNearness, entryInWords, lossInWords, standsInWords } from './stockWords';
import { Told } from './Told';

/** Unused stocks shown at once; more are unfolded. */
const NEAREST = 6;

/** What each stock in use is worth to the recipe, and what would bring another one in. */
export const WhatWouldChange = memo(function WhatWouldChange({ orderId }: { orderId: string }) {
  const { part, stale, due } = useExplained(orderId, 'recipe');
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  return (
    <Section title="What would change it" level={3} className={styles.part}>
      <Told part={part} stale={stale} due={due} waiting="Working out what would change it …">
        {(explanation, { order }) => <Stocks explanation={explanation} order={order} currency={currency} />}
      </Told>
    </Section>
  );
});

function Stocks({ explanation, order, currency }: { explanation: Explanation; order: Order; currency: string }) {
  const { used, entries, stopped } = explanation;
  const nearest = byNearness(entries);
  // One more is no less than a line that unfolds it.
  const shown = entries.length === NEAREST + 1 ? entries.length : NEAREST;
  const largestFirst = used.toSorted((a, b) => b.massFraction - a.massFraction);
  const props = { order, currency };
  return (
    <>
      {used.length > 0 && (
        <table className={styles.table}>
          <caption>Stocks in use</caption>
          <thead>
            <tr>
              <th scope="col">Stock</th>
              <th scope="col">recipe stands at, {currency}/t</th>
              <th scope="col">without it</th>
            </tr>
          </thead>
          <tbody>
            {largestFirst.map((stock) => (
              <tr key={stock.stockId}>
                <th scope="row">{nameOf(order, stock.stockId)}</th>
                <td>{standsInWords(stock, currency)}</td>
                <td>{lossInWords(stock, currency, costUnit(order))}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {entries.length > 0 && <EntryTable {...props} caption="Stocks not in use" entries={nearest.slice(0, shown)} />}
      {entries.length > shown && (
        <Disclosure title={`${entries.length - shown} more stocks not in use`}>
          <EntryTable {...props} caption="More stocks not in use" entries={nearest.slice(shown)} />
        </Disclosure>
      )}
      <p className={styles.soft}>
        One price changed, the others as they are. “Without it” is the cost of the cheapest recipe without the stock,
        less the cost of this one.
        {stopped !== 'finished' && ' The time ran out before all of it was worked out.'}
      </p>
    </>
  );
}

function EntryTable({
  entries,
  caption,
  order,
  currency,
}: {
  entries: Explanation['entries'];
  caption: string;
  order: Order;
  currency: string;
}) {
  return (
    <table className={styles.table}>
      <caption>{caption}</caption>
      <thead>
        <tr>
          <th scope="col">Stock</th>
          <th scope="col">price, {currency}/t</th>
          <th scope="col">comes in, {currency}/t</th>
        </tr>
      </thead>
      <tbody>
        {entries.map((entry) => (
          <tr key={entry.stockId}>
            <th scope="row">{nameOf(order, entry.stockId)}</th>
            <td>{formatMoney(entry.pricePerTonne, currency)}</td>
            <td>
              {entryInWords(entry, currency)}
              {hasSteps(order, entry.stockId) && <span className={styles.soft}> (its price steps as much lower)</span>}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function hasSteps({ stocks }: Order, stockId: string): boolean {
  return (stocks.find(({ id }) => id === stockId)?.priceSteps?.length ?? 0) > 0;
}
