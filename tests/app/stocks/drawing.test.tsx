import { act, render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { setAnswer } from '../../../app/state/answerStore';
import type { StockCell } from '../../../app/stocks/StockCell';
import { StocksTable } from '../../../app/stocks/StocksTable';
import type { BlendOutcome, LeftOut } from '../../../src';
import { cellAt, inventedStock, kv, ORDER_ID, putStocksOnPage } from './stocksOnPage';

const drawn = vi.hoisted(() => new Set<string>());

vi.mock('../../../app/stocks/StockCell', async (importOriginal) => {
  const original = await importOriginal<{ StockCell: typeof StockCell }>();
  return {
    StockCell(props: Parameters<typeof StockCell>[0]) {
      drawn.add(props.product.id);
      return <original.StockCell {...props} />;
    },
  };
});

const IDS = ['a', 'b', 'c', 'd', 'e', 'f'];

const NO_NOACK: LeftOut = {
  stockId: 'f',
  name: 'Stock f',
  reason: 'unknown figure',
  property: 'noack',
  message: 'Noack is unknown.',
};

function answerWith(shares: Record<string, number>): void {
  const outcome: BlendOutcome = {
    stopped: 'finished',
    proof: { kind: 'least cost' },
    recipe: Object.entries(shares).map(([stockId, massFraction]) => ({ stockId, massFraction })),
    checks: [],
    leftOut: [{ ...NO_NOACK }],
    cautions: [],
    problems: [],
    work: { nodes: 1, linearPrograms: 1, milliseconds: 1 },
  };
  setAnswer(ORDER_ID, { phase: 'answered', stale: false, outcome, omitted: [] });
}

const rowsDrawn = () => [...drawn].sort();

describe('drawing the table', () => {
  beforeEach(() => {
    putStocksOnPage(IDS.map((id) => inventedStock(id, { figures: [kv(40, 30), kv(100, 5)] })));
    render(<StocksTable />);
    act(() => answerWith({ a: 0.4, b: 0.6 }));
    drawn.clear();
  });

  it('draws no stock again whose share and marks an answer leaves as they were', () => {
    act(() => setAnswer(ORDER_ID, { phase: 'solving', stale: true }));
    act(() => answerWith({ a: 0.4, b: 0.6 }));
    expect(rowsDrawn()).toEqual([]);
    act(() => answerWith({ a: 0.4, c: 0.6 }));
    expect(rowsDrawn()).toEqual(['b', 'c']);
  });

  it('draws only the rows of the cell that was typed in and of the one that is chosen then', async () => {
    const user = userEvent.setup();
    act(() => cellAt(1, 'Price').focus());
    drawn.clear();
    await user.keyboard('915{Enter}');
    expect(rowsDrawn()).toEqual(['b', 'c']);
  });
});
