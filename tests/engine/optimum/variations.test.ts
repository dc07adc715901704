import { expect, test } from 'vitest';
import { type Order, solveBlend, type ViscosityRule } from '../../../src/index';
import { Draw } from '../../oracle/mulberry32';
import { CONTINUOUS, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { type Case, caseOf, disagreements, seeds } from './judge';

/** Cases of a variation: orders changed by `change`, with the slice search's answer. */
function varied(count: number, from: number, change: (order: Order, draw: Draw) => void): Case[] {
  return seeds(count, from).flatMap((seed) => {
    const order = randomOrder(seed, { ...CONTINUOUS, stocks: [3, 9] });
    change(order, new Draw(seed));
    return caseOf(`seed ${seed}`, order, sliceSearch(order)) ?? [];
  });
}

function solvable(cases: readonly Case[]): number {
  return cases.filter(({ expected }) => expected.status === 'solved').length;
}

async function expectAgreement(cases: readonly Case[]): Promise<void> {
  expect(await disagreements(solveBlend, cases)).toEqual([]);
  expect(solvable(cases)).toBeGreaterThan(cases.length / 4);
}

test.each<ViscosityRule>(['walther', 'refutas', 'logarithmic', 'cube root'])('viscosity rule %s', async (rule) => {
  const cases = varied(16, 11_001, (order, draw) => {
    order.viscosityRule = rule;
    if (draw.chance(0.4)) draw.pick(order.stocks).blendWeight = draw.between(0.6, 1.6);
    for (const limit of order.limits) if (limit.property === 'vi' && limit.min) limit.min -= 5;
  });
  await expectAgreement(cases);
});

test('a greatest viscosity index, alone or with a least one', async () => {
  const cases = varied(30, 12_001, (order, draw) => {
    for (const limit of order.limits) {
      if (limit.property !== 'vi' || limit.min === undefined) continue;
      limit.max = limit.min + draw.between(0, 2);
      if (draw.chance(0.5)) limit.min = undefined;
      else limit.min -= draw.between(0, 4);
    }
  });
  await expectAgreement(cases);
});

test('strict limits, margins and weights of trial blends', async () => {
  const cases = varied(30, 13_001, (order, draw) => {
    draw.pick(order.stocks).blendWeight = draw.between(0.6, 1.6);
    for (const limit of order.limits) {
      if (limit.property === 'kv') limit.insideBy = (limit.min ?? 0) * draw.between(0, 0.02);
      if (limit.property === 'noack' && limit.max !== undefined) {
        limit.below = draw.chance(0.5) ? true : limit.max;
      }
      if (limit.property === 'vi') limit.insideBy = draw.between(0, 1);
    }
  });
  await expectAgreement(cases);
});

test('viscosity limited at other temperatures', async () => {
  const cases = varied(24, 14_001, (order, draw) => {
    const kv40 = order.stocks.map((stock) => stock.figures.find((f) => f.celsius === 40)?.value ?? 1);
    const middle = Math.exp(kv40.reduce((sum, kv) => sum + Math.log(kv), 0) / kv40.length);
    const celsius = draw.pick([20, 60, 120]);
    const thick = middle * (celsius === 20 ? 3.2 : celsius === 60 ? 0.45 : 0.1);
    order.limits.push({ property: 'kv', celsius, max: thick * draw.between(0.8, 2) });
  });
  await expectAgreement(cases);
});

test('cheapest per cubic metre', async () => {
  let solved = 0;
  for (const seed of seeds(40, 15_001)) {
    const order: Order = { ...randomOrder(seed, { ...CONTINUOUS, stocks: [3, 9] }), costBasis: 'cubic metre' };
    const answer = sliceSearch(order);
    const outcome = await solveBlend(order);
    if (answer.status !== 'solved') {
      expect(outcome.proof.kind, `seed ${seed}`).toBe('impossible');
      continue;
    }
    solved++;
    expect(outcome.proof.kind, `seed ${seed}`).toBe('least cost');
    const cost = outcome.costPerCubicMetre ?? Number.NaN;
    expect(Math.abs(cost / answer.cost - 1), `seed ${seed}: ${cost} against ${answer.cost}`).toBeLessThan(5e-6);
    expect(outcome.proof.lowerBound, `seed ${seed}`).toBeLessThanOrEqual(answer.cost * (1 + 1e-6));
  }
  expect(solved).toBeGreaterThan(15);
});

/** Second way for drums: every number of drums in turn, as an exact dose. */
function cheapestByDrums(order: Order, stockId: string, share: number) {
  let best = { status: 'impossible' as 'impossible' | 'solved', cost: Infinity };
  for (let drums = 0; drums * share <= 1 + 1e-9; drums++) {
    const plain: Order = structuredClone(order);
    for (const stock of plain.stocks) stock.lotTonnes = undefined;
    plain.doses = [...(plain.doses ?? []), { stockId, exactly: Math.min(1, drums * share) }];
    const answer = sliceSearch(plain);
    if (answer.status === 'solved' && answer.cost < best.cost) best = { status: 'solved', cost: answer.cost };
  }
  return best;
}

test('a stock in whole drums: as by trying every number of drums', async () => {
  const cases: Case[] = [];
  for (const seed of seeds(16, 16_001)) {
    const draw = new Draw(seed);
    const order = randomOrder(seed, { ...CONTINUOUS, stocks: [3, 6], rules: false });
    const stock = draw.pick(order.stocks);
    const share = draw.between(0.02, 0.15);
    order.batchTonnes = 10;
    stock.lotTonnes = 10 * share;
    const entry = caseOf(`seed ${seed}`, order, cheapestByDrums(order, stock.id, share));
    if (entry) cases.push(entry);
  }
  await expectAgreement(cases);
});

/** Cost and penalty of an aim on Noack [% m/m], whose reporting unit is 0.1. */
function withPenalty(cost: number, noack: number, aim: number, weight: number): number {
  return cost + (weight * Math.abs(noack - aim)) / 0.1;
}

// Second way: the limit held at each of many values in turn, and the penalty added by hand.
test('an aim weighs its deviation against the cost', async () => {
  let pulled = 0;
  for (const seed of seeds(14, 17_001)) {
    const draw = new Draw(seed);
    const order = randomOrder(seed, { ...CONTINUOUS, stocks: [3, 8], rules: false });
    const plain = sliceSearch(order);
    if (plain.status !== 'solved') continue;
    const figures = order.stocks.map((stock) => stock.figures.find((f) => f.property === 'noack')?.value ?? 0);
    const shares = order.stocks.map(
      (stock) => plain.recipe.find((line) => line.stockId === stock.id)?.massFraction ?? 0,
    );
    const aim = Math.max(0, figures.reduce((sum, figure, i) => sum + figure * shares[i], 0) + draw.between(-2, 2));
    const weight = draw.ratio(0.2, 20);
    const outcome = await solveBlend({
      ...order,
      limits: [...order.limits, { property: 'noack', aim, aimWeight: weight }],
    });
    const cost = outcome.costPerTonne ?? Number.NaN;
    const noack = outcome.properties?.properties.find((p) => p.property === 'noack')?.value ?? Number.NaN;
    const worth = withPenalty(cost, noack, aim, weight);
    expect(outcome.proof.kind, `seed ${seed}`).toBe('least cost');
    expect(outcome.proof.lowerBound, `seed ${seed}`).toBeLessThanOrEqual(worth * (1 + 1e-9));
    expect(outcome.proof.lowerBound, `seed ${seed}`).toBeGreaterThan(worth * (1 - 5e-6));
    for (let k = 0; k <= 20; k++) {
      const at = Math.min(...figures) + ((Math.max(...figures) - Math.min(...figures)) * k) / 20;
      const held = sliceSearch({ ...order, limits: [...order.limits, { property: 'noack', min: at, max: at }] });
      if (held.status !== 'solved') continue;
      expect(worth, `seed ${seed}: better at ${at}`).toBeLessThanOrEqual(
        withPenalty(held.cost, at, aim, weight) * (1 + 5e-6),
      );
    }
    if (cost > plain.cost * (1 + 1e-5)) pulled++;
  }
  expect(pulled).toBeGreaterThan(2);
});
