import { describe, expect, it } from 'vitest';
import { answerInWords } from '../../../app/shell/answerInWords';
import type { Answer } from '../../../app/state/answerStore';
import { type BlendOutcome, emptyOrder } from '../../../src';

const ORDER = emptyOrder('order-1', 'Order');
const FOUND: BlendOutcome = {
  stopped: 'finished',
  proof: { kind: 'least cost' },
  recipe: [],
  costPerTonne: 912.6,
  costPerCubicMetre: 790.2,
  checks: [],
  leftOut: [],
  cautions: [],
  problems: [],
  work: { nodes: 1, linearPrograms: 1, milliseconds: 1 },
};

function answer(change: Partial<Answer> = {}): Answer {
  return { phase: 'answered', stale: false, omitted: [], unread: [], notes: [], outcome: FOUND, ...change };
}

const say = (change: Partial<Answer>, order = ORDER) => answerInWords(answer(change), order, 'EUR');

describe('an answer in two or three words', () => {
  it('says the cost and that it is proven', () => {
    expect(say({})).toEqual({ text: '€913/t', remark: 'proven cheapest', tone: 'good', stale: false });
  });

  it('says the cost per cubic metre where the order counts so', () => {
    expect(say({}, { ...ORDER, costBasis: 'cubic metre' }).text).toBe('€790/m³');
  });

  it('never calls a stopped search proven', () => {
    const stopped = { ...FOUND, stopped: 'time limit' as const, proof: { kind: 'none' as const } };
    expect(say({ outcome: stopped })).toMatchObject({ text: '€913/t', remark: 'not proven cheapest' });
    const { recipe: _recipe, costPerTonne: _cost, ...nothing } = stopped;
    expect(say({ outcome: nothing })).toMatchObject({ text: 'no recipe yet', remark: 'stopped, nothing proven' });
  });

  it('tells impossible from impossible with the figures that are known', () => {
    expect(say({ outcome: { ...FOUND, proof: { kind: 'impossible' } } })).toMatchObject({
      text: 'impossible',
      remark: 'proven',
    });
    expect(say({ outcome: { ...FOUND, proof: { kind: 'impossible with known figures' } } })).toMatchObject({
      text: 'impossible',
      remark: 'with known figures',
    });
  });

  it('names products without a price with every claim', () => {
    const omitted = [{ productId: 'sn-150', name: 'SN 150', message: 'SN 150 has no price.' }];
    expect(say({ omitted }).remark).toBe('proven cheapest, 1 left out');
    const impossible = { ...FOUND, proof: { kind: 'impossible' as const } };
    expect(say({ omitted, outcome: impossible }).remark).toBe('with the stocks counted, 1 left out');
    const { recipe: _recipe, ...refused } = { ...FOUND, stopped: 'refused' as const, proof: { kind: 'none' as const } };
    const order = { stocks: [], limits: [] };
    expect(say({ omitted, order, outcome: refused })).toMatchObject({ text: 'no stock counts', tone: 'warn' });
  });

  it('asks for attention where the question could not be put', () => {
    expect(say({ outcome: { ...FOUND, stopped: 'refused', proof: { kind: 'none' } } }).text).toBe('needs attention');
    expect(say({ outcome: undefined, phase: 'failed' }).text).toBe('needs attention');
  });

  it('says nothing before there is an answer, and marks an old one as old', () => {
    expect(say({ outcome: undefined, phase: 'idle' }).text).toBe('not worked out yet');
    expect(say({ stale: true }).stale).toBe(true);
  });
});
