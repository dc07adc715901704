import type { Product } from '../../src';
import { type DecimalSign, formatForEditing, parseNumber } from '../parts/numberText';

type Steps = Pick<Product, 'priceSteps' | 'priceStepsFor'>;

/** What a text of price steps says, or why it cannot be read, with what to write. */
export type ReadSteps = { steps: Steps } | { problem: string };

const EXAMPLE =
  'Write them as “5 t: 900; 10 t: 880”, with “excess” at the end if they count for the tonnes beyond only.';

/** "5 t: 900; 10 t: 880 excess". */
export function priceStepsText({ priceSteps = [], priceStepsFor }: Steps): string {
  const steps = [...priceSteps].sort((a, b) => a.fromTonnes - b.fromTonnes);
  const text = steps
    .map(
      ({ fromTonnes, pricePerTonne }) => `${formatForEditing(fromTonnes, 0)} t: ${formatForEditing(pricePerTonne, 0)}`,
    )
    .join('; ');
  return text && priceStepsFor === 'the excess' ? `${text} excess` : text;
}

export function readPriceSteps(text: string, sign?: DecimalSign): ReadSteps {
  const excess = /\bexcess\b/i.test(text);
  const parts = text
    .replace(/\(?\bexcess\b\)?/i, '')
    .split(';')
    .map((part) => part.trim())
    .filter(Boolean);
  const priceSteps: NonNullable<Steps['priceSteps']> = [];
  for (const part of parts) {
    const [, quantity, price] = /^(?:from\s+)?(.+?)\s*t?\s*[:=]\s*(.+?)$/i.exec(part) ?? [];
    const from = quantity === undefined ? undefined : parseNumber(quantity, sign);
    const at = price === undefined ? undefined : parseNumber(price, sign);
    if (!from || !at || !('value' in from) || !('value' in at)) {
      return { problem: `“${part}” is not a quantity and a price. ${EXAMPLE}` };
    }
    if (!(from.value > 0)) return { problem: `A price step starts above 0 t. ${EXAMPLE}` };
    priceSteps.push({ fromTonnes: from.value, pricePerTonne: at.value });
  }
  if (priceSteps.length === 0) return { steps: {} };
  return { steps: excess ? { priceSteps, priceStepsFor: 'the excess' } : { priceSteps } };
}
