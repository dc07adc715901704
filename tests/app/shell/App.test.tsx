import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it } from 'vitest';
import { App } from '../../../app/shell/App';
import { COMMANDS } from '../../../app/state/commands';
import { selectOrder } from '../../../app/state/viewStore';
import { openWorkbook, useWorkbook } from '../../../app/state/workbookStore';
import { emptyOrder, emptyWorkbook } from '../../../src';
import { resetStores, testEnvironment } from '../state/testEnvironment';
import { inventedStock } from '../stocks/stocksOnPage';

beforeEach(() => {
  resetStores();
  testEnvironment();
});

const orderNames = () => useWorkbook.getState().workbook.orders.map(({ name }) => name);

describe('an empty workbook', () => {
  it('says what the program is for, and that no figures leave the computer', () => {
    render(<App />);
    const purposes = screen.getAllByText(/cheapest blend of your base stocks.* Nothing leaves this computer\.$/);
    expect(purposes.map((line) => line.closest('footer') === null)).toEqual([true, false]);
    act(() => openWorkbook({ ...emptyWorkbook('w', 'W'), products: [inventedStock('a')] }));
    expect(screen.getAllByText(/cheapest blend of your base stocks/)).toHaveLength(1);
  });

  it('leads on from the answer’s place: to a new order, whose name is typed at once', async () => {
    const user = userEvent.setup();
    render(<App />);
    const start = screen.getByRole('button', { name: 'New order' });
    const answer = within(start.closest('section') as HTMLElement);
    expect(answer.getByRole('heading', { name: 'Answer' })).toBeVisible();
    expect(answer.getByText(/^No order yet/)).toBeVisible();
    expect(answer.getByRole('button', { name: 'Open the demo' })).toBeEnabled();
    await user.click(start);
    await user.keyboard('VG 46{Enter}');
    expect(orderNames()).toEqual(['VG 46']);
  });
});

it('asks for the name of a copied order, and leaves the focus alone where an order is only chosen', async () => {
  const user = userEvent.setup();
  openWorkbook({ ...emptyWorkbook('w', 'W'), orders: [emptyOrder('o', 'First'), emptyOrder('p', 'Second')] });
  act(() => selectOrder('o'));
  render(<App />);
  await user.click(screen.getByRole('button', { name: 'Duplicate order' }));
  await user.keyboard('Third{Enter}');
  expect(orderNames()).toEqual(['First', 'Third', 'Second']);
  await user.click(screen.getByRole('button', { name: /^Second/ }));
  expect(screen.getByRole('button', { name: /^Second/ })).toHaveFocus();
  act(() => COMMANDS.undo.run());
  expect(screen.getByRole('button', { name: /^Second/ })).toHaveFocus();
});
