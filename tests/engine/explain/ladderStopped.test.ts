import { expect, test } from 'vitest';
import { explainImpossible, type Ladder, type LadderOptions, type Order } from '../../../src/index';
import { demo } from '../optimum/consistency';
import { asksOnly, ladderOf, possibility, withEndAt } from './ladderChecks';

/** A clock that jumps by an hour once it was read `calm` times. */
function jumpingClock(calm: number): () => number {
  let reads = 0;
  return () => (reads++ < calm ? reads / 1000 : 3_600_000 + reads);
}

function cancelledAfter(calm: number): () => boolean {
  let asked = 0;
  return () => asked++ >= calm;
}

/** Whatever it says is true: a conflict is one, what is within reach is, and what is called proven is what it is. */
async function expectHonest(order: Order, told: Ladder, truth: Ladder): Promise<void> {
  if (told.noConflict) expect(told).toMatchObject({ conflict: [], noConflict: { why: 'not proven' } });
  else expect(await possibility(asksOnly(order, told.conflict))).toBe('impossible');
  if (told.conflictProven) expect(told.conflict).toEqual(truth.conflict);
  for (const entry of told.reach) {
    const whole = truth.reach.find(({ limit, end }) => limit === entry.limit && end === entry.end);
    if (entry.proven) expect(entry.reachable).toBe(whole?.reachable);
    if (entry.reachable !== undefined) {
      expect(await possibility(withEndAt(order, entry, entry.reachable))).toBe('possible');
    }
  }
  if (told.leastEffort !== undefined) expect(told.leastEffort).toBeLessThanOrEqual(truth.relaxations[0].effort);
  for (const { changes, proven } of told.relaxations) {
    const applied = changes.reduce((changed, change) => withEndAt(changed, change, change.to), order);
    expect(await possibility(applied)).toBe('possible');
    if (proven && changes.length === 1) expect(truth.relaxations.map((entry) => entry.changes)).toContainEqual(changes);
  }
}

test.each<[string, 'time limit' | 'cancelled', (calm: number) => LadderOptions]>([
  ['time', 'time limit', (calm) => ({ timeLimitMs: 1000, now: jumpingClock(calm) })],
  ['patience', 'cancelled', (calm) => ({ isCancelled: cancelledAfter(calm) })],
])('out of %s at any moment, nothing is said that is not known', async (_, stopped, options) => {
  const order = demo('impossible at 10');
  const truth = await ladderOf(order);
  expect(truth.stopped).toBe('finished');
  const seen = new Set<string>();
  for (let calm = 1; calm <= 2000; calm = Math.ceil(calm * 1.25)) {
    const told = await explainImpossible(order, options(calm));
    await expectHonest(order, told, truth);
    seen.add(told.stopped);
    if (told.stopped !== 'finished') {
      if (told.noConflict) seen.add('no proof');
      if (told.conflict.length > 0 && !told.conflictProven) seen.add('conflict not proven');
      if (told.reach.some(({ proven }) => !proven)) seen.add('reach not proven');
    }
  }
  expect([...seen]).toEqual(
    expect.arrayContaining([stopped, 'finished', 'no proof', 'conflict not proven', 'reach not proven']),
  );
});

test('the next ladder is unaffected by one that was stopped', async () => {
  const order = demo('impossible at 10');
  const before = await ladderOf(order);
  await explainImpossible(order, { isCancelled: cancelledAfter(20) });
  expect(await ladderOf(order)).toEqual(before);
});
