import { expect, test } from 'vitest';
import { type Dose, type Order, solveBlend } from '../../../src/index';
import { demoStock, plainOrder, shareOf, solved } from './plainOrder';

const PACKAGE = 'gear package';

function withPackage(dose: Omit<Dose, 'stockId'>): Order {
  const { stocks, limits } = plainOrder();
  return { stocks: [...stocks, demoStock(PACKAGE)], limits, doses: [{ stockId: PACKAGE, ...dose }] };
}

test.each([undefined, null, 7, 'linear'])('an own property whose rule is %s is refused', async (rule) => {
  const own = { id: 'biobased', label: 'Biobased carbon', unit: '% m/m', rule, digits: 0 };
  const order = { ...plainOrder(), ownProperties: [own] } as unknown as Order;
  order.limits.push({ property: 'biobased', max: 50 });
  for (const stock of order.stocks) stock.figures.push({ property: 'biobased', value: 20, origin: 'typical' });
  expect((await solveBlend(order)).stopped).toBe('refused');
});

test.each([null, {}, 5])('flags that are %s are refused', async (flags) => {
  const order = {
    ...plainOrder(),
    shares: [{ kind: 'share', set: { flag: 'no zinc' }, max: 0.5 }],
  } as unknown as Order;
  Object.assign(order.stocks[0], { flags });
  expect((await solveBlend(order)).stopped).toBe('refused');
});

test('a ratio too great for any engine is refused', async () => {
  const order = plainOrder();
  order.shares = [{ kind: 'ratio', set: { families: ['PAO'] }, to: { families: ['ester'] }, max: 1e308 }];
  expect((await solveBlend(order)).stopped).toMatch(/refused|finished/);
});

test('a trace counted on the base oil counts as one of its family', async () => {
  const order = withPackage({ exactly: 2e-5, of: 'base oil' });
  order.shares = [{ kind: 'count', set: { families: ['package'] }, min: 1 }];
  expect(shareOf(await solved(order), PACKAGE)).toBeCloseTo(2e-5, 8);
});

test('a required trace counted on the base oil is kept', async () => {
  const share = shareOf(await solved(withPackage({ required: true, max: 5e-5, of: 'base oil' })), PACKAGE);
  expect(share).toBeGreaterThan(0);
  expect(share).toBeLessThanOrEqual(5e-5 + 1e-9);
});

test('a required stock that a share rule holds to a trace is used in a trace', async () => {
  const order = plainOrder();
  order.doses = [{ stockId: 'PAO 4', required: true }];
  order.shares = [{ kind: 'share', set: { stockIds: ['PAO 4'] }, max: 5e-5 }];
  expect(shareOf(await solved(order), 'PAO 4')).toBeGreaterThan(0);
});

test('a required stock whose least dose is above what may be taken "as the rest": no proof without reserve', async () => {
  const order = withPackage({ required: true });
  order.limits.push({ property: 'noack', max: 20 });
  const stocks = order.stocks.map((stock) => (stock.id === PACKAGE ? { ...stock, leastDoseIfUsed: 0.05 } : stock));
  const { stopped, proof } = await solveBlend({ ...order, stocks });
  if (stopped !== 'refused') expect(proof.kind).toBe('impossible with known figures');
});
