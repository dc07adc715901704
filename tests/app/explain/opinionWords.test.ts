import { describe, expect, it } from 'vitest';
import { opinionInWords } from '../../../app/explain/opinionWords';
import type { BlendOutcome } from '../../../src';
import { mixOf, orderOf, outcomeOf } from '../answer/answers';

const of = (costPerTonne: number, kind: BlendOutcome['proof']['kind'] = 'least cost') =>
  mixOf({ costPerTonne, objective: costPerTonne, proof: { kind } });
const impossible = outcomeOf({ proof: { kind: 'impossible' } });
const FIRST = of(1500);

const say = (second: BlendOutcome, first = FIRST) =>
  opinionInWords({ kind: 'answered', outcome: second }, first, orderOf(), 'EUR');

describe('the second opinion', () => {
  it('agrees where both proved the same cost', () => {
    expect(say(of(1500.001))).toEqual({
      text: 'The second engine agrees: €1,500.00/t (difference under €0.01/t).',
      tone: 'good',
    });
    expect(say(impossible, impossible).tone).toBe('good');
  });

  it('does not agree where the proofs contradict each other, whichever is the cheaper', () => {
    expect(say(of(1510))).toMatchObject({ tone: 'bad', text: expect.stringMatching(/€1,510.00\/t, €10.00\/t dearer/) });
    expect(say(of(1490, 'within gap'))).toMatchObject({ tone: 'bad', text: expect.stringMatching(/cheaper/) });
    expect(say(impossible)).toMatchObject({ tone: 'bad', text: expect.stringMatching(/finds the order impossible/) });
    expect(say(of(1500), impossible)).toMatchObject({ tone: 'bad', text: expect.stringMatching(/found a recipe/) });
  });

  it('claims nothing from what is not proven', () => {
    expect(say(of(1500, 'within gap')).text).toMatch(/same cost, €1,500.00\/t, but did not prove it/);
    expect(say(of(1510, 'within gap')).text).toMatch(/did not prove it/);
    expect(say(of(1490), of(1500, 'within gap')).text).toMatch(/this answer is not proven/);
    expect(say(outcomeOf({ stopped: 'time limit' })).text).toMatch(/found no recipe in its time/);
    for (const second of [of(1510, 'within gap'), outcomeOf()]) expect(say(second).tone).toBe('plain');
  });

  it('says when there was no answer', () => {
    const silent = opinionInWords({ kind: 'silent', afterMs: 13_000 }, FIRST, orderOf(), 'EUR');
    expect(silent).toMatchObject({ tone: 'plain', text: expect.stringMatching(/did not answer in 13 s/) });
    const failed = opinionInWords({ kind: 'failed', message: 'its worker broke down' }, FIRST, orderOf(), 'EUR');
    expect(failed.text).toMatch(/gave no answer \(its worker broke down\)/);
  });
});
