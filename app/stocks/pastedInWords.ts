import type { Pasted } from './pasteStocks';

const count = (n: number, one: string, more = `${one}s`) => `${n} ${n === 1 ? one : more}`;
const named = (texts: readonly string[]) => [...new Set(texts)].map((text) => `“${text}”`).join(', ');

/** What a paste did, and what it could not take, in sentences. */
export function pastedInWords(pasted: Pasted): string {
  const { changed, added, unread, conversions, strangeFamilies, strangeUnits, locked, leftOut, beyond } = pasted;
  const done = [added && `${count(added, 'stock')} added`, changed && `${count(changed, 'stock')} changed`];
  const sentences = [
    [...done, unread && `${count(unread, 'cell')} could not be read`].filter(Boolean).join(', '),
    conversions.length > 0 && `Converted: ${conversions.join(', ')}`,
    strangeUnits.length > 0 && `Left out for its unit: ${strangeUnits.join(', ')}`,
    leftOut.length > 0 && `Left out, not a column here or twice: ${named(leftOut)}`,
    beyond > 0 && `Left out, no column at the right: ${count(beyond, 'pasted column')}`,
    strangeFamilies.length > 0 &&
      `Taken as “other”, not a family here: ${count(strangeFamilies.length, 'stock')} with ${named(strangeFamilies)}`,
    locked.length > 0 && `Not taken where calculated here: ${locked.join(', ')}`,
  ];
  return `${sentences.filter(Boolean).join('. ')}. Undo takes it back.`;
}
