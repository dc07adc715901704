import { act, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it } from 'vitest';
import { ImpossibleLadder } from '../../../app/explain/ImpossibleLadder';
import { setExplained } from '../../../app/state/explainStore';
import { useView } from '../../../app/state/viewStore';
import { undo, useWorkbook } from '../../../app/state/workbookStore';
import type { Ladder } from '../../../src';
import { orderOf, outcomeOf } from '../answer/answers';
import { testEnvironment } from '../state/testEnvironment';
import { answerOnPage, ID } from './explainedOnPage';

const order = orderOf({
  limits: [
    { property: 'kv', celsius: 40, min: 46 },
    { property: 'noack', max: 8, insideBy: 0.5 },
  ],
});
const outcome = outcomeOf({ proof: { kind: 'impossible' }, conflict: [0] });
const ladder: Ladder = {
  conflict: [
    { kind: 'limit', limit: 0, end: 'min' },
    { kind: 'limit', limit: 1, end: 'max' },
  ],
  conflictProven: true,
  reach: [],
  relaxations: [
    { changes: [{ limit: 1, end: 'max', stated: 8, to: 9 }], effort: 10, costPerTonne: 1600, proven: true },
    {
      changes: [
        { limit: 0, end: 'min', stated: 46, to: 45 },
        { limit: 1, end: 'max', stated: 8, to: 8.5 },
      ],
      effort: 105,
      costPerTonne: 1500,
      proven: false,
    },
  ],
  stopped: 'finished',
  solves: 20,
};

function show(value?: Ladder) {
  const is = answerOnPage({ order, outcome });
  if (value) setExplained(ID, { impossible: { ...is, told: { value } } });
  render(<ImpossibleLadder orderId={ID} order={order} outcome={outcome} />);
  return is;
}

const orders = () => useWorkbook.getState().workbook.orders;

beforeEach(() => void testEnvironment());

describe('an impossible order', () => {
  it('shows what the proof leans on until its ladder is told', () => {
    const is = show();
    expect(screen.getByText('In the way, taken together')).toBeVisible();
    act(() => setExplained(ID, { impossible: { ...is, told: { value: ladder } } }));
    expect(screen.queryByText('In the way, taken together')).toBeNull();
    expect(screen.getByText('These cannot hold together')).toBeVisible();
    expect(screen.getByText(/^Noack volatility at most 8/)).toBeVisible();
    expect(screen.getByText(/ends this conflict: proven/)).toBeVisible();
  });

  it('says what is within reach, alone and together, at what cost', () => {
    show(ladder);
    expect(screen.getAllByRole('listitem').map((item) => item.textContent)).toEqual(
      expect.arrayContaining([
        'Noack up to 9.0 % m/m (asked at most 8.0), at €1,600.00/tTry it in a copy',
        'KV40 down to 45.00 mm²/s (asked at least 46.00); Noack up to 8.5 % m/m (asked at most 8.0), at €1,500.00/t, not provenTry it in a copy',
      ]),
    );
  });

  it('tries a change in a copy, as one step, and leaves the order as it is', async () => {
    show(ladder);
    const before = orders()[0];
    await userEvent.click(screen.getByRole('button', { name: /^Try it in a copy: Noack up to 9.0/ }));
    const [original, copy] = orders();
    expect(original).toBe(before);
    expect(copy).toMatchObject({ name: 'Hydraulic oil, eased', limits: [order.limits[0], { max: 9, insideBy: 0.5 }] });
    expect(useView.getState()).toMatchObject({ orderId: copy?.id, message: expect.stringMatching(/is unchanged/) });
    undo();
    expect(orders()).toEqual([before]);
    expect(useWorkbook.getState().canUndo).toBe(false);
  });

  it('says what is not proven, and that time ran out', () => {
    show({ ...ladder, conflictProven: false, relaxations: [], stopped: 'time limit' });
    expect(screen.getByText(/which ones is not proven/)).toBeVisible();
    expect(screen.getByText('Nothing found in the time.')).toBeVisible();
    expect(screen.getByText(/^The time ran out/)).toBeVisible();
  });

  it('says why there is no conflict to show', () => {
    const messages = ['The two doses together are more than the mix.'];
    show({ ...ladder, conflict: [], relaxations: [], noConflict: { why: 'no mix at all', messages } });
    expect(screen.getByText(messages[0] ?? '')).toBeVisible();
    expect(screen.queryByText('Within reach, one at a time')).toBeNull();
  });
});
