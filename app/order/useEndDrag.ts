import { type KeyboardEvent, type PointerEvent, useEffect, useRef, useState } from 'react';
import { dragStep, fromFraction, type RailScale, snap, toFraction } from './railScale';

export interface EndDragOptions {
  value: number;
  scale: RailScale;
  /** Width of the drawn scale [px] and where it starts within the drawing [px]. */
  width: number;
  left: number;
  reportingUnit: number;
  /** The end may not be dragged past these. */
  least: number;
  most: number;
  /** Told at most once a frame while the end moves, less often where the page cannot keep up. */
  onMove(value: number): void;
  /** The move is over: one entry to undo. */
  onEnd(): void;
  onDragging(dragging: boolean): void;
}

/** Moves one end of a limit by pointer (captured, so that a finger may stray) and by keys. */
export function useEndDrag(options: EndDragOptions) {
  const latest = useRef(options);
  latest.current = options;
  const frame = useRef<number>(undefined);
  const waiting = useRef<number>(undefined);
  /** Where on its grip the end was taken [px]: the end stays under the finger, and does not jump to it. */
  const grip = useRef(0);
  /** Where the drawing starts on the page [px], read when the end is taken: read at every move it would cost a layout. */
  const start = useRef(0);
  const [dragging, setDragging] = useState(false);

  useEffect(() => () => cancelFrame(frame.current), []);

  function move(value: number) {
    const { least, most } = latest.current;
    waiting.current = Math.min(Math.max(value, least), most);
    frame.current ??= requestAnimationFrame(flush);
  }

  function flush() {
    cancelFrame(frame.current);
    frame.current = undefined;
    const value = waiting.current;
    waiting.current = undefined;
    if (value === undefined || value === latest.current.value) return;
    latest.current.onMove(value);
    const edited = performance.now();
    frame.current = requestAnimationFrame(() => {
      frame.current = undefined;
      if (waiting.current === undefined) return;
      // An edit and its recipe that took longer than a frame have the next one to themselves.
      if (performance.now() - edited > LONG_FRAME_MS) frame.current = requestAnimationFrame(flush);
      else flush();
    });
  }

  function valueAt(event: PointerEvent<SVGGElement>): number {
    const { scale, width, reportingUnit } = latest.current;
    const fraction = placeOf(event) - grip.current / width;
    const step = dragStep(scale, width, reportingUnit);
    return snap(fromFraction(scale, Math.min(Math.max(fraction, 0), 1)), step);
  }

  /** The pointer's place along the scale, as a fraction of it. */
  function placeOf(event: PointerEvent<SVGGElement>): number {
    const { width, left } = latest.current;
    return (event.clientX - start.current - left) / width;
  }

  function setActive(active: boolean) {
    setDragging(active);
    latest.current.onDragging(active);
  }

  function finish() {
    if (!dragging) return;
    flush();
    setActive(false);
    latest.current.onEnd();
  }

  function onKeyDown(event: KeyboardEvent) {
    const { value, scale, width, reportingUnit, least, most } = latest.current;
    const step = dragStep(scale, width, reportingUnit) * (event.shiftKey ? 10 : 1);
    const next = {
      ArrowLeft: value - step,
      ArrowDown: value - step,
      ArrowRight: value + step,
      ArrowUp: value + step,
      PageDown: value - 10 * step,
      PageUp: value + 10 * step,
      Home: Math.max(scale.lo, least),
      End: Math.min(scale.hi, most),
    }[event.key];
    if (next === undefined) return;
    event.preventDefault();
    const tidy = Number(next.toPrecision(10));
    latest.current.onMove(Math.min(Math.max(tidy, least), most));
  }

  return {
    dragging,
    handlers: {
      onPointerDown(event: PointerEvent<SVGGElement>) {
        if (event.button !== 0) return;
        event.preventDefault();
        event.currentTarget.focus();
        event.currentTarget.setPointerCapture(event.pointerId);
        start.current = event.currentTarget.ownerSVGElement?.getBoundingClientRect().left ?? 0;
        const { scale, width, value } = latest.current;
        grip.current = (placeOf(event) - toFraction(scale, value)) * width;
        setActive(true);
      },
      onPointerMove(event: PointerEvent<SVGGElement>) {
        if (dragging) move(valueAt(event));
      },
      onPointerUp: finish,
      onPointerCancel: finish,
      onLostPointerCapture: finish,
      onKeyDown,
      onBlur: () => latest.current.onEnd(),
    },
  };
}

/** A frame that took longer than this lost the next one [ms]. */
const LONG_FRAME_MS = 18;

function cancelFrame(frame: number | undefined) {
  if (frame !== undefined) cancelAnimationFrame(frame);
}
