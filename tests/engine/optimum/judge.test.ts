import { expect, test } from 'vitest';
import { type BlendOutcome, solveBlend } from '../../../src/index';
import { sliceSearch } from '../../oracle/sliceSearch';
import { demo } from './consistency';
import { type Case, differences } from './judge';

const order = demo('driveline -39');
const entry: Case = { name: 'driveline', order, expected: { status: 'solved', cost: sliceSearch(order).cost } };
const good = await solveBlend(order);
const cost = good.costPerTonne ?? Number.NaN;

test('the judge passes a right answer', () => {
  expect(differences(entry, good)).toEqual([]);
});

test.each<[string, BlendOutcome, RegExp]>([
  ['a cost 1e-5 too high', { ...good, costPerTonne: cost * (1 + 1e-5) }, /^cost .* against .* relative/],
  ['a cost 1e-5 too low', { ...good, costPerTonne: cost * (1 - 1e-5) }, /^cost/],
  ['a bound 2e-6 too high', { ...good, proof: { ...good.proof, lowerBound: cost * (1 + 2e-6) } }, /^bound/],
  ['a missing bound', { ...good, proof: { kind: 'least cost' } }, /^bound/],
  ['no proof', { ...good, proof: { ...good.proof, kind: 'within gap' } }, /^not proven/],
  ['a claim of impossibility', { ...good, recipe: undefined, proof: { kind: 'impossible' } }, /^no recipe/],
  [
    'a recipe off the limits',
    { ...good, recipe: [{ stockId: 'PAO 4', massFraction: 1 }] },
    /^misses .*reporting units/,
  ],
])('the judge sees %s', (_, outcome, words) => {
  const found = differences(entry, outcome);
  expect(
    found.some((difference) => words.test(difference)),
    found.join('; '),
  ).toBe(true);
});

test('the judge sees a recipe where none can be', () => {
  expect(differences({ ...entry, expected: { status: 'impossible' } }, good)).toHaveLength(1);
});
