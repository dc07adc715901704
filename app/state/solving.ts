import { toOrder, type Workbook } from '../../src';
import type { SolveListener, SolverClient } from '../worker/solverClient';
import { answerOf, markAllStale, setAnswer, useAnswers } from './answerStore';
import { environment } from './environment';
import { useView } from './viewStore';
import { useWorkbook } from './workbookStore';

let client: SolverClient | undefined;

/** The engine order last sent for an order, as text: the same question is not asked twice. */
const asked = new Map<string, string>();

function ask(workbook: Workbook, orderId: string): void {
  const workbookOrder = workbook.orders.find(({ id }) => id === orderId);
  if (!workbookOrder || !client) return;
  const { order, omitted, unread, notes } = toOrder(workbook, workbookOrder);
  const question = JSON.stringify(order);
  const { phase, stale } = answerOf(orderId);
  if (asked.get(orderId) === question && phase !== 'failed' && phase !== 'idle') {
    setAnswer(orderId, { stale: phase !== 'answered', omitted, unread, notes });
    return;
  }
  asked.set(orderId, question);
  const sinceMs = phase === 'solving' ? answerOf(orderId).sinceMs : environment().now();
  setAnswer(orderId, {
    phase: 'solving',
    stale: stale || phase !== 'idle',
    omitted,
    unread,
    notes,
    progress: undefined,
    message: undefined,
    sinceMs,
  });
  const isNewest = () => asked.get(orderId) === question;
  const listener: SolveListener = {
    onProgress: (progress) => isNewest() && setAnswer(orderId, { progress }),
    onOutcome(outcome, message) {
      // Not the newest: a newer question is on its way, unless it was cancelled.
      const phase = !isNewest() && asked.has(orderId) ? 'solving' : 'answered';
      setAnswer(orderId, { phase, stale: !isNewest(), outcome, order, message, progress: undefined });
    },
    onFailed(message) {
      if (isNewest()) setAnswer(orderId, { phase: 'failed', stale: true, message, progress: undefined });
    },
    onDropped(why) {
      if (!isNewest()) return;
      asked.delete(orderId);
      setAnswer(orderId, { phase: answerOf(orderId).outcome ? 'answered' : 'idle', stale: true, progress: undefined });
      // Dropped for another order: asked again when its own turn comes, which may be now.
      if (why === 'for a newer order') queueMicrotask(() => askIfUnasked(orderId));
    },
  };
  client.solve(order, listener, orderId);
}

function askIfUnasked(orderId: string): void {
  if (useView.getState().orderId === orderId && !asked.has(orderId)) askForSelected();
}

function askForSelected(): void {
  const { orderId } = useView.getState();
  if (orderId !== undefined) ask(useWorkbook.getState().workbook, orderId);
}

/** Answers of orders that are gone are forgotten; undo brings the order back and asks anew. */
function forgetGone({ orders }: Workbook): void {
  const ids = new Set(orders.map(({ id }) => id));
  const { answers } = useAnswers.getState();
  if (Object.keys(answers).every((id) => ids.has(id))) return;
  for (const id of asked.keys()) if (!ids.has(id)) asked.delete(id);
  useAnswers.setState({ answers: Object.fromEntries(Object.entries(answers).filter(([id]) => ids.has(id))) });
}

/** Keeps the order on screen answered from now on. Returns the function that ends it. */
export function startSolving(solver: SolverClient): () => void {
  client = solver;
  asked.clear();
  const ends = [
    useWorkbook.subscribe(({ workbook }, before) => {
      if (workbook === before.workbook) return;
      markAllStale();
      forgetGone(workbook);
      askForSelected();
    }),
    useView.subscribe(({ orderId }, before) => {
      if (orderId !== before.orderId) askForSelected();
    }),
  ];
  askForSelected();
  return () => {
    for (const end of ends) end();
    client?.dispose();
    client = undefined;
  };
}

/** Ends the solve of the order on screen; the best recipe so far is shown, and said to be no more than that. */
export function cancelSolve(): void {
  client?.cancel(useView.getState().orderId);
}
