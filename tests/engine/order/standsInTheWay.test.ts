import { expect, test } from 'vitest';
import { type Order, type ShareRule, type Stock, solveBlend } from '../../../src/index';
import { demo, expectConsistent } from '../optimum/consistency';
import { demoStock, plainOrder } from './plainOrder';

/** A thin and a thick oil in a mix that needs a good deal of the thick one. */
function thick(changes: Partial<Stock>): Order {
  return {
    stocks: [demoStock('PAO 4'), { ...demoStock('PAO 40'), ...changes }],
    limits: [{ property: 'kv', celsius: 100, min: 10 }],
  };
}

async function waysOf(order: Order): Promise<{ limits: number[]; rules: string[] }> {
  const outcome = await solveBlend(order);
  expectConsistent(outcome);
  expect(outcome.proof.kind).toMatch(/^impossible/);
  return { limits: outcome.conflict ?? [], rules: outcome.conflictRules ?? [] };
}

test('without anything in the way the order has a recipe', async () => {
  expect((await solveBlend(thick({}))).recipe).toBeDefined();
});

test.each<[string, Order]>([
  ['too little on hand', { ...thick({ availableTonnes: 1 }), batchTonnes: 20 }],
  [
    'too little on hand for the smallest batch',
    { ...thick({ availableTonnes: 1 }), batchTonnes: { min: 20, max: 40 } },
  ],
  ['its greatest dose', thick({ greatestDose: 0.05 })],
  ['the dose of the order', { ...thick({}), doses: [{ stockId: 'PAO 40', max: 0.05 }] }],
])('%s: the stock and the percentage are named, and the limit', async (_, order) => {
  const { limits, rules } = await waysOf(order);
  expect(limits).toEqual([0]);
  expect(rules).toHaveLength(1);
  expect(rules[0]).toMatch(/^PAO 40\b.*at most 5 %/);
});

test('doses of more than the whole: each with its percentage', async () => {
  const order = plainOrder();
  order.limits = [];
  order.doses = [
    { stockId: 'PAO 4', exactly: 0.6 },
    { stockId: 'PAO 6', exactly: 0.5 },
  ];
  const { limits, rules } = await waysOf(order);
  expect(limits).toEqual([]);
  expect(rules.some((rule) => /^PAO 4\b.*\b60 %/.test(rule))).toBe(true);
  expect(rules.some((rule) => /^PAO 6\b.*\b50 %/.test(rule))).toBe(true);
});

test('a least dose above the greatest: both percentages', async () => {
  const order = thick({ greatestDose: 0.05 });
  order.limits = [];
  order.doses = [{ stockId: 'PAO 40', min: 0.1 }];
  const { rules } = await waysOf(order);
  expect(rules).toEqual([expect.stringMatching(/^PAO 40\b.*\b10 %.*\b5 %/)]);
});

test('a share rule is told in words', async () => {
  expect((await waysOf(demo('impossible at 10'))).rules).toContain('ester at most 15 % of the mix');
});

test.each<[string, ShareRule[], string]>([
  [
    'a share of the base oil',
    [
      { kind: 'share', set: { stockIds: ['PAO 40'] }, min: 0.3, of: 'base oil' },
      { kind: 'share', set: { stockIds: ['PAO 40'] }, max: 0.1 },
    ],
    'PAO 40 at least 30 % of the base oil',
  ],
  [
    'a ratio',
    [
      { kind: 'ratio', set: { families: ['ester'] }, to: { families: ['PAO'] }, min: 1 },
      { kind: 'share', set: { families: ['ester'] }, max: 0.1 },
      { kind: 'share', set: { families: ['PAO'] }, min: 0.2 },
    ],
    'ester to PAO in a ratio of at least 1',
  ],
  [
    'a count',
    [
      { kind: 'count', set: { families: ['PAO'] }, max: 1 },
      { kind: 'share', set: { stockIds: ['PAO 4'] }, min: 0.2 },
      { kind: 'share', set: { stockIds: ['PAO 6'] }, min: 0.2 },
    ],
    'at most 1 of PAO',
  ],
  [
    'stocks that exclude each other',
    [
      { kind: 'excludes', stockId: 'PAO 4', set: { stockIds: ['PAO 6'] } },
      { kind: 'share', set: { stockIds: ['PAO 4'] }, min: 0.2 },
      { kind: 'share', set: { stockIds: ['PAO 6'] }, min: 0.2 },
    ],
    'PAO 4 not together with PAO 6',
  ],
])('%s is told in words, and what is not in the way is not', async (_, shares, words) => {
  const harmless: ShareRule = { kind: 'share', set: { families: ['Group I'] }, max: 0.95 };
  // A proof may lean on a limit too where it could do without: the smallest set is for the explanation to find.
  const { rules } = await waysOf({ ...plainOrder(), shares: [...shares, harmless] });
  expect(rules).toContain(words);
  expect(rules.filter((rule) => /Group I\b/.test(rule))).toEqual([]);
});
