import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { setAnswer } from '../../../app/state/answerStore';
import { undo, useWorkbook } from '../../../app/state/workbookStore';
import { StocksTable } from '../../../app/stocks/StocksTable';
import type { BlendOutcome, Workbook } from '../../../src';
import { cellAt, figureOnPage, inventedStock, kv, ORDER_ID, putStocksOnPage, stockOnPage } from './stocksOnPage';

const LOT = { id: 'a-lot', name: 'L1', availableTonnes: 12, figures: [] };

function setUp(products = [inventedStock('a'), inventedStock('b')], change: Partial<Workbook> = {}) {
  putStocksOnPage(products, change);
  render(<StocksTable />);
  return userEvent.setup();
}

const workbook = () => useWorkbook.getState().workbook;
const button = (name: string) => screen.getByRole('button', { name });

const OUTCOME: BlendOutcome = {
  stopped: 'finished',
  proof: { kind: 'least cost' },
  checks: [],
  leftOut: [],
  cautions: [],
  problems: [],
  work: { nodes: 1, linearPrograms: 1, milliseconds: 1 },
};

describe('the table of stocks', () => {
  it('adds, copies and removes stocks, each as one step', async () => {
    const user = setUp();
    await user.click(button('Add stock'));
    await user.keyboard('{Control>}a{/Control}Third{Enter}');
    expect(workbook().products.map(({ name }) => name)).toEqual(['Stock a', 'Stock b', 'Third']);
    await user.click(cellAt(0, 'VI'));
    await user.click(button('Duplicate'));
    await user.keyboard('{Enter}');
    expect(workbook().products[1]).toMatchObject({ name: 'Stock a, copy', lots: [] });
    act(() => cellAt(0, 'VI').focus());
    await user.click(button('Remove'));
    expect(workbook().products.map(({ name }) => name)).toEqual(['Stock a, copy', 'Stock b', 'Third']);
    act(() => undo());
    expect(workbook().products).toHaveLength(4);
  });

  it('keeps a stock out of the order on screen, and lets it in again', async () => {
    const user = setUp();
    await user.click(screen.getByRole('checkbox', { name: 'Use Stock b in this order' }));
    expect(workbook().orders[0]?.excludedProductIds).toEqual(['b']);
    await user.keyboard(' ');
    expect(workbook().orders[0]?.excludedProductIds).toEqual([]);
  });

  it('gives the focus to the box of a “Use” cell, so that its state is heard, and takes space and Enter once', async () => {
    const user = setUp();
    act(() => cellAt(0, 'Stock').focus());
    await user.keyboard('{ArrowDown}{ArrowLeft}');
    const box = screen.getByRole('checkbox', { name: 'Use Stock b in this order' });
    expect(box).toHaveFocus();
    expect(box).toBeChecked();
    await user.keyboard(' ');
    expect(box).not.toBeChecked();
    await user.keyboard('{Enter}');
    expect(box).toBeChecked();
    await user.keyboard('{ArrowUp}');
    expect(screen.getByRole('checkbox', { name: 'Use Stock a in this order' })).toHaveFocus();
  });

  it('marks quietly the stocks that share a name, and no others', async () => {
    const user = setUp([
      inventedStock('a', { name: 'SN 500' }),
      inventedStock('b', { name: 'sn  500 ' }),
      inventedStock('c', { name: 'SN 150' }),
    ]);
    for (const row of [0, 1]) expect(cellAt(row, 'Stock')).toHaveAttribute('title', '2 stocks have this name');
    expect(cellAt(0, 'Stock')).toHaveTextContent('2 stocks have this name');
    expect(cellAt(0, 'Stock')).toBeValid();
    expect(cellAt(2, 'Stock')).not.toHaveTextContent('have this name');
    act(() => cellAt(1, 'Stock').focus());
    await user.keyboard('SN 600{Enter}');
    expect(cellAt(0, 'Stock')).toHaveTextContent(/^SN 500$/);
  });

  it('can be scrolled by keys', () => {
    setUp();
    expect(screen.getByRole('region', { name: 'Table of stocks' })).toHaveAttribute('tabindex', '0');
  });

  it('makes a lot of a quantity typed, changes the only lot, and sums several', async () => {
    const second = { ...LOT, id: 'b-lot' };
    const user = setUp([
      inventedStock('a'),
      inventedStock('b', { lots: [LOT] }),
      inventedStock('c', { lots: [LOT, second] }),
    ]);
    act(() => cellAt(0, 'On hand').focus());
    await user.keyboard('7.5{Enter}9{Enter}99{Enter}');
    expect(stockOnPage('a').lots).toMatchObject([{ availableTonnes: 7.5 }]);
    expect(stockOnPage('b').lots).toEqual([{ ...LOT, availableTonnes: 9 }]);
    expect(cellAt(2, 'On hand')).toHaveTextContent(/^24[.,]0$/);
    expect(stockOnPage('c').lots).toEqual([LOT, second]);
  });

  it('lets an unread quantity be cleared though there are several lots, which it leaves alone', async () => {
    const lots = [LOT, { ...LOT, id: 'second' }];
    const user = setUp([inventedStock('a', { lots, unread: { availableTonnes: '2O' } })]);
    act(() => cellAt(0, 'On hand').focus());
    await user.keyboard('{Delete}');
    expect(stockOnPage('a').unread).toBeUndefined();
    expect(stockOnPage('a').lots).toEqual(lots);
    expect(cellAt(0, 'On hand')).toHaveAttribute('aria-readonly', 'true');
  });

  it('takes doses in per cent and says where they contradict each other', async () => {
    const user = setUp();
    act(() => cellAt(0, 'Least dose').focus());
    await user.keyboard('2,5{Tab}1{Enter}');
    expect(stockOnPage('a')).toMatchObject({ leastDoseIfUsed: 0.025, greatestDose: 0.01 });
    expect(cellAt(0, 'Least dose')).toBeInvalid();
  });

  it.each([
    ['Greatest dose', '1O', '“1O” is not a number. Until then the stock is left out.'],
    ['Least dose', '150', 'A share lies between 0 and 100 %. Until then the stock is left out.'],
    ['On hand', '-3', 'A quantity cannot be below zero. Until then the stock is left out.'],
  ])('says at %s “%s” that the stock is left out', async (heading, typed, message) => {
    const user = setUp();
    act(() => cellAt(0, heading).focus());
    await user.keyboard(`${typed}{Enter}`);
    act(() => cellAt(0, heading).focus());
    expect(cellAt(0, heading)).toBeInvalid();
    expect(cellAt(0, heading)).toHaveAccessibleDescription(message);
  });

  it('shows the share of each stock in the recipe, of its lots too', () => {
    setUp([inventedStock('a', { lots: [LOT] }), inventedStock('b')]);
    const recipe = [
      { stockId: 'a-lot', massFraction: 0.3 },
      { stockId: 'b', massFraction: 0.7 },
    ];
    act(() => setAnswer(ORDER_ID, { phase: 'answered', stale: false, outcome: { ...OUTCOME, recipe } }));
    expect(cellAt(0, 'In recipe')).toHaveTextContent(/^30[.,]0$/);
    expect(cellAt(1, 'In recipe')).toHaveTextContent(/^70[.,]0$/);
  });

  it('says at the missing figure why a stock is left out, and at the price why it is omitted', () => {
    setUp([inventedStock('a'), inventedStock('b', { pricePerTonne: undefined })]);
    const leftOut = [
      {
        stockId: 'a',
        name: 'Stock a',
        reason: 'unknown figure' as const,
        property: 'noack',
        message: 'Noack is unknown.',
      },
    ];
    const omitted = [{ productId: 'b', name: 'Stock b', message: 'Stock b has no price.' }];
    act(() => setAnswer(ORDER_ID, { phase: 'answered', stale: false, omitted, outcome: { ...OUTCOME, leftOut } }));
    act(() => cellAt(0, 'Noack').focus());
    expect(cellAt(0, 'Noack')).toHaveAccessibleDescription('Noack is unknown.');
    expect(cellAt(1, 'Price')).toHaveAttribute('title', expect.stringContaining('Stock b has no price.'));
  });

  it('leads from one cell that needs attention to the next', async () => {
    const user = setUp([
      inventedStock('a', { unread: { noack: 'n.d.' } }),
      inventedStock('b', { figures: [{ property: 'flashPoint', value: 900, origin: 'typical' }] }),
    ]);
    expect(screen.getByText(/2 cells need attention/)).toBeVisible();
    await user.click(button('Show the next'));
    expect(within(cellAt(0, 'Noack')).getByRole('textbox')).toHaveFocus();
    await user.click(button('Show the next'));
    await user.keyboard('{Control>}a{/Control}210{Enter}');
    expect(figureOnPage('b', 'flashPoint')?.value).toBe(210);
    expect(screen.getByText(/One cell needs attention/)).toBeVisible();
  });

  it('has a column for each property of the user’s own', async () => {
    const biobased = { id: 'bio', label: 'Biobased', unit: '% m/m', rule: 'linear by mass' as const, digits: 1 };
    const user = setUp([inventedStock('a')], { ownProperties: [biobased] });
    act(() => cellAt(0, 'Biobased').focus());
    await user.keyboard('40{Enter}');
    expect(figureOnPage('a', 'bio')).toEqual({ property: 'bio', value: 40, origin: 'typical' });
  });

  it('keeps what stands behind a figure: origin, method, date, standard deviation', async () => {
    const user = setUp([inventedStock('a', { figures: [kv(40, 30)] })]);
    await user.click(cellAt(0, 'KV 40'));
    await user.keyboard('{Escape}');
    const panel = within(screen.getByRole('region', { name: 'Figure: KV 40 of Stock a' }));
    await user.selectOptions(panel.getByRole('combobox', { name: 'Origin' }), 'measured');
    await user.type(panel.getByRole('textbox', { name: 'Method' }), 'D7042{Enter}');
    await user.type(panel.getByRole('textbox', { name: 'Date' }), '2026-02-30{Enter}');
    expect(panel.getByText(/year-month-day/)).toBeVisible();
    await user.clear(panel.getByRole('textbox', { name: 'Date' }));
    await user.type(panel.getByRole('textbox', { name: 'Date' }), '2026-02-28{Enter}');
    await user.type(panel.getByRole('textbox', { name: /Standard deviation/ }), '0,1{Enter}');
    expect(figureOnPage('a', 'kv', 40)).toEqual({
      property: 'kv',
      celsius: 40,
      value: 30,
      origin: 'measured',
      method: 'D7042',
      date: '2026-02-28',
      standardDeviation: 0.1,
    });
  });

  it('takes a viscosity at a further temperature, which gets a column, and a blending weight', async () => {
    const user = setUp([inventedStock('a', { figures: [kv(40, 30), kv(100, 5)] })]);
    await user.click(cellAt(0, 'KV 40'));
    await user.keyboard('{Escape}');
    await user.type(screen.getByRole('textbox', { name: /Further viscosity at/ }), '20{Enter}');
    await user.type(screen.getByRole('textbox', { name: /Viscosity there/ }), '75{Enter}');
    await user.click(button('Add'));
    expect(figureOnPage('a', 'kv', 20)).toEqual(kv(20, 75));
    expect(cellAt(0, 'KV 20')).toHaveTextContent('75');
    await user.type(screen.getByRole('textbox', { name: /Weight in viscosity blending/ }), '1,3{Enter}');
    expect(stockOnPage('a').blendWeight).toBe(1.3);
  });
});
