import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { useWorkbook } from '../../../app/state/workbookStore';
import { StocksTable } from '../../../app/stocks/StocksTable';
import type { Product } from '../../../src';
import { cellAt, figureOnPage, inventedStock, kv, putStocksOnPage, stockOnPage } from './stocksOnPage';

function setUp(products: Product[] = [inventedStock('a'), inventedStock('b')]) {
  putStocksOnPage(products);
  render(
    <>
      <StocksTable />
      <button type="button">After the table</button>
    </>,
  );
  return userEvent.setup();
}

const steps = () => useWorkbook.getState().past.length;

describe('the Tab key in the table', () => {
  it('passes over what cannot be typed in, while editing and while not', async () => {
    const user = setUp([inventedStock('a', { figures: [kv(40, 22.83), kv(100, 5.05)] }), inventedStock('b')]);
    await user.click(cellAt(0, 'Stock'));
    await user.keyboard('{Control>}a{/Control}First{Tab}Maker{Tab}');
    expect(stockOnPage('a')).toMatchObject({ name: 'First', supplier: 'Maker' });
    act(() => cellAt(0, 'KV 100').focus());
    await user.keyboard('{Tab}12{Tab}');
    expect(figureOnPage('a', 'noack')?.value).toBe(12);
    await user.keyboard('{Shift>}{Tab}{Tab}{/Shift}');
    expect(cellAt(0, 'KV 100')).toHaveFocus();
  });

  it('goes from the end of a row to the next one, and back', async () => {
    const user = setUp();
    act(() => cellAt(0, 'Flags').focus());
    await user.keyboard('food contact{Tab}Second{Shift>}{Tab}{/Shift}');
    expect(stockOnPage('b').name).toBe('Second');
    expect(cellAt(0, 'Flags')).toHaveFocus();
  });

  it('stays in the last cell with a word, and leaves after Escape', async () => {
    const user = setUp();
    act(() => cellAt(1, 'Flags').focus());
    await user.keyboard('tested{Tab}');
    expect(stockOnPage('b').flags).toEqual(['tested']);
    expect(cellAt(1, 'Flags')).toHaveFocus();
    expect(screen.getByText(/no further cell to type in\. Escape, then Tab leaves the table/)).toBeVisible();
    await user.keyboard('{Escape}{Tab}');
    expect(screen.getByRole('grid')).not.toContainElement(document.activeElement as HTMLElement);
  });

  it('is explained where the table is read out', () => {
    setUp();
    expect(screen.getByRole('grid')).toHaveAccessibleDescription(/Escape, then Tab leaves the table/);
  });
});

describe('typing where nothing can be typed', () => {
  it.each(['VI', 'In recipe'])('is refused in sight: %s', async (heading) => {
    const user = setUp([inventedStock('a', { figures: [kv(40, 22.83), kv(100, 5.05)] })]);
    act(() => cellAt(0, heading).focus());
    await user.keyboard('9');
    expect(screen.getByText(new RegExp(`^${heading}: calculated: cannot be typed`))).toBeVisible();
    expect(steps()).toBe(0);
    await user.keyboard('{ArrowLeft}');
    expect(screen.queryByText(/cannot be typed/)).toBeNull();
  });
});

describe('a family by keyboard', () => {
  const field = () => within(cellAt(0, 'Family')).getByRole('textbox');

  it.each([
    ['depressant', 'depressant'],
    ['e', 'ester'],
    ['gr. III', 'Group III'],
  ])('“%s” is taken by Enter, its first letter included, as %s', async (typed, family) => {
    const user = setUp();
    act(() => cellAt(0, 'Family').focus());
    await user.keyboard(typed);
    expect(stockOnPage('a').family).toBe('Group I');
    await user.keyboard('{Enter}');
    expect(stockOnPage('a').family).toBe(family);
    expect(steps()).toBe(1);
  });

  it('is typed over the open list too', async () => {
    const user = setUp();
    await user.click(cellAt(0, 'Family'));
    await user.keyboard('depressant{Tab}');
    expect(stockOnPage('a').family).toBe('depressant');
    expect(cellAt(0, 'Price')).toHaveFocus();
  });

  it.each([
    ['Group IX', /“Group IX” is no family here/],
    ['pa', /Type more: PAO, package/],
  ])('“%s” is refused with a word', async (typed, words) => {
    const user = setUp();
    act(() => cellAt(0, 'Family').focus());
    await user.keyboard(`${typed}{Tab}`);
    expect(stockOnPage('a').family).toBe('Group I');
    expect(field()).toHaveFocus();
    expect(field()).toBeInvalid();
    expect(field()).toHaveAccessibleDescription(words);
    await user.keyboard('{Escape}');
    expect(steps()).toBe(0);
  });

  it('left half typed stays as it was, and says so; Delete does not make it another', async () => {
    const user = setUp();
    act(() => cellAt(0, 'Family').focus());
    await user.keyboard('Group IX');
    await user.click(screen.getByRole('button', { name: 'After the table' }));
    expect(stockOnPage('a').family).toBe('Group I');
    expect(screen.getByText(/“Group IX” was not taken/)).toBeVisible();
    act(() => cellAt(0, 'Family').focus());
    await user.keyboard('{Delete}');
    expect(stockOnPage('a').family).toBe('Group I');
  });
});
