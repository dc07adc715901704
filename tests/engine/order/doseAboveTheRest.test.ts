import { expect, test } from 'vitest';
import { type Dose, type Order, solveBlend } from '../../../src/index';
import { expectConsistent } from '../optimum/consistency';
import { demoStock, plainOrder, shareOf, solved } from './plainOrder';

const PACKAGE = 'gear package';

/** A package that takes the volatility of the rest, in an order that limits volatility. */
function withPackage(dose: Omit<Dose, 'stockId'>, greatestDoseAsTheRest?: number): Order {
  const { stocks, limits } = plainOrder();
  return {
    stocks: [...stocks, demoStock(PACKAGE)],
    limits: [...limits, { property: 'noack', max: 12 }],
    doses: [{ stockId: PACKAGE, ...dose }],
    ...(greatestDoseAsTheRest === undefined ? {} : { greatestDoseAsTheRest }),
  };
}

test.each<[string, Omit<Dose, 'stockId'>]>([
  ['an exact dose', { exactly: 0.065 }],
  ['a least dose', { min: 0.065, max: 0.08 }],
])('%s above what may be taken "as the rest" is refused at the figure, both percentages named', async (_, dose) => {
  const outcome = await solveBlend(withPackage(dose));
  expectConsistent(outcome);
  expect(outcome.stopped).toBe('refused');
  expect(outcome.problems).toHaveLength(1);
  const [{ path, message }] = outcome.problems;
  expect(path).toEqual(['stocks', PACKAGE, 'noack']);
  expect(message).toMatch(/gear package/);
  expect(message).toMatch(/\b2 %/);
  expect(message).toMatch(/\b6\.5 %/);
});

test('the same order is solved once the dose allowed is raised', async () => {
  const outcome = await solved(withPackage({ exactly: 0.065 }, 0.07));
  expect(shareOf(outcome, PACKAGE)).toBeCloseTo(0.065, 9);
  expect(outcome.cautions.some(({ kind, message }) => kind === 'as the rest' && /gear package/.test(message))).toBe(
    true,
  );
});

test('a dose that is not compulsory is none to refuse', async () => {
  expect(shareOf(await solved(withPackage({ min: 0.065, required: false })), PACKAGE)).toBe(0);
});

test('where nothing limited is taken from the rest, any dose will do', async () => {
  const order = withPackage({ exactly: 0.065 });
  order.limits.pop();
  expect(shareOf(await solved(order), PACKAGE)).toBeCloseTo(0.065, 9);
});

test('a proof that leans on the dose allowed is one with known figures', async () => {
  const order = withPackage({ max: 1 });
  order.shares = [{ kind: 'share', set: { families: ['package'] }, min: 0.05 }];
  const outcome = await solveBlend(order);
  expectConsistent(outcome);
  expect(outcome).toMatchObject({ stopped: 'finished', leftOut: [] });
  expect(outcome.proof.kind).toBe('impossible with known figures');
  expect((await solveBlend({ ...order, greatestDoseAsTheRest: 0.06 })).recipe).toBeDefined();
});

test('a proof in an order where nothing is taken from the rest is one without reserve', async () => {
  const limits = [
    { property: 'kv', celsius: 100, max: 4 },
    { property: 'kv', celsius: 40, min: 60 },
    { property: 'noack', max: 60 },
  ];
  expect((await solveBlend({ ...plainOrder(), limits })).proof.kind).toBe('impossible');
});
