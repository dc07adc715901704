import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { AnswerBar } from '../../../app/shell/AnswerBar';
import { OrderList } from '../../../app/shell/OrderList';
import { setAnswer } from '../../../app/state/answerStore';
import { selectOrder, useView } from '../../../app/state/viewStore';
import { editWorkbook, useWorkbook } from '../../../app/state/workbookStore';
import { emptyOrder } from '../../../src';
import { answerWith, ORDER_ID, putOrderOnPage } from '../order/orderOnPage';

function Page() {
  const orderId = useView((view) => view.orderId);
  return (
    <>
      <OrderList orderId={orderId} />
      <AnswerBar orderId={orderId} />
    </>
  );
}

function setUp() {
  putOrderOnPage();
  editWorkbook('add', ({ orders }) => void orders.push(emptyOrder('order-2', 'Gear oil')));
  render(<Page />);
  return userEvent.setup();
}

const orderNames = () => useWorkbook.getState().workbook.orders.map(({ name }) => name);

describe('the list of orders', () => {
  it('shows each order with its state', () => {
    setUp();
    act(() => answerWith({ recipe: [], costPerTonne: 912.6 }));
    const [first, second] = screen.getAllByRole('listitem');
    if (!first || !second) throw new Error('Two orders should be listed.');
    expect(first).toHaveTextContent('Hydraulic oil€913/t proven cheapest');
    expect(second).toHaveTextContent('Gear oilnot worked out yet');
  });

  it('puts an order on the page, by list and by select', async () => {
    const user = setUp();
    await user.click(screen.getByRole('button', { name: /Gear oil/ }));
    expect(useView.getState().orderId).toBe('order-2');
    await user.selectOptions(screen.getByRole('combobox', { name: 'Order on the page' }), 'Hydraulic oil');
    expect(useView.getState().orderId).toBe(ORDER_ID);
  });

  it('starts, duplicates and deletes orders', async () => {
    const user = setUp();
    await user.click(screen.getByRole('button', { name: 'Duplicate order' }));
    expect(orderNames()).toHaveLength(3);
    await user.click(screen.getByRole('button', { name: 'New' }));
    expect(orderNames()).toHaveLength(4);
    act(() => selectOrder(ORDER_ID));
    await user.click(screen.getByRole('button', { name: 'Delete order' }));
    expect(orderNames()).not.toContain('Hydraulic oil');
  });
});

describe('the bar at the foot', () => {
  it('keeps cost and proof in sight, and says when they are out of date', async () => {
    setUp();
    act(() => answerWith({ recipe: [], costPerTonne: 912.6 }));
    const bar = within(screen.getByRole('link', { name: /^To the answer/ }));
    expect(screen.getByRole('link')).toHaveAccessibleName(/^To the answer:\s*€913.t\s*proven cheapest$/);
    act(() => setAnswer(ORDER_ID, { stale: true }));
    expect(await bar.findByText('being worked out again')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: /^To the answer/ })).not.toHaveAccessibleName(/proven/);
  });
});
