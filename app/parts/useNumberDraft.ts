import { type ChangeEvent, type FocusEvent, type KeyboardEvent, useRef, useState } from 'react';
import { formatForEditing, formatNumber, parseNumber, unreadInWords } from './numberText';

export interface NumberDraftOptions {
  value?: number;
  /** Decimals shown at least. */
  digits: number;
  /** What one arrow key adds; default one unit of the last digit. */
  step?: number;
  /** Values outside cannot be right and are not taken. */
  sense?: { min: number; max: number };
  /** Why a readable number is not taken all the same, or nothing. */
  check?(value: number): string | undefined;
  /** Undefined where the field was emptied. */
  onCommit(value: number | undefined): void;
  /** Told of each readable number while it is being typed. */
  onDraft?(value: number): void;
  /** Text that an earlier reading could not make sense of, kept as typed. */
  unreadText?: string;
  /** Told of a text that cannot be read, so that it can be kept. */
  onUnread?(text: string): void;
}

type Reading = { value: number | undefined } | { problem: string };

/** The life of a number being typed: draft, reading, commit, revert, step. */
export function useNumberDraft(options: NumberDraftOptions) {
  const { value, digits, unreadText, onCommit, onDraft, onUnread } = options;
  const [draft, setDraft] = useState<string>();
  const [problem, setProblem] = useState<string>();
  const [seenValue, setSeenValue] = useState(value);
  const [restored, setRestored] = useState<{ value: number | undefined }>();
  const atFocus = useRef<{ value: number | undefined }>(undefined);
  const stepped = useRef(false);

  // An undo or a drag elsewhere changed the value: what was left unread no longer speaks of it.
  if (!Object.is(seenValue, value)) {
    setSeenValue(value);
    if (problem !== undefined && !(restored && Object.is(restored.value, value))) {
      setProblem(undefined);
      setDraft(undefined);
    }
  }

  const shown = draft ?? unreadText ?? formatForEditing(value, digits);

  function read(text: string): Reading {
    const parsed = parseNumber(text);
    if ('empty' in parsed) return { value: undefined };
    if ('problem' in parsed) return { problem: withLastGood(parsed.problem) };
    const { sense } = options;
    if (sense && (parsed.value < sense.min || parsed.value > sense.max)) {
      return { problem: withLastGood(`${text.trim()} cannot be right: expected ${rangeText(sense, digits)}.`) };
    }
    const refused = options.check?.(parsed.value);
    return refused ? { problem: withLastGood(refused) } : { value: parsed.value };
  }

  function withLastGood(text: string): string {
    const counting = onDraft && atFocus.current ? atFocus.current.value : value;
    if (counting === undefined || onUnread) return text;
    return `${text} Until then ${formatForEditing(counting, digits)} counts.`;
  }

  /** Numbers that were only on the way to a text that is not taken ("4" of "4O.5") count for nothing. */
  function restore(put: (value: number | undefined) => void) {
    const start = atFocus.current;
    if (!onDraft || !start || Object.is(start.value, value)) return;
    setRestored(start);
    put(start.value);
  }

  function commit() {
    if (draft === undefined) {
      if (stepped.current) onCommit(value);
      stepped.current = false;
      return;
    }
    const reading = read(draft);
    if ('problem' in reading) {
      setProblem(reading.problem);
      restore(onCommit);
      onUnread?.(draft);
      return;
    }
    setDraft(undefined);
    setProblem(undefined);
    if (!Object.is(reading.value, atFocus.current?.value) || unreadText !== undefined || problem !== undefined) {
      onCommit(reading.value);
    }
    atFocus.current = { value: reading.value };
  }

  function revert() {
    const start = atFocus.current;
    setDraft(undefined);
    setProblem(undefined);
    stepped.current = false;
    if (start && !Object.is(start.value, value)) onCommit(start.value);
  }

  function stepBy(steps: number) {
    const reading = read(shown);
    const from = 'value' in reading ? reading.value : value;
    if (from === undefined) return;
    const step = options.step ?? 10 ** -digits;
    const next = Number((from + steps * step).toFixed(10));
    const { sense } = options;
    if (sense && (next < sense.min || next > sense.max)) return;
    setProblem(undefined);
    setDraft(undefined);
    stepped.current = onDraft !== undefined;
    if (onDraft) onDraft(next);
    else onCommit(next);
  }

  function onKeyDown(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === 'Enter') commit();
    else if (event.key === 'Escape' && (draft !== undefined || stepped.current)) {
      // In a dialog the first Escape is for the draft, not for closing.
      event.preventDefault();
      event.stopPropagation();
      revert();
    } else if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      event.preventDefault();
      stepBy((event.key === 'ArrowUp' ? 1 : -1) * (event.shiftKey ? 10 : 1));
    }
  }

  function onChange(event: ChangeEvent<HTMLInputElement>) {
    const text = event.target.value;
    setDraft(text);
    setProblem(undefined);
    const reading = read(text);
    if ('problem' in reading) restore((start) => start !== undefined && onDraft?.(start));
    else if (onDraft && reading.value !== undefined) onDraft(reading.value);
  }

  return {
    problem: problem ?? (draft === undefined && unreadText !== undefined ? unreadInWords(unreadText) : undefined),
    dirty: draft !== undefined && problem === undefined,
    inputProps: {
      value: shown,
      onChange,
      onKeyDown,
      onFocus(event: FocusEvent<HTMLInputElement>) {
        atFocus.current = { value };
        event.target.select();
      },
      onBlur: commit,
    },
  };
}

function rangeText(sense: { min: number; max: number }, digits: number): string {
  const bound = (value: number) => formatNumber(value, Number.isInteger(value) ? 0 : digits);
  if (sense.max === Infinity) return `at least ${bound(sense.min)}`;
  if (sense.min === -Infinity) return `at most ${bound(sense.max)}`;
  return `${bound(sense.min)} to ${bound(sense.max)}`;
}
