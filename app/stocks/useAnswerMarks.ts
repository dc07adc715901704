import { useEffect, useMemo, useRef } from 'react';
import type { Product } from '../../src';
import type { Answer } from '../state/answerStore';
import { type AnswerMarks, answerMarks, sameMarks } from './answerMarks';
import type { Column } from './column';

/** Why stocks stay out of the answer on screen, by stock and column. */
export function useAnswerMarks(products: readonly Product[], columns: readonly Column[], answer: Answer): AnswerMarks {
  const former = useRef<AnswerMarks>(new Map());
  const leftOut = answer.outcome?.leftOut;
  const { omitted } = answer;
  const marks = useMemo(() => {
    const ids = new Set(columns.map(({ id }) => id));
    return sameMarks(former.current, answerMarks(products, leftOut ?? [], omitted, ids));
  }, [products, columns, leftOut, omitted]);
  useEffect(() => {
    former.current = marks;
  }, [marks]);
  return marks;
}
