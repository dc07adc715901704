import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { undo, useWorkbook } from '../../../app/state/workbookStore';
import { StocksTable } from '../../../app/stocks/StocksTable';
import type { Product } from '../../../src';
import { cellAt, figureOnPage, inventedStock, kv, putStocksOnPage, stockOnPage } from './stocksOnPage';

function setUp(products: Product[] = [inventedStock('a'), inventedStock('b')]) {
  putStocksOnPage(products);
  render(<StocksTable />);
  return userEvent.setup();
}

const steps = () => useWorkbook.getState().past.length;

describe('typing in a cell', () => {
  it('starts with the key typed, is taken by Enter and goes down, as one step', async () => {
    const user = setUp();
    act(() => cellAt(0, 'Price').focus());
    await user.keyboard('915{Enter}');
    expect(stockOnPage('a').pricePerTonne).toBe(915);
    expect(cellAt(1, 'Price')).toHaveFocus();
    expect(steps()).toBe(1);
    act(() => undo());
    expect(stockOnPage('a').pricePerTonne).toBe(900);
  });

  it('is taken by Tab and goes right; Shift and Tab goes left', async () => {
    const user = setUp();
    await user.click(cellAt(0, 'KV 40'));
    await user.keyboard('30,4{Tab}');
    expect(figureOnPage('a', 'kv', 40)).toEqual({ property: 'kv', celsius: 40, value: 30.4, origin: 'typical' });
    expect(cellAt(0, 'KV 100')).toHaveFocus();
    await user.keyboard('5.2{Shift>}{Tab}{/Shift}');
    expect(figureOnPage('a', 'kv', 100)?.value).toBe(5.2);
    expect(cellAt(0, 'KV 40')).toHaveFocus();
  });

  it('is given up by Escape, which leaves no step', async () => {
    const user = setUp();
    await user.click(cellAt(0, 'Price'));
    await user.keyboard('1{Escape}');
    expect(stockOnPage('a').pricePerTonne).toBe(900);
    expect(cellAt(0, 'Price')).toHaveFocus();
    expect(steps()).toBe(0);
  });

  it('is taken when the pointer goes elsewhere', async () => {
    const user = setUp();
    await user.click(cellAt(0, 'Price'));
    await user.keyboard('{Control>}a{/Control}870');
    await user.click(cellAt(1, 'KV 100'));
    expect(stockOnPage('a').pricePerTonne).toBe(870);
  });

  it('opens with F2 on what the cell holds, and leaves no step where nothing changed', async () => {
    const user = setUp();
    act(() => cellAt(0, 'Stock').focus());
    await user.keyboard('{F2}');
    expect(within(cellAt(0, 'Stock')).getByRole('textbox')).toHaveValue('Stock a');
    await user.keyboard('{Enter}');
    expect(steps()).toBe(0);
  });

  it('moves with the arrows between cells, and clears with Delete: the figure is then unknown, not zero', async () => {
    const user = setUp([inventedStock('a', { figures: [kv(40, 30), kv(100, 5)] }), inventedStock('b')]);
    act(() => cellAt(1, 'KV 40').focus());
    await user.keyboard('{ArrowUp}{ArrowRight}');
    expect(cellAt(0, 'KV 100')).toHaveFocus();
    await user.keyboard('{Delete}');
    expect(stockOnPage('a').figures).toEqual([kv(40, 30)]);
    expect(cellAt(0, 'KV 100')).toHaveAttribute('title', expect.stringContaining('unknown'));
    act(() => undo());
    expect(stockOnPage('a').figures).toContainEqual(kv(100, 5));
  });

  it('keeps one cell within reach of the Tab key', async () => {
    const user = setUp();
    await user.click(cellAt(1, 'KV 100'));
    await user.keyboard('{Escape}');
    const reached = screen.getAllByRole('gridcell').filter((cell) => cell.tabIndex === 0);
    expect(reached).toEqual([cellAt(1, 'KV 100')]);
  });

  it('does not write an old text over a change made elsewhere while the cell stood open', async () => {
    const user = setUp();
    await user.click(cellAt(0, 'Price'));
    act(() =>
      useWorkbook.setState(({ workbook }) => ({
        workbook: { ...workbook, products: [inventedStock('a', { pricePerTonne: 777 }), inventedStock('b')] },
      })),
    );
    await user.keyboard('{Enter}');
    expect(stockOnPage('a').pricePerTonne).toBe(777);
  });

  it('gives no way to type over the sum of several lots, or over a calculated index', async () => {
    const lot = { id: 'l', name: 'L', availableTonnes: 1, figures: [] };
    const user = setUp([inventedStock('a', { figures: [kv(40, 30), kv(100, 5)], lots: [lot, { ...lot, id: 'm' }] })]);
    for (const heading of ['On hand', 'VI']) {
      await user.click(cellAt(0, heading));
      expect(within(cellAt(0, heading)).queryByRole('textbox')).toBeNull();
      expect(cellAt(0, heading)).toHaveAttribute('aria-readonly', 'true');
      await user.keyboard('{Delete}');
    }
    expect(steps()).toBe(0);
  });

  it('chooses a family from the list', async () => {
    const user = setUp();
    await user.click(cellAt(0, 'Family'));
    await user.selectOptions(within(cellAt(0, 'Family')).getByRole('combobox'), 'PAO');
    expect(stockOnPage('a').family).toBe('PAO');
  });
});

