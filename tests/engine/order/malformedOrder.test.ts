import { expect, test } from 'vitest';
import { type Order, solveBlend } from '../../../src/index';
import { expectConsistent } from '../optimum/consistency';
import { plainOrder } from './plainOrder';

type Path = (string | number)[];
type Data = Record<string, unknown>;

/** The plain order with fields replaced or (undefined) missing. */
function ordered(changes: Data): unknown {
  return { ...plainOrder(), ...changes };
}

function withStock(changes: Data): unknown {
  const { stocks, limits } = plainOrder();
  return { stocks: [{ ...stocks[0], ...changes }, ...stocks.slice(1)], limits };
}

function withShare(rule: Data): unknown {
  return ordered({ shares: [rule] });
}

const CASES: [string, unknown, Path, RegExp][] = [
  ['nothing', undefined, [], /order/],
  ['null', null, [], /order/],
  ['a text', 'an order', [], /order/],
  ['a list', [], [], /order/],
  ['no stocks', ordered({ stocks: undefined }), ['stocks'], /list/],
  ['stocks null', ordered({ stocks: null }), ['stocks'], /list/],
  ['a stock null', ordered({ stocks: [null] }), ['stocks'], /list/],
  ['stocks under names', ordered({ stocks: { oil: plainOrder().stocks[0] } }), ['stocks'], /list/],
  ['no limits', ordered({ limits: undefined }), ['limits'], /list/],
  ['a limit that is a text', ordered({ limits: ['kv'] }), ['limits'], /list/],
  ['a limit without a property', ordered({ limits: [{ min: 5 }] }), ['limits', 0, 'property'], /text/],
  [
    'a limit that ends at a text',
    ordered({ limits: [{ property: 'noack', max: '12' }] }),
    ['limits', 0, 'max'],
    /number/,
  ],
  [
    'a limit that ends at null',
    ordered({ limits: [{ property: 'noack', max: null }] }),
    ['limits', 0, 'max'],
    /number/,
  ],
  ['doses null', ordered({ doses: null }), ['doses'], /list/],
  ['a dose of nothing', ordered({ doses: [{ exactly: 0.1 }] }), ['doses', 0, 'stockId'], /text/],
  [
    'a dose of a basis unknown',
    ordered({ doses: [{ stockId: 'PAO 4', of: 'volume' }] }),
    ['doses', 0, 'of'],
    /base oil/,
  ],
  ['a dose that is a text', ordered({ doses: [{ stockId: 'PAO 4', max: '0.1' }] }), ['doses', 0, 'max'], /number/],
  ['shares that are an object', ordered({ shares: {} }), ['shares'], /list/],
  ['a rule of a kind unknown', withShare({ kind: 'atMost', set: {}, max: 0.1 }), ['shares', 0, 'kind'], /share, ratio/],
  ['a rule without a kind', withShare({ set: { families: ['ester'] } }), ['shares', 0, 'kind'], /missing/],
  ['a rule without a set', withShare({ kind: 'share', max: 0.1 }), ['shares', 0, 'set'], /stocks/],
  ['a ratio to nothing', withShare({ kind: 'ratio', set: { families: ['PAO'] } }), ['shares', 0, 'to'], /stocks/],
  [
    'a set of one text',
    withShare({ kind: 'count', set: { families: 'PAO' } }),
    ['shares', 0, 'set', 'families'],
    /list/,
  ],
  ['an empty set', withShare({ kind: 'share', set: {}, max: 0.1 }), ['shares', 0], /stocks/],
  ['a flag rule without its flag', withShare({ kind: 'flag' }), ['shares', 0, 'flag'], /text/],
  ['own properties null', ordered({ ownProperties: null }), ['ownProperties'], /list/],
  ['a viscosity rule in capitals', ordered({ viscosityRule: 'Wright' }), ['viscosityRule'], /Wright.*wright/],
  ['a viscosity rule null', ordered({ viscosityRule: null }), ['viscosityRule'], /null.*wright/],
  ['a cost per litre', ordered({ costBasis: 'litre' }), ['costBasis'], /litre.*cubic metre/],
  ['a batch of null', ordered({ batchTonnes: null }), ['batchTonnes'], /number/],
  ['a batch that is a text', ordered({ batchTonnes: '20' }), ['batchTonnes'], /number/],
  ['a batch without its largest', ordered({ batchTonnes: { min: 5 } }), ['batchTonnes', 'max'], /[Ll]argest.*missing/],
  [
    'a batch without its smallest',
    ordered({ batchTonnes: { max: 5 } }),
    ['batchTonnes', 'min'],
    /[Ss]mallest.*missing/,
  ],
  ['a batch that is a list', ordered({ batchTonnes: [5, 10] }), ['batchTonnes', 'min'], /[Ss]mallest/],
  ['most stocks in words', ordered({ mostStocks: 'four' }), ['mostStocks'], /whole number/],
  ['a stock without a family', withStock({ family: undefined }), ['stocks', 'SN 150', 'family'], /missing.*PAO/],
  ['a family unknown', withStock({ family: 'pao' }), ['stocks', 'SN 150', 'family'], /pao.*PAO/],
  ['a stock without figures', withStock({ figures: undefined }), ['stocks', 'SN 150', 'figures'], /list/],
  ['figures null', withStock({ figures: null }), ['stocks', 'SN 150', 'figures'], /list/],
  ['a figure that is a number', withStock({ figures: [12] }), ['stocks', 'SN 150', 'figures'], /list/],
  [
    'a figure without an origin',
    withStock({ figures: [{ property: 'noack', value: 12 }] }),
    ['stocks', 'SN 150', 'figures'],
    /missing.*measured/,
  ],
  ['a stock without an id', withStock({ id: undefined }), ['stocks', 0, 'id'], /text/],
  ['a stock without a name', withStock({ name: null }), ['stocks', 'SN 150', 'name'], /text/],
  ['a price that is a text', withStock({ pricePerTonne: '880' }), ['stocks', 'SN 150', 'pricePerTonne'], /price/],
];

test('the order that the cases are made of is a valid one', async () => {
  expect((await solveBlend(plainOrder())).stopped).toBe('finished');
});

test.each(CASES)(
  '%s in place of an order, or in it: refused, with the place and a sentence',
  async (_, data, path, words) => {
    const outcome = await solveBlend(data as Order);
    expectConsistent(outcome);
    expect(outcome.stopped).toBe('refused');
    const said = outcome.problems.find((problem) => JSON.stringify(problem.path) === JSON.stringify(path));
    expect(said, JSON.stringify(outcome.problems)).toBeDefined();
    expect(said?.message).toMatch(words);
    expect(said?.message).toMatch(/[.!]$/);
  },
);

test('every fault of the shape is told at once, not the first alone', async () => {
  const data = ordered({ stocks: null, costBasis: 'litre', shares: [{ kind: 'atMost' }] });
  const { problems } = await solveBlend(data as Order);
  expect(problems.map((problem) => problem.path[0]).sort()).toEqual(['costBasis', 'shares', 'stocks']);
});
