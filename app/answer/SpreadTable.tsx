import { type RuleSpread, VISCOSITY_RULES } from '../../src';
import { limitName } from '../parts/limitWords';
import styles from './AnswerPanel.module.css';
import { Disclosure } from './Disclosure';
import { ruleLabel, spreadText } from './ruleSpread';

/** What each blending rule says of the viscosities: how far apart they lie hints at the model's own error. */
export function SpreadTable({ spread, ownRule }: { spread: readonly RuleSpread[]; ownRule: string }) {
  if (spread.length === 0) return null;
  const heading = ({ property, celsius }: RuleSpread) => (property === 'vi' ? 'VI' : `KV${celsius}`);
  return (
    <Disclosure title="The same recipe under other blending rules">
      <table className={styles.plainTable}>
        <thead>
          <tr>
            <th scope="col">Rule</th>
            {spread.map((entry) => (
              <th scope="col" key={heading(entry)} title={limitName(entry)}>
                {heading(entry)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {VISCOSITY_RULES.map((rule) => (
            <tr key={rule}>
              <th scope="row">
                {ruleLabel(rule)}
                {rule === ownRule && <span className={styles.soft}> · this order’s</span>}
              </th>
              {spread.map((entry) => (
                <td key={heading(entry)}>{spreadText(entry, rule)}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <p className={styles.soft}>
        How far the rules lie apart hints at the error of any of them. The cube root is far too thick for unlike stocks
        by its nature.
      </p>
    </Disclosure>
  );
}