describe('figures', () => {
  it('keep their origin when typed anew, except where the value was none of its own', async () => {
    const user = setUp([
      inventedStock('a', {
        figures: [
          { property: 'noack', value: 12, origin: 'measured' },
          { property: 'flashPoint', origin: 'as the rest' },
        ],
      }),
    ]);
    act(() => cellAt(0, 'Noack').focus());
    await user.keyboard('13{Enter}');
    expect(figureOnPage('a', 'noack')).toMatchObject({ value: 13, origin: 'measured' });
    act(() => cellAt(0, 'Flash').focus());
    await user.keyboard('220{Enter}');
    expect(figureOnPage('a', 'flashPoint')).toMatchObject({ value: 220, origin: 'typical' });
  });

  it('take the value of the rest where “rest” is typed', async () => {
    const user = setUp();
    act(() => cellAt(0, 'Noack').focus());
    await user.keyboard('rest{Enter}');
    expect(figureOnPage('a', 'noack')).toEqual({ property: 'noack', origin: 'as the rest' });
    expect(cellAt(0, 'Noack')).toHaveTextContent('rest');
  });

  it('keep a text that is no number as typed, say why, and undo', async () => {
    const user = setUp([inventedStock('a', { figures: [kv(100, 5)] }), inventedStock('b')]);
    act(() => cellAt(0, 'KV 100').focus());
    await user.keyboard('5.2x{Enter}');
    expect(stockOnPage('a').unread).toEqual({ 'kv@100': '5.2x' });
    const cell = cellAt(0, 'KV 100');
    expect(cell).toHaveTextContent('5.2x');
    expect(cell).toBeInvalid();
    act(() => cell.focus());
    expect(cell).toHaveAccessibleDescription(/“5.2x” is not a number.*unknown/);
    act(() => undo());
    expect(stockOnPage('a').unread).toBeUndefined();
    expect(figureOnPage('a', 'kv', 100)?.value).toBe(5);
  });

  it('refuse to guess what 1,234 means', async () => {
    const user = setUp();
    act(() => cellAt(0, 'Price').focus());
    await user.keyboard('1,234{Enter}');
    expect(stockOnPage('a').unread).toEqual({ pricePerTonne: '1,234' });
    expect(cellAt(0, 'Price')).toHaveAttribute('title', expect.stringContaining('Write 1234 or 1.234'));
  });

  it('say at both cells that KV40 must be above KV100', () => {
    setUp([inventedStock('a', { figures: [kv(40, 5), kv(100, 30)] })]);
    for (const heading of ['KV 40', 'KV 100']) {
      expect(cellAt(0, heading)).toBeInvalid();
      expect(cellAt(0, heading)).toHaveAttribute('title', expect.stringContaining('KV40 must be above KV100'));
    }
    expect(cellAt(0, 'VI')).toHaveTextContent('–');
  });

  it('outside of what can be right are marked; a price below zero is only asked about', () => {
    setUp([
      inventedStock('a', { pricePerTonne: -20, figures: [{ property: 'noack', value: 130, origin: 'typical' }] }),
    ]);
    expect(cellAt(0, 'Noack')).toBeInvalid();
    expect(cellAt(0, 'Noack')).toHaveAttribute('title', expect.stringContaining('expected 0 to 100'));
    expect(cellAt(0, 'Price')).toBeValid();
    expect(cellAt(0, 'Price')).toHaveAttribute('title', expect.stringContaining('Below zero'));
  });
});

describe('viscosity index', () => {
  // Worked example of ASTM D2270 for a VI above 100, from memory: KV40 22.83 and KV100 5.05 give 156.
  it('is calculated from KV40 and KV100 and cannot be typed', async () => {
    const user = setUp([inventedStock('a', { figures: [kv(40, 22.83), kv(100, 5.05)] })]);
    expect(cellAt(0, 'VI')).toHaveTextContent('156');
    await user.click(cellAt(0, 'VI'));
    await user.keyboard('99{Enter}');
    expect(cellAt(0, 'VI')).toHaveTextContent('156');
    expect(steps()).toBe(0);
  });

  it('does not exist below a KV100 of 2 mm²/s (ASTM D2270)', () => {
    setUp([inventedStock('a', { figures: [kv(40, 5), kv(100, 1.7)] })]);
    expect(cellAt(0, 'VI')).toHaveTextContent('–');
    expect(cellAt(0, 'VI')).toHaveAttribute('title', expect.stringContaining('not defined'));
  });

  it('stated on a data sheet gives an estimated KV40, marked as one', () => {
    const vi = { property: 'vi', value: 156, origin: 'typical' } as const;
    setUp([inventedStock('a', { figures: [kv(100, 5.05), vi] })]);
    expect(cellAt(0, 'KV 40')).toHaveTextContent(/22\.8/);
    expect(cellAt(0, 'KV 40')).toHaveTextContent(/estimated/);
    expect(cellAt(0, 'VI')).toHaveTextContent('156');
    expect(figureOnPage('a', 'kv', 40)).toBeUndefined();
  });
});
