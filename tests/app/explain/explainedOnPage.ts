import { setAnswer, useAnswers } from '../../../app/state/answerStore';
import { useExplain } from '../../../app/state/explainStore';
import { selectOrder, useView } from '../../../app/state/viewStore';
import { openWorkbook } from '../../../app/state/workbookStore';
import {
  type BlendOutcome,
  emptyOrder,
  emptyWorkbook,
  type Order,
  type Product,
  type WorkbookOrder,
} from '../../../src';
import { mixOf, orderOf } from '../answer/answers';

export const ID = 'order-1';

const product = (id: string, name: string): Product => ({ id, name, family: 'Group III', figures: [], lots: [] });

/** An answered order on the page, and nothing told of it yet. */
export function answerOnPage({
  order = orderOf(),
  outcome = mixOf(),
  change = {},
}: {
  order?: Order;
  outcome?: BlendOutcome;
  change?: Partial<WorkbookOrder>;
} = {}): { order: Order; outcome: BlendOutcome } {
  const workbook = emptyWorkbook('workbook-1', 'Test workbook');
  workbook.products = [product('light', 'Light oil'), product('heavy', 'Heavy oil'), product('third', 'Third oil')];
  workbook.orders = [{ ...emptyOrder(ID, 'Hydraulic oil'), limits: order.limits, ...change }];
  openWorkbook(workbook);
  selectOrder(ID);
  useView.setState({ message: '' });
  useExplain.setState({ explained: {}, rounding: '' });
  useAnswers.setState({ answers: {} });
  setAnswer(ID, { phase: 'answered', stale: false, order, outcome });
  return { order, outcome };
}
