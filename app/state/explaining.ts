import type { BlendOutcome, Order } from '../../src';
import type { Question, QuestionKind } from '../worker/questions';
import type { SolverClient } from '../worker/solverClient';
import { type Answer, answerOf, useAnswers } from './answerStore';
import { explainedOf, type Rounding, setExplained, useExplain } from './explainStore';
import { stepOf } from './rounding';
import { useView } from './viewStore';
import { useWorkbook } from './workbookStore';

/** An answer is explained once it has stood so long [ms]. */
export const SETTLED_MS = 400;
/** While an edit is still open (a pointer held down, a cell being typed) it takes longer [ms]. */
export const OPEN_EDIT_MS = 1500;

let client: SolverClient | undefined;
/** What is asked and not told yet: the same is not asked twice. */
let pending = new Set<string>();
let giveUpOpinion: (() => void) | undefined;

interface Settled {
  orderId: string;
  order: Order;
  outcome: BlendOutcome;
}

function settled(orderId: string | undefined): Settled | undefined {
  if (orderId === undefined) return undefined;
  const { phase, stale, order, outcome } = answerOf(orderId);
  return phase === 'answered' && !stale && order && outcome ? { orderId, order, outcome } : undefined;
}

function isImpossible({ proof }: BlendOutcome): boolean {
  return proof.kind === 'impossible' || proof.kind === 'impossible with known figures';
}

/** What is to be known of this answer. */
function questionsOf({ order, outcome }: Settled, rounding: Rounding): Question[] {
  if (isImpossible(outcome)) return [{ kind: 'impossible', order }];
  if (!outcome.recipe) return [];
  const step = stepOf(rounding, order);
  return [
    { kind: 'recipe', order, outcome },
    { kind: 'alternatives', order, outcome },
    ...(step === undefined ? [] : [{ kind: 'rounded' as const, order, outcome, step }]),
  ];
}

function isKnown({ orderId, outcome }: Settled, kind: QuestionKind, rounding: Rounding): boolean {
  const explained = explainedOf(orderId);
  return explained[kind]?.outcome === outcome && (kind !== 'rounded' || explained.roundedTo === rounding);
}

function ask(of: Settled, question: Question, rounding: Rounding): void {
  const { orderId, order, outcome } = of;
  const { kind } = question;
  const key = `${orderId} ${kind} ${kind === 'rounded' ? rounding : ''}`;
  if (pending.has(key)) return;
  pending.add(key);
  const mine = pending;
  const is = { outcome, order };
  const alsoRounded = kind === 'rounded' ? { roundedTo: rounding } : {};
  client?.ask(question, {
    onTold(told) {
      mine.delete(key);
      setExplained(orderId, { [told.kind]: { ...is, told: { value: told.value } }, ...alsoRounded });
    },
    onFailed(message) {
      mine.delete(key);
      setExplained(orderId, { [kind]: { ...is, message }, ...alsoRounded });
    },
    onDropped: () => void mine.delete(key),
  });
}

function askAll(): void {
  const of = settled(useView.getState().orderId);
  if (!of) return;
  const { rounding } = useExplain.getState();
  for (const question of questionsOf(of, rounding)) {
    if (!isKnown(of, question.kind, rounding)) ask(of, question, rounding);
  }
}

/** Chooses what recipes are rounded to; the one on screen is rounded at once. */
export function setRounding(rounding: Rounding): void {
  useExplain.setState({ rounding });
  askAll();
}

/** Has the second engine solve the order on screen. */
export function askSecondOpinion(): void {
  const of = settled(useView.getState().orderId);
  if (!of || !client) return;
  const { orderId, order, outcome } = of;
  giveUpOpinion?.();
  setExplained(orderId, { opinion: { outcome, order } });
  giveUpOpinion = client.secondOpinion(order, (opinion) => {
    giveUpOpinion = undefined;
    setExplained(orderId, { opinion: { outcome, order, told: { value: opinion } } });
  });
}

function forgetGone(answers: Readonly<Record<string, Answer>>): void {
  const { explained } = useExplain.getState();
  if (Object.keys(explained).every((id) => id in answers)) return;
  useExplain.setState({ explained: Object.fromEntries(Object.entries(explained).filter(([id]) => id in answers)) });
}

/** Keeps the answer on screen explained from now on, once it has settled. Returns the function that ends it. */
export function startExplaining(solver: SolverClient): () => void {
  client = solver;
  pending = new Set();
  let timer: ReturnType<typeof setTimeout> | undefined;
  const later = () => {
    clearTimeout(timer);
    if (!settled(useView.getState().orderId)) return;
    const isOpen = useWorkbook.getState().past.at(-1)?.join !== undefined;
    timer = setTimeout(askAll, isOpen ? OPEN_EDIT_MS : SETTLED_MS);
  };
  const ends = [
    useAnswers.subscribe(({ answers }) => {
      forgetGone(answers);
      later();
    }),
    useView.subscribe(({ orderId }, before) => {
      if (orderId !== before.orderId) later();
    }),
    useWorkbook.subscribe(({ past }, before) => {
      // The end of a drag.
      if (past !== before.past) later();
    }),
  ];
  later();
  return () => {
    clearTimeout(timer);
    giveUpOpinion?.();
    giveUpOpinion = undefined;
    for (const end of ends) end();
    client = undefined;
  };
}
