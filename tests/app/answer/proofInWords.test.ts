import { describe, expect, it } from 'vitest';
import { percentUp, proofInWords } from '../../../app/answer/proofInWords';
import type { BlendOutcome, LeftOut } from '../../../src';
import { HEAVY, LIGHT, mixOf, orderOf, outcomeOf } from './answers';

const missing = (name: string): LeftOut => ({
  stockId: name,
  name,
  reason: 'unknown figure',
  property: 'noack',
  message: `${name} has no Noack volatility.`,
});

const UNPRICED = {
  omitted: [{ productId: 'SN 150', name: 'SN 150', message: 'SN 150 has no price: give one or exclude it.' }],
  unread: [],
};

describe('what is proven, in words', () => {
  it('says "cheapest" only of a proof, with what it rests on and how near it is', () => {
    const { text, tone } = proofInWords(mixOf(), orderOf());
    expect(text).toBe('Cheapest under these figures and this blending rule, proven to 0.0001 %.');
    expect(tone).toBe('good');
  });

  it('names the stocks that a proof says nothing about', () => {
    const order = orderOf({ stocks: [LIGHT, HEAVY, { ...HEAVY, id: 'PAO 4' }, { ...HEAVY, id: 'PAO 6' }] });
    const { text } = proofInWords(mixOf({ leftOut: [missing('PAO 4'), missing('PAO 6')] }), order);
    expect(text).toMatch(/^Cheapest of the 2 stocks that can be counted \(2 left out\) under/);
    const flag = { ...missing('SN 150'), reason: 'missing flag' as const };
    expect(proofInWords(mixOf({ leftOut: [flag] }), orderOf()).text).not.toMatch(/left out/);
  });

  it('claims nothing about products without a price', () => {
    const within = mixOf({ stopped: 'time limit', proof: { kind: 'within gap', gap: 0.003 } });
    const say = (outcome: BlendOutcome) => proofInWords(outcome, orderOf(), UNPRICED).text;
    expect(say(mixOf())).toMatch(/^Cheapest of the 2 stocks that can be counted \(1 left out\) under/);
    expect(say(within)).toMatch(/above the cheapest of the 2 stocks that can be counted \(1 left out\)/);
    const impossible = say(outcomeOf({ proof: { kind: 'impossible' } }));
    expect(impossible).toBe('No mix of the 2 stocks that can be counted (1 left out) can meet the order: proven.');
  });

  it('proves nothing where no product has a price', () => {
    const outcome = outcomeOf({ stopped: 'refused', problems: [{ path: ['stocks'], message: 'No stocks.' }] });
    const { text, tone } = proofInWords(outcome, orderOf({ stocks: [] }), UNPRICED);
    expect(text).toMatch(/^No stock can be counted: the only one is left out/);
    expect(tone).toBe('warn');
  });

  it('names cells nobody could read in the same breath, once', () => {
    const cell = { cell: 'greatestDose', message: 'Type it again.' };
    const unread = ['SN 150', 'Light oil'].map((productId) => ({ productId, ...cell }));
    const { text } = proofInWords(mixOf(), orderOf(), { ...UNPRICED, unread });
    expect(text).toMatch(/\(1 left out\).* One cell of the stocks was not read\.$/);
  });

  it('says how far a recipe may lie above the cheapest, and why the search ended', () => {
    const within = mixOf({ stopped: 'time limit', proof: { kind: 'within gap', lowerBound: 1495.5, gap: 0.003 } });
    expect(proofInWords(within, orderOf()).text).toBe('At most 0.3 % above the cheapest (stopped at the time limit).');
    expect(proofInWords({ ...within, stopped: 'cancelled' }, orderOf()).text).toMatch(/\(you stopped the search\)/);
    expect(proofInWords(within, orderOf({ costBasis: 'cubic metre' })).text).toMatch(/the cheapest per m³/);
  });

  it('speaks of cost and aims together where the order has an aim', () => {
    const order = orderOf({ limits: [{ property: 'kv', celsius: 40, aim: 46 }] });
    expect(proofInWords(mixOf(), order).text).toMatch(/^Best in cost and aims together/);
  });

  it('says "impossible" only where it is proven, and of which stocks', () => {
    const impossible = outcomeOf({ proof: { kind: 'impossible' } });
    expect(proofInWords(impossible, orderOf()).text).toBe('No mix of these stocks can meet the order: proven.');
    const withPao = orderOf({ stocks: [LIGHT, HEAVY, { ...HEAVY, id: 'PAO 4' }] });
    const known = outcomeOf({ proof: { kind: 'impossible with known figures' }, leftOut: [missing('PAO 4')] });
    expect(proofInWords(known, withPao).text).toBe(
      'No mix of the 2 stocks that can be counted (1 left out) can meet the order: proven.',
    );
  });

  it('claims nothing for a search that was stopped before it proved anything', () => {
    const stopped = outcomeOf({ stopped: 'cancelled' });
    expect(proofInWords(stopped, orderOf()).text).toBe(
      'No recipe found, and nothing proven yet (you stopped the search).',
    );
    const unproven = mixOf({ stopped: 'time limit', proof: { kind: 'none' } });
    expect(proofInWords(unproven, orderOf()).text).toMatch(/is not proven \(stopped at the time limit\)/);
    expect(proofInWords(unproven, orderOf()).text).not.toMatch(/[Cc]heapest under/);
  });

  it('says of a refused order and of a failed search that there is no answer', () => {
    expect(proofInWords(outcomeOf({ stopped: 'refused' }), orderOf()).text).toBe(
      'The order cannot be solved as written:',
    );
    expect(proofInWords(outcomeOf({ stopped: 'engine failed' }), orderOf()).text).toMatch(/there is no answer/);
  });
});

describe('a share in per cent that is never rounded down', () => {
  it.each([
    [0, '0.0001 %'],
    [1e-6, '0.0001 %'],
    [0.000_012_1, '0.0013 %'],
    [0.003, '0.3 %'],
    [0.003_01, '0.31 %'],
    [0.0155, '1.6 %'],
    [0.1201, '13 %'],
    [1.5, '150 %'],
  ])('%d is %s', (fraction, text) => {
    expect(percentUp(fraction)).toBe(text);
  });
});
