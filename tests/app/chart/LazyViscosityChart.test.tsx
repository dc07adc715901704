import { render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { LazyViscosityChart } from '../../../app/chart/LazyViscosityChart';
import { kinematicViscosityAt } from '../../../src';
import { answered, stockThrough, THICK, THIN } from './chartOrders';

/** Recharts is fetched first, which takes its time where the machine is busy. */
const PATIENCE = { timeout: 30_000 };
const KV40_LIMIT = { limits: [{ property: 'kv', celsius: 40, min: 60, max: 90 }] };

describe('the viscosity-temperature chart', () => {
  it('draws the mix, its stocks with their names, and the limits', async () => {
    const { order, outcome } = answered([THIN, THICK], [0.5, 0.5], KV40_LIMIT);
    render(<LazyViscosityChart order={order} outcome={outcome} />);
    const chart = await screen.findByRole('img', { name: /Viscosity against temperature/ }, PATIENCE);
    for (const name of ['Mix', 'Thin', 'Thick']) expect(within(chart).getByText(name)).toBeInTheDocument();
    // A solid and two dashed parts for the mix and either stock, drawn with four pens.
    const curves = [...chart.querySelectorAll('.recharts-line-curve')];
    expect(curves).toHaveLength(4);
    expect(curves.flatMap((curve) => curve.getAttribute('d')?.match(/M/g) ?? [])).toHaveLength(9);
    expect(chart.querySelectorAll('.recharts-reference-area')).toHaveLength(1);
    expect(within(chart).getByText('40')).toBeInTheDocument();
  });

  it('says the same as a table', () => {
    const { order, outcome } = answered([THIN, THICK], [0.5, 0.5]);
    render(<LazyViscosityChart order={order} outcome={outcome} />);
    const table = screen.getByRole('table', { hidden: true });
    const thin = within(table).getByRole('row', { name: /^Thin/, hidden: true });
    const cells = within(thin).getAllByRole('cell', { hidden: true });
    const headings = within(table).getAllByRole('columnheader', { hidden: true });
    const place = headings.findIndex(({ textContent }) => textContent === '20 °C') - 1;
    const points = [
      { celsius: 40, kv: 17.4 },
      { celsius: 100, kv: 3.95 },
    ];
    expect(cells[place]).toHaveTextContent(kinematicViscosityAt(20, points).toFixed(2));
    expect(cells[place]).toHaveClass('extrapolated');
  });

  it('says what is missing where there is no line to draw', () => {
    const { order, outcome } = answered([stockThrough('One', [{ celsius: 40, kv: 30 }])], [1]);
    render(<LazyViscosityChart order={order} outcome={outcome} />);
    expect(screen.getByText(/viscosities at two temperatures are needed/)).toBeInTheDocument();
    expect(screen.queryByRole('img')).not.toBeInTheDocument();
  });

  it('names a limit that stands in the order twice once', () => {
    const limits = [...KV40_LIMIT.limits, ...KV40_LIMIT.limits];
    const { order, outcome } = answered([THIN, THICK], [0.5, 0.5], { limits });
    render(<LazyViscosityChart order={order} outcome={outcome} />);
    expect(screen.getAllByText('Limit at 40 °C: 60.00 to 90.00 mm²/s')).toHaveLength(1);
  });
});
