import { act, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { AnswerPanel } from '../../../app/answer/AnswerPanel';
import { type Answer, setAnswer, useAnswers } from '../../../app/state/answerStore';
import { selectOrder, useView } from '../../../app/state/viewStore';
import { openWorkbook } from '../../../app/state/workbookStore';
import { emptyOrder, emptyWorkbook } from '../../../src';
import { mixOf, orderOf, outcomeOf } from './answers';

// The chart has its own tests, and fetches a library of its own.
vi.mock('../../../app/chart/LazyViscosityChart', () => ({ LazyViscosityChart: () => <p>the chart</p> }));

const ID = 'order-1';

function show(answer: Partial<Answer>) {
  const workbook = emptyWorkbook('workbook-1', 'Test workbook');
  workbook.orders = [{ ...emptyOrder(ID, 'Hydraulic oil'), laboratoryOnly: ['Foam, ASTM D892'] }];
  openWorkbook(workbook);
  useAnswers.setState({ answers: {} });
  selectOrder(ID);
  setAnswer(ID, answer);
  render(<AnswerPanel orderId={ID} />);
}

const answered = (outcome = mixOf(), order = orderOf()): Partial<Answer> => ({ phase: 'answered', outcome, order });

beforeEach(() => useView.setState({ announcement: '' }));
afterEach(() => vi.useRealTimers());

describe('the answer with a recipe', () => {
  it('shows cost, shares, properties and the tests that are for the laboratory', () => {
    show(answered(mixOf(), orderOf({ batchTonnes: 8 })));
    expect(screen.getByText(/Passing is for the laboratory/)).toBeVisible();
    expect(screen.getByText('€1,500.00')).toBeVisible();
    expect(screen.getByText(/€1,234.29 per m³ at 15 °C · €12,000 for the batch/)).toBeVisible();
    expect(screen.getByRole('table', { name: /Recipe/ })).toHaveTextContent(/Light oilGroup III75.00/);
    expect(screen.getByRole('table', { name: 'Predicted properties of the mix' })).toHaveTextContent(
      /Foam, ASTM D892laboratory only/,
    );
    expect(screen.getByText('the chart')).toBeVisible();
  });

  it('puts the call for a trial blend where nobody misses it', () => {
    const trial = (why: string) => ({ kind: 'trial blend' as const, message: `Make a trial blend first: ${why}` });
    show(answered(mixOf({ cautions: [trial('by one rule KV40 is out.'), trial('by another KV100 is out.')] })));
    const call = screen.getByText('Make a trial blend first:');
    expect(call.tagName).toBe('B');
    expect(call.parentElement).toHaveTextContent(/by one rule KV40 is out\. by another KV100 is out\./);
  });

  it('shows two limits that say the same, each with its room', () => {
    const limit = { property: 'kv', celsius: 40, max: 40 };
    const check = { ...limit, value: 38.12, room: 1.88, passes: true, onLimit: false };
    const checks = [0, 1].map((place) => ({ ...check, limit: place }));
    show(answered(mixOf({ checks }), orderOf({ limits: [limit, limit] })));
    expect(screen.getAllByText('room 1.88 mm²/s')).toHaveLength(2);
  });

  it('lists the stocks left out with their reasons', async () => {
    const message = 'PAO 4 has no Noack volatility. Enter it, or exclude the stock.';
    const leftOut = [{ stockId: 'pao', name: 'PAO 4', reason: 'unknown figure' as const, message }];
    show(answered(mixOf({ leftOut })));
    await userEvent.click(screen.getByText('One stock left out'));
    expect(screen.getByText(message)).toBeVisible();
  });

  it('says with the proof, below it and in the copied recipe what a missing price left out', async () => {
    const message = 'SN 150 has no price: give one or exclude it.';
    const user = userEvent.setup();
    show({ ...answered(), omitted: [{ productId: 'sn-150', name: 'SN 150', message }] });
    expect(screen.getByText(/^Cheapest of the 2 stocks that can be counted \(1 left out\)/)).toBeVisible();
    await user.click(screen.getByText('One stock left out'));
    expect(screen.getByText(message)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Copy recipe' }));
    expect(await navigator.clipboard.readText()).toMatch(/\(1 left out\)[\s\S]*\nSN 150 has no price/);
  });

  it('gives the recipe to the clipboard, and says when the browser refuses', async () => {
    const user = userEvent.setup();
    show(answered());
    await user.click(screen.getByRole('button', { name: 'Copy recipe' }));
    expect(await navigator.clipboard.readText()).toMatch(/^Hydraulic oil\nCheapest under .*\nStock\tFamily/);
    expect(screen.getByText(/^Copied/)).toBeVisible();
    vi.spyOn(navigator.clipboard, 'writeText').mockRejectedValue(new Error('refused'));
    await user.click(screen.getByRole('button', { name: 'Copy recipe' }));
    expect(await screen.findByText(/did not allow copying/)).toBeVisible();
  });
});

describe('the answer without a recipe', () => {
  it.each([
    ['impossible', outcomeOf({ proof: { kind: 'impossible' }, conflict: [0] }), /No mix of these stocks/],
    ['stopped', outcomeOf({ stopped: 'time limit' }), /nothing proven yet/],
    ['refused', outcomeOf({ stopped: 'refused', problems: [{ path: [], message: 'Give a price.' }] }), /as written/],
    ['failed', outcomeOf({ stopped: 'engine failed', problems: [{ path: [], message: 'Solve again.' }] }), /failed/],
  ])('shows no cost, shares or properties: %s', (_name, outcome, words) => {
    show(answered(outcome, orderOf({ limits: [{ property: 'vi', min: 120 }] })));
    expect(screen.getByText(words)).toBeVisible();
    expect(screen.queryByRole('table')).toBeNull();
    expect(screen.queryByText(/€/)).toBeNull();
    expect(screen.queryByText('the chart')).toBeNull();
    for (const { message } of outcome.problems) expect(screen.getByText(message)).toBeVisible();
  });

  it('names the limits in the way of an impossible order', () => {
    const outcome = outcomeOf({ proof: { kind: 'impossible' }, conflict: [0] });
    show(answered(outcome, orderOf({ limits: [{ property: 'vi', min: 120 }] })));
    expect(screen.getByText('Viscosity index: at least 120')).toBeVisible();
  });

  it('says what went wrong when there is no outcome at all', () => {
    show({ phase: 'failed', message: 'The solver could not be loaded. Reload the page.' });
    expect(screen.getByRole('alert')).toHaveTextContent('Reload the page.');
  });
});

describe('an answer that is out of date', () => {
  it('stays on the page, greyed after a moment, and says that a new one is on its way', async () => {
    show({ ...answered(), phase: 'solving', stale: true, sinceMs: 0 });
    expect(await screen.findByText('recomputing …')).toBeInTheDocument();
    expect(screen.getByText('€1,500.00').closest('.stale')).not.toBeNull();
    expect(screen.getByText('€1,500.00').closest('[aria-busy="true"]')).not.toBeNull();
    act(() => setAnswer(ID, { phase: 'answered', stale: false }));
    expect(screen.queryByText('recomputing …')).toBeNull();
    expect(screen.getByText('€1,500.00').closest('.stale')).toBeNull();
    expect(screen.getByText('€1,500.00').closest('[aria-busy]')).toBeNull();
  });

  it('is called out of date where nothing is being worked out', async () => {
    show({ ...answered(), stale: true });
    expect(await screen.findByText('out of date')).toBeInTheDocument();
  });
});

describe('a long search', () => {
  it('shows how far it has come after half a second, and can be cancelled', () => {
    vi.useFakeTimers();
    const progress = { milliseconds: 3000, nodes: 9, bestCost: 1000, lowerBound: 990 };
    show({ phase: 'solving', sinceMs: 1, progress });
    expect(screen.queryByRole('button', { name: 'Cancel' })).toBeNull();
    act(() => void vi.advanceTimersByTime(600));
    expect(
      screen.getByText(/3 s: best so far €1,000.00 per tonne; proven: none below €990.00 per tonne\./),
    ).toBeVisible();
    expect(screen.getByRole('button', { name: 'Cancel' })).toBeEnabled();
  });
});

describe('a new recipe', () => {
  it('is announced once the order has come to rest, and not on every frame before', () => {
    vi.useFakeTimers();
    show(answered());
    act(() => void vi.advanceTimersByTime(2000));
    expect(useView.getState().announcement).toBe('');
    for (const costPerTonne of [1400, 1300, 1200]) {
      act(() => setAnswer(ID, { outcome: mixOf({ costPerTonne }) }));
      act(() => void vi.advanceTimersByTime(100));
      expect(useView.getState().announcement).toBe('');
    }
    act(() => void vi.advanceTimersByTime(2000));
    expect(useView.getState().announcement).toMatch(/^New recipe: €1,200.00 per tonne. Cheapest/);
  });

  it('is announced in the measure that the order makes least', () => {
    vi.useFakeTimers();
    const order = orderOf({ costBasis: 'cubic metre' });
    show(answered(mixOf(), order));
    act(() => void vi.advanceTimersByTime(2000));
    act(() => setAnswer(ID, { outcome: mixOf({ costPerCubicMetre: 1111 }) }));
    act(() => void vi.advanceTimersByTime(2000));
    expect(useView.getState().announcement).toMatch(/^New recipe: €1,111.00 per m³ at 15 °C. Cheapest per m³/);
  });
});
