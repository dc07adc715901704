import type { BlendOutcome, Order } from '../../src';
import { classNames } from '../parts/classNames';
import { figureKey } from '../stocks/productFigures';
import styles from './PropertyTable.module.css';
import { type PropertyRow, propertyRows } from './propertyRows';
import { otherRules } from './ruleSpread';

/** What the mix is predicted to be, against the limits. A prediction: passing is for the laboratory. */
export function PropertyTable({
  order,
  outcome,
  laboratoryOnly,
}: {
  order: Order;
  outcome: BlendOutcome;
  laboratoryOnly: readonly string[];
}) {
  const rule = order.viscosityRule ?? 'wright';
  const spread = new Map(
    (outcome.properties?.spread ?? []).map((entry) => [figureKey(entry), otherRules(entry, rule)]),
  );
  return (
    <table className={styles.table}>
      <caption className="visually-hidden">Predicted properties of the mix</caption>
      <thead>
        <tr>
          <th scope="col">Property</th>
          <th scope="col">Mix</th>
          <th scope="col">Limit</th>
        </tr>
      </thead>
      <tbody>
        {propertyRows(order, outcome).map((row) => (
          <Row key={row.key} row={row} others={spread.get(row.key)} />
        ))}
        {laboratoryOnly.map((test) => (
          <tr key={test} className={styles.unlimited}>
            <th scope="row">{test}</th>
            <td colSpan={2} className={styles.laboratory}>
              laboratory only
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Row({ row, others }: { row: PropertyRow; others: string | undefined }) {
  return (
    <tr className={classNames(row.limits.length === 0 && styles.unlimited)}>
      <th scope="row" title={row.fullName}>
        {row.name}
        {row.asTheRest.length > 0 && (
          <span className={styles.small} title={row.asTheRest.join(', ')}>
            {row.asTheRest.length === 1 ? 'one stock' : `${row.asTheRest.length} stocks`} as the rest
          </span>
        )}
        {others && <span className={styles.small}>other rules: {others}</span>}
      </th>
      <td className={styles.value} title={row.estimated}>
        {row.estimated && (
          <>
            <span aria-hidden="true">≈ </span>
            <span className="visually-hidden">estimated: </span>
          </>
        )}
        <b>{row.value}</b> {row.value !== '–' && <span className={styles.unit}>{row.unit}</span>}
      </td>
      <td>
        {row.unknown && <span className={styles.unknown}>{row.unknown}</span>}
        {row.limits.map(({ place, range, room, tone }) => (
          <span key={place} className={styles.limit}>
            {range}
            <span className={classNames(styles.room, styles[tone])}>{room}</span>
          </span>
        ))}
      </td>
    </tr>
  );
}
