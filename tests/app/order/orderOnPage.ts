import { setAnswer, useAnswers } from '../../../app/state/answerStore';
import { selectOrder } from '../../../app/state/viewStore';
import { openWorkbook, useWorkbook } from '../../../app/state/workbookStore';
import { type BlendOutcome, emptyOrder, emptyWorkbook, type Order, type Stock, type WorkbookOrder } from '../../../src';

export const ORDER_ID = 'order-1';

/** Two invented stocks with the figures a hydraulic oil is limited by. */
export const STOCKS: Stock[] = [
  invented('thin', 'Thin stock', 880, 30.4, 5.15),
  invented('thick', 'Thick stock', 905, 96, 10.8),
];

function invented(id: string, name: string, pricePerTonne: number, kv40: number, kv100: number): Stock {
  return {
    id,
    name,
    family: 'Group I',
    pricePerTonne,
    figures: [
      { property: 'kv', celsius: 40, value: kv40, origin: 'typical' },
      { property: 'kv', celsius: 100, value: kv100, origin: 'typical' },
      { property: 'density', celsius: 15, value: 870, origin: 'typical' },
    ],
  };
}

/** Puts a workbook with one order on the page, without solver or storage. */
export function putOrderOnPage(change: Partial<WorkbookOrder> = {}): void {
  const workbook = emptyWorkbook('workbook-1', 'Test workbook');
  workbook.products = STOCKS.map((stock) => ({ ...stock, lots: [] }));
  workbook.orders = [{ ...emptyOrder(ORDER_ID, 'Hydraulic oil'), ...change }];
  openWorkbook(workbook);
  useAnswers.setState({ answers: {} });
  selectOrder(ORDER_ID);
}

export function orderOnPage(): WorkbookOrder {
  const [order] = useWorkbook.getState().workbook.orders;
  if (!order) throw new Error('There is no order on the page.');
  return order;
}

/** Answers the order as the solver would. */
export function answerWith(outcome: Partial<BlendOutcome>, order: Partial<Order> = {}): void {
  setAnswer(ORDER_ID, {
    phase: 'answered',
    stale: false,
    order: { stocks: STOCKS, limits: orderOnPage().limits, ...order },
    outcome: {
      stopped: 'finished',
      proof: { kind: 'least cost' },
      checks: [],
      leftOut: [],
      cautions: [],
      problems: [],
      work: { nodes: 1, linearPrograms: 1, milliseconds: 1 },
      ...outcome,
    },
  });
}
