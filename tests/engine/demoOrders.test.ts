import { describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../app/demo/demoWorkbook';
import { type BlendOutcome, solveBlend, toOrder, type WorkbookOrder } from '../../src';

/**
 * The demo's least costs [€/t], found with an independent slice search (D341 lines, Wright blending, pour points with
 * depressant where an order uses it) and written down to the euro before this solver existed.
 */
const WITHIN = 0.001;

async function solve(id: string, change: (order: WorkbookOrder) => void = () => {}): Promise<BlendOutcome> {
  const workbook = demoWorkbook();
  const order = workbook.orders.find((candidate) => candidate.id === id);
  if (!order) throw new Error(`The demo has no order "${id}".`);
  change(order);
  return solveBlend(toOrder(workbook, order).order);
}

function setLimit(property: string, ends: { min?: number; max?: number }) {
  return (order: WorkbookOrder) => {
    const limit = order.limits.find((candidate) => candidate.property === property);
    if (!limit) throw new Error(`The order has no limit on ${property}.`);
    Object.assign(limit, ends);
  };
}

const share = (outcome: BlendOutcome, stockId: string) =>
  outcome.recipe?.find((line) => line.stockId === stockId)?.massFraction ?? 0;

describe('the least costs of the demo', () => {
  const cases: [name: string, id: string, cost: number, change?: (order: WorkbookOrder) => void][] = [
    ['VG 46 hydraulic oil', 'vg-46-hydraulic', 913],
    ['VG 46 hydraulic oil with VI 105', 'vg-46-hydraulic', 968, setLimit('vi', { min: 105 })],
    ['driveline base', 'driveline-6', 1182],
    ['driveline base to -39 °C', 'driveline-6', 1374, setLimit('pourPoint', { max: -39 })],
    ['driveline base to -42 °C', 'driveline-6', 1562, setLimit('pourPoint', { max: -42 })],
    ['driveline base to -45 °C', 'driveline-6', 1734, setLimit('pourPoint', { max: -45 })],
    [
      'driveline base to -30 °C without depressant',
      'driveline-6',
      1724,
      (order) => {
        order.depressant = false;
        setLimit('pourPoint', { max: -30 })(order);
      },
    ],
    ['multigrade base', 'multigrade-base', 1461],
    ['VG 320 synthetic gear oil', 'vg-320-synthetic', 3378],
    ['thin base at Noack 11', 'impossible-base', 2116, setLimit('noack', { max: 11 })],
    ['thin base at Noack 12', 'impossible-base', 2009, setLimit('noack', { max: 12 })],
    ['VG 220 mineral gear oil', 'vg-220-mineral', 1132],
    ['VG 220 mineral gear oil, bright stock short', 'vg-220-short', 1417],
  ];

  test.each(cases)('%s', async (_name, id, cost, change) => {
    const outcome = await solve(id, change);
    expect(outcome.stopped).toBe('finished');
    expect(outcome.proof.kind).toBe('least cost');
    expect(Math.abs((outcome.costPerTonne ?? Number.NaN) / cost - 1)).toBeLessThan(WITHIN);
  });

  test.each([8, 9, 10])('nothing is within reach of the thin base at Noack %d', async (noack) => {
    const outcome = await solve('impossible-base', setLimit('noack', { max: noack }));
    expect(outcome.stopped).toBe('finished');
    expect(outcome.proof.kind).toBe('impossible');
    expect(outcome.recipe).toBeUndefined();
    expect(outcome.costPerTonne).toBeUndefined();
  });
});

describe('the demo orders tell their story', () => {
  test('the hydraulic oil is SN 150 with SN 500', async () => {
    const outcome = await solve('vg-46-hydraulic');
    expect(share(outcome, 'sn-150') + share(outcome, 'sn-500')).toBeCloseTo(1 - 0.0085 - 0.002, 6);
  });

  test('the concentrate of the multigrade base sits at its cap', async () => {
    expect(share(await solve('multigrade-base'), 'ocp-concentrate')).toBeCloseTo(0.12, 6);
  });

  test('the synthetic gear oil is two thirds PAO 40, and asks for a trial blend', async () => {
    const outcome = await solve('vg-320-synthetic');
    expect(Math.abs(share(outcome, 'pao-40') - 2 / 3)).toBeLessThan(0.02);
    expect(outcome.cautions.map(({ kind }) => kind)).toContain('trial blend');
  });

  test('the mineral gear oil is half bright stock, and mPAO comes in where that is short', async () => {
    expect(Math.abs(share(await solve('vg-220-mineral'), 'bright-stock') - 0.5)).toBeLessThan(0.02);
    const short = await solve('vg-220-short');
    expect(share(short, 'bright-stock')).toBeCloseTo(0.3, 6);
    expect(share(short, 'mpao-100')).toBeGreaterThan(0.05);
  });

  test('every demo order can be solved on lots too', async () => {
    const workbook = demoWorkbook();
    for (const order of workbook.orders) {
      const { order: engineOrder, omitted } = toOrder(workbook, { ...order, solveOn: 'lots' });
      expect(omitted).toEqual([]);
      const outcome = await solveBlend(engineOrder);
      expect(outcome.problems).toEqual([]);
      expect(outcome.stopped).toBe('finished');
    }
  });
});
