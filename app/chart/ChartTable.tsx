import { formatNumber } from '../parts/numberText';
import { ScrollRegion } from '../parts/ScrollRegion';
import { figureText } from '../stocks/figureText';
import styles from './ViscosityChart.module.css';
import { isExtrapolated, kvOnLine, type ViscosityLine } from './viscosityLines';
import type { ViscosityWindow } from './viscosityWindows';

const TEMPERATURES = [-30, -20, 0, 20, 40, 60, 80, 100, 120, 150];
const KV = { id: 'kv', digits: 2 };

/** The same as the chart, in numbers. */
export function ChartTable({
  lines,
  windows,
}: {
  lines: readonly ViscosityLine[];
  windows: readonly ViscosityWindow[];
}) {
  return (
    <details className={styles.data}>
      <summary>The chart as a table</summary>
      <ScrollRegion className={styles.scroll} name="The chart as a table">
        <table>
          <caption className="visually-hidden">Kinematic viscosity in mm²/s</caption>
          <thead>
            <tr>
              <th scope="col">mm²/s at</th>
              {TEMPERATURES.map((celsius) => (
                <th scope="col" key={celsius}>
                  {formatNumber(celsius, 0)} °C
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {lines.map((line) => (
              <tr key={line.id}>
                <th scope="row">{line.name}</th>
                {TEMPERATURES.map((celsius) => (
                  <td key={celsius} className={isExtrapolated(line, celsius) ? styles.extrapolated : undefined}>
                    {figureText(KV, kvOnLine(line, celsius))}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </ScrollRegion>
      <p className={styles.note}>In italics: extrapolated.</p>
      {windowTexts(windows).map((text) => (
        <p key={text} className={styles.note}>
          {text}
        </p>
      ))}
    </details>
  );
}

/** Each window once: two limits may say the same. */
function windowTexts(windows: readonly ViscosityWindow[]): string[] {
  return [...new Set(windows.map((window) => `${window.name}: ${windowText(window)}`))];
}

function windowText({ min, max }: ViscosityWindow): string {
  const text = (kv: number) => figureText(KV, kv);
  if (min !== undefined && max !== undefined) return `${text(min)} to ${text(max)} mm²/s`;
  return min === undefined ? `at most ${text(max ?? 0)} mm²/s` : `at least ${text(min)} mm²/s`;
}
