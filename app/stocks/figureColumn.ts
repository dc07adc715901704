import type { Figure, FigureOrigin, Product, PropertyDefinition } from '../../src';
import { type DecimalSign, formatForEditing, parseNumber } from '../parts/numberText';
import { type CellView, type Column, dropUnread, keepUnread } from './column';
import { figureProblem, unreadReason } from './figureProblem';
import { enteredText, figureText } from './figureText';
import { type FigureAt, figureKey, figureOf, putFigure } from './productFigures';
import { estimatedKv40 } from './statedVi';

/** The word that says a stock takes the value of the rest of the mix. */
const REST = /^(as the )?rest$/i;

const STATES: Partial<Record<FigureOrigin, CellView['state']>> = {
  estimated: 'soft',
  assumed: 'soft',
  'in-blend': 'in-blend',
  'as the rest': 'rest',
};

/** The column of one property (at a temperature [°C]); everything about it comes from the property table. */
export function figureColumn(definition: PropertyDefinition, celsius?: number): Column {
  const at = { property: definition.id, ...(celsius === undefined ? {} : { celsius }) };
  const id = figureKey(at);
  return {
    id,
    label: headingOf(definition, celsius),
    unit: definition.unit === '-' ? undefined : definition.unit,
    title: [
      `${definition.label}${celsius === undefined ? '' : ` at ${celsius} °C`}${definition.unit === '-' ? '' : ` [${definition.unit}]`}`,
      definition.method,
    ].join(', '),
    kind: 'number',
    figure: at,
    read: (product) => viewOf(product, definition, at),
    write: (product, text, sign) => writeFigure(product, at, text, sign),
  };
}

function headingOf({ id, short }: PropertyDefinition, celsius: number | undefined): string {
  if (celsius === undefined) return short;
  return id === 'kv' || id === 'density' ? `${short} ${celsius}` : `${short} ${celsius} °C`;
}

function viewOf(product: Product, definition: PropertyDefinition, at: FigureAt): CellView {
  const unread = product.unread?.[figureKey(at)];
  if (unread !== undefined) return { text: unread, edit: unread, problem: unreadReason(unread) };
  const figure = figureOf(product, at);
  if (!figure)
    return estimateOf(product, definition, at) ?? { text: '–', edit: '', state: 'unknown', title: 'unknown' };
  const title = figureInWords(figure);
  if (figure.origin === 'as the rest') return { text: 'rest', edit: 'rest', state: 'rest', title };
  const problem = figureProblem(product, definition, at);
  return {
    text: enteredText(definition, figure.value),
    edit: formatForEditing(figure.value, 0),
    state: STATES[figure.origin],
    title,
    ...(problem ? { problem } : {}),
  };
}

/** KV40 worked back from KV100 and a stated viscosity index, where nothing better is known. */
function estimateOf(product: Product, definition: PropertyDefinition, at: FigureAt): CellView | undefined {
  const estimate = figureKey(at) === 'kv@40' ? estimatedKv40(product) : undefined;
  if (estimate === undefined || 'problem' in estimate) return undefined;
  const title = 'estimated from KV100 and the stated viscosity index';
  return { text: figureText(definition, estimate.kv40), edit: '', state: 'soft', title };
}

/** "estimated, ASTM D5800, 2026-01-05" */
function figureInWords({ origin, method, date, standardDeviation }: Figure): string {
  const words = origin === 'as the rest' ? 'takes the value of the rest of the mix, up to a small dose' : origin;
  const spread =
    standardDeviation === undefined ? undefined : `standard deviation ${formatForEditing(standardDeviation, 0)}`;
  return [words, method, date, spread].filter(Boolean).join(', ');
}

/** What a new number is: as the old one, but neither an estimate any more nor of the old certificate's date. */
function renewed(old: Figure | undefined, at: FigureAt, value: number): Figure {
  const keeps = old && old.origin !== 'estimated' && old.origin !== 'as the rest';
  const method = old?.method === undefined ? {} : { method: old.method };
  return { ...at, value, origin: keeps ? old.origin : 'typical', ...method };
}

export function writeFigure(product: Product, at: FigureAt, text: string, sign?: DecimalSign): void {
  const id = figureKey(at);
  const old = figureOf(product, at);
  const wasUnread = product.unread?.[id] !== undefined;
  dropUnread(product, id);
  if (REST.test(text.trim())) {
    if (old?.origin !== 'as the rest') putFigure(product, { ...at, origin: 'as the rest' });
    return;
  }
  const parsed = parseNumber(text, sign);
  if ('empty' in parsed) product.figures = product.figures.filter((figure) => figureKey(figure) !== id);
  else if ('problem' in parsed) keepUnread(product, id, text);
  else if (wasUnread || old?.value !== parsed.value) putFigure(product, renewed(old, at, parsed.value));
}
