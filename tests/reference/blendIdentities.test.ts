import { describe, expect, it } from 'vitest';
import { predictBlend, type Stock, VISCOSITY_RULES, type ViscosityRule } from '../../src';
import { published } from './closeTo';
import { ESTER, MPAO_100, PAO_4, predicted, SN_150, SN_500 } from './referenceStocks';

// Exact identities: they hold for every rule, whatever its accuracy.
const POINTS = [
  { property: 'kv', celsius: 40 },
  { property: 'kv', celsius: 60 },
  { property: 'kv', celsius: 100 },
  { property: 'density', celsius: 15 },
];
const MIX = [SN_150, SN_500, PAO_4, ESTER];
const SHARES = [0.15, 0.35, 0.3, 0.2];

const value = (stocks: readonly Stock[], shares: readonly number[], at: (typeof POINTS)[number], rule: ViscosityRule) =>
  predicted(stocks, shares, at, { viscosityRule: rule });

describe.each(VISCOSITY_RULES)('under %s', (rule) => {
  it('one oil alone is itself', () => {
    for (const stock of [...MIX, MPAO_100]) {
      published(`${stock.id} at 40`, value([stock], [1], POINTS[0], rule), stock.figures[0].value ?? 0, {
        relative: 1e-12,
      });
      published(`${stock.id} at 100`, value([stock], [1], POINTS[2], rule), stock.figures[1].value ?? 0, {
        relative: 1e-12,
      });
    }
  });

  it('ten identical oils are that oil', () => {
    const ten = Array.from({ length: 10 }, (_, i): Stock => ({ ...SN_500, id: `oil ${i}` }));
    const shares = ten.map((_, i) => (i + 1) / 55);
    for (const at of POINTS) {
      const alone = value([SN_500], [1], at, rule);
      published(`${at.property} ${at.celsius}`, value(ten, shares, at, rule), alone, { relative: 1e-12 });
    }
  });

  it('the order of the stocks changes nothing', () => {
    const turned = [2, 0, 3, 1];
    for (const at of POINTS) {
      const straight = value(MIX, SHARES, at, rule);
      const other = value(
        turned.map((i) => MIX[i]),
        turned.map((i) => SHARES[i]),
        at,
        rule,
      );
      published(`${at.property} ${at.celsius}`, other, straight, { relative: 1e-13 });
    }
  });

  it('a weight common to all changes nothing, a weight of one stock does', () => {
    const common = MIX.map((stock) => ({ ...stock, blendWeight: 1.7 }));
    const single = MIX.map((stock, i) => (i === 1 ? { ...stock, blendWeight: 1.7 } : stock));
    for (const at of POINTS.slice(0, 3)) {
      const plain = value(MIX, SHARES, at, rule);
      published(`${at.celsius}`, value(common, SHARES, at, rule), plain, { relative: 1e-12 });
      expect(value(single, SHARES, at, rule)).toBeGreaterThan(plain * 1.02);
    }
  });

  it('a mix lies between its thinnest and its thickest stock, and thickens with the thick one', () => {
    let before = value([PAO_4], [1], POINTS[2], rule);
    for (const share of [0.1, 0.3, 0.5, 0.7, 0.9, 1]) {
      const kv = value([PAO_4, MPAO_100], [1 - share, share], POINTS[2], rule);
      expect(kv).toBeGreaterThan(before);
      before = kv;
    }
    published('all of the thick one', before, 103, { relative: 1e-12 });
  });

  it('the spread beside a prediction is each rule’s own prediction', () => {
    const recipe = MIX.map((stock, i) => ({ stockId: stock.id, massFraction: SHARES[i] }));
    const spread = predictBlend(MIX, recipe).spread.find(({ celsius }) => celsius === 100);
    const shown = spread?.byRule.find((entry) => entry.rule === rule)?.value;
    published('KV100', shown ?? Number.NaN, value(MIX, SHARES, POINTS[2], rule), { relative: 1e-13 });
  });
});

describe('density', () => {
  it('volumes add: half PAO 4 (820) and half ester (946) by mass, by hand 2 / (1/820 + 1/946)', () => {
    const density = predicted([PAO_4, ESTER], [0.5, 0.5], { property: 'density', celsius: 15 });
    published('density', density, 878.505, { absolute: 0.001 });
  });

  it('gives the shares by volume', () => {
    const recipe = [
      { stockId: 'PAO 4', massFraction: 0.5 },
      { stockId: 'ester', massFraction: 0.5 },
    ];
    const { volumeFractions } = predictBlend([PAO_4, ESTER], recipe);
    published('PAO 4', volumeFractions?.[0] ?? Number.NaN, 946 / (946 + 820), { relative: 1e-12 });
    published('ester', volumeFractions?.[1] ?? Number.NaN, 820 / (946 + 820), { relative: 1e-12 });
  });
});

it('one oil alone needs no density: its own figures are those of the mix (exact identity)', () => {
  const figures = [
    { property: 'kv', celsius: 40, value: 30.4, origin: 'measured' as const },
    { property: 'kv', celsius: 100, value: 5.15, origin: 'measured' as const },
    { property: 'pourPoint', value: -12, origin: 'measured' as const },
  ];
  const alone = { id: 'a', name: 'A', family: 'Group I' as const, pricePerTonne: 1, figures };
  const { properties } = predictBlend([alone], [{ stockId: 'a', massFraction: 1 }]);
  const value = (property: string, celsius?: number) =>
    properties.find((entry) => entry.property === property && entry.celsius === celsius)?.value;
  expect([value('kv', 40), value('kv', 100), value('pourPoint')]).toEqual([30.4, 5.15, -12]);
  expect(value('density', 15)).toBeUndefined();
});
