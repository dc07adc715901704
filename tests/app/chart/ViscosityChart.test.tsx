import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { ChartTable } from '../../../app/chart/ChartTable';
import { plotSize } from '../../../app/chart/chartLayout';
import { chartScene } from '../../../app/chart/chartScene';
import ViscosityChart from '../../../app/chart/ViscosityChart';
import { viscosityLines } from '../../../app/chart/viscosityLines';
import { viscosityWindows } from '../../../app/chart/viscosityWindows';
import { mixOf, orderOf } from '../answer/answers';

const order = orderOf({ limits: [{ property: 'kv', celsius: 40, min: 30, max: 40 }] });
const lines = viscosityLines(order, mixOf());
const windows = viscosityWindows(order, mixOf());

/** How many lines the paths draw: each begins with a move. */
function partsOf(container: HTMLElement, selector: string): number {
  const paths = [...container.querySelectorAll(selector)];
  return paths.reduce((count, path) => count + (path.getAttribute('d')?.match(/M/g)?.length ?? 0), 0);
}

describe('the viscosity-temperature chart', () => {
  it('names every line, dashes the extrapolated parts, draws the limit, and brings no style element along', () => {
    const { container } = render(<ViscosityChart scene={chartScene(lines, windows, plotSize(400))} width={400} />);
    for (const name of ['Mix', 'Light oil', 'Heavy oil']) expect(screen.getByText(name)).toBeInTheDocument();
    // Two dashed parts and a solid one for the mix and either stock.
    expect(partsOf(container, '.line.dashed:not(.mix) path')).toBe(4);
    expect(partsOf(container, '.line:not(.dashed):not(.mix) path')).toBe(2);
    expect(partsOf(container, '.line.dashed.mix path')).toBe(2);
    expect(partsOf(container, '.line.mix:not(.dashed) path')).toBe(1);
    expect(container.querySelectorAll('.limit path')).toHaveLength(1);
    // The content security policy allows no style element.
    expect(document.querySelectorAll('style')).toHaveLength(0);
  });
});

describe('the chart as a table', () => {
  it('gives every line at every temperature, the extrapolated ones in another type', () => {
    render(<ChartTable lines={lines} windows={windows} />);
    const row = screen.getByRole('row', { name: /^Light oil/, hidden: true });
    expect(row).toHaveTextContent('20.00');
    const [coldest] = row.querySelectorAll('td');
    expect(coldest).toHaveClass('extrapolated');
    expect(screen.getByText('Limit at 40 °C: 30.00 to 40.00 mm²/s')).toBeInTheDocument();
  });
});
