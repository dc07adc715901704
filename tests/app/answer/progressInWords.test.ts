import { describe, expect, it } from 'vitest';
import { progressInWords } from '../../../app/answer/Progress';
import type { Order, SolveProgress } from '../../../src';

const say = (progress: Partial<SolveProgress>, order: Partial<Order> = {}) =>
  progressInWords({ milliseconds: 3000, nodes: 1, ...progress }, 'EUR', { limits: [], ...order });

describe('how far a search has come, in words', () => {
  it('says a recipe and a bound only where there is one', () => {
    expect(progressInWords(undefined, 'EUR', { limits: [] })).toBe('Searching …');
    expect(say({})).toBe('Searching, 3 s: no recipe yet.');
    expect(say({ lowerBound: 990 })).toBe('Searching, 3 s: no recipe yet; proven: none below €990.00 per tonne.');
    expect(say({ bestCost: 1000, lowerBound: -Infinity })).toMatch(/€1,000.00 per tonne; nothing proven yet\.$/);
  });

  it('never calls a bound per m³ one per tonne, nor denies a recipe it is not told of', () => {
    const order = { costBasis: 'cubic metre' as const };
    expect(say({ lowerBound: 880 }, order)).toBe('Searching, 3 s: proven: none below €880.00 per m³.');
    expect(say({}, order)).toBe('Searching, 3 s …');
  });

  it('does not hold the plain cost against a bound on cost and aims', () => {
    const limits = [{ property: 'kv', celsius: 40, aim: 46 }];
    const words = say({ bestCost: 1000, lowerBound: 1010 }, { limits });
    expect(words).toMatch(
      /best so far €1,000.00 per tonne; proven: none below €1,010.00 per tonne, aims counted in\.$/,
    );
  });
});
