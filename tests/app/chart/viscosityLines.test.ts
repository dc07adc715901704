import { describe, expect, it } from 'vitest';
import { isExtrapolated, kvOnLine, pointsOf, viscosityLines } from '../../../app/chart/viscosityLines';
import { kinematicViscosityAt, predictBlend, type Stock, type ViscosityRule } from '../../../src';
import { answered, stockThrough, THICK, THIN } from './chartOrders';

const mixOf = (viscosityRule: ViscosityRule) => {
  const { order, outcome } = answered([THIN, THICK], [0.5, 0.5], { viscosityRule });
  const [mix] = viscosityLines(order, outcome);
  if (!mix?.isMix) throw new Error('The mix has no line.');
  return mix;
};

describe('pointsOf', () => {
  it('reads the measured viscosities from cold to warm', () => {
    const points = [
      { celsius: 100, kv: 5.88 },
      { celsius: -20, kv: 900 },
      { celsius: 40, kv: 30.9 },
    ];
    expect(pointsOf(stockThrough('PAO 6', points)).map(({ celsius }) => celsius)).toEqual([-20, 40, 100]);
  });

  it('has none for a single viscosity, or for one that rises with temperature', () => {
    expect(pointsOf(stockThrough('One', [{ celsius: 40, kv: 30 }]))).toEqual([]);
    const rising = [
      { celsius: 40, kv: 5 },
      { celsius: 100, kv: 30 },
    ];
    expect(pointsOf(stockThrough('Rising', rising))).toEqual([]);
  });

  // ASTM D2270, worked example: KV40 22.83 and KV100 5.05 have a viscosity index of 156.
  it('works KV40 back from KV100 and the viscosity index', () => {
    const stock: Stock = stockThrough('Data sheet', [{ celsius: 100, kv: 5.05 }]);
    stock.figures.push({ property: 'vi', value: 156, origin: 'typical' });
    const [at40] = pointsOf(stock);
    expect(at40?.celsius).toBe(40);
    expect(at40?.kv).toBeCloseTo(22.83, 1);
  });
});

describe('viscosityLines', () => {
  it('draws the mix first, then the stocks in use by share', () => {
    const unused = stockThrough('Unused', [
      { celsius: 40, kv: 50 },
      { celsius: 100, kv: 8 },
    ]);
    const { order, outcome } = answered([THIN, THICK, unused], [0.3, 0.7, 0]);
    expect(viscosityLines(order, outcome).map(({ name }) => name)).toEqual(['Mix', 'Thick', 'Thin']);
  });

  it('has no line without a recipe', () => {
    const { order, outcome } = answered([THIN, THICK], [0.5, 0.5]);
    expect(viscosityLines(order, { ...outcome, recipe: undefined })).toEqual([]);
  });

  it('takes the mix from the order’s blending rule at every temperature', () => {
    const walther = mixOf('walther');
    for (const celsius of [-30, 0, 40, 100, 150]) {
      const recipe = [
        { stockId: 'thin', massFraction: 0.5 },
        { stockId: 'thick', massFraction: 0.5 },
      ];
      const wanted = [{ property: 'kv', celsius }];
      const { properties } = predictBlend([THIN, THICK], recipe, { viscosityRule: 'walther', wanted });
      const kv = properties.find((entry) => entry.property === 'kv' && entry.celsius === celsius)?.value;
      expect(kvOnLine(walther, celsius)).toBeCloseTo(kv ?? Number.NaN, 9);
    }
  });

  it('is straight on the axes of D341 under the Wright method, and bent under a rule of ln ν', () => {
    const through40And100 = (mix: ReturnType<typeof mixOf>) =>
      kinematicViscosityAt(
        0,
        mix.points.filter(({ celsius }) => celsius === 40 || celsius === 100),
      );
    const straight = mixOf('wright');
    expect((kvOnLine(straight, 0) ?? 0) / through40And100(straight)).toBeCloseTo(1, 9);
    const bent = mixOf('logarithmic');
    expect(Math.abs((kvOnLine(bent, 0) ?? 0) / through40And100(bent) - 1)).toBeGreaterThan(0.01);
  });

  it('knows a mix only where all its stocks are measured', () => {
    const cold = stockThrough('Cold', [
      { celsius: -20, kv: 2000 },
      { celsius: 40, kv: 46 },
      { celsius: 100, kv: 7.6 },
    ]);
    const { order, outcome } = answered([THIN, cold], [0.5, 0.5]);
    const lines = viscosityLines(order, outcome);
    expect(lines.map(({ name, known }) => [name, ...known])).toEqual([
      ['Mix', 40, 100],
      ['Thin', 40, 100],
      ['Cold', -20, 100],
    ]);
    const dashedAtZero = lines.map((line) => isExtrapolated(line, 0));
    expect(dashedAtZero).toEqual([true, true, false]);
  });

  it('has no value where ASTM D341 ends', () => {
    const grease = stockThrough('Stiff', [
      { celsius: 40, kv: 1e6 },
      { celsius: 100, kv: 2e4 },
    ]);
    const { order, outcome } = answered([grease], [1]);
    const [mix] = viscosityLines(order, outcome);
    expect(mix && kvOnLine(mix, -30)).toBeUndefined();
  });
});
