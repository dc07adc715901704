/**
 * Reads source text for correlations whose doc comment does not say enough. A correlation is an exported function
 * that returns numbers, or a blending index. Its words are its own comment and the file's opening comment.
 */

export interface Correlation {
  name: string;
  /** Own doc comment and the file's opening one. */
  words: string;
  /** Declaration and body, without comments. */
  code: string;
}

/** Blending indices for any property: their values are in whatever unit the property has. */
const ANY_UNIT: ReadonlySet<string> = new Set(['linear', 'logarithmic']);

const UNIT = /\[[^\]\d][^\]]*\]|mm²\/s|kg\/m³|mPa·s|mg\/kg|% m\/m|°C|°R|kelvin|\bwhole number/;
const SOURCE = /Source:|ASTM [DE]\d|ISO \d|SAE J\d|API \d|\(\d{4}\)|common practice, no source|from memory/i;
const RANGE =
  /\bvalid\b|\bdefined\b|\bfrom [\d.]+ .*to [\d.]|[\d.]+ to \d|[<>≤≥] ?\d|\babove \d|\bbelow \d|RangeError|out of range|for neat stocks only|extrapolat|at one temperature/i;

function openingComment(source: string): string {
  const match = /^(?:import[^;]*;\s*)*(\/\*\*(?:(?!\*\/)[\s\S])*\*\/)\n\n/.exec(source);
  return match ? match[1] : '';
}

const DECLARATION =
  /(\/\*\*(?:(?!\*\/)[\s\S])*\*\/\n)?(?:export function (\w+)\([^{]*?\): (?:number|BasicValues) \{|const (\w+): BlendingIndex = \{)/g;

/** The body of a declaration: up to the closing brace at the start of a line. */
function bodyFrom(source: string, start: number): string {
  const end = source.indexOf('\n}', start);
  return source.slice(start, end === -1 ? undefined : end + 2);
}

/** Every correlation of a source text. */
export function correlationsIn(source: string): Correlation[] {
  const opening = openingComment(source);
  return [...source.matchAll(DECLARATION)].map((match) => ({
    name: match[2] ?? match[3],
    words: `${opening}\n${match[1] ?? ''}`.replaceAll(/\n \* ?/g, ' '),
    code: bodyFrom(source, match.index + (match[1]?.length ?? 0)),
  }));
}

/** What the words of a correlation leave unsaid. */
export function missingIn({ name, words, code }: Correlation): string[] {
  const problems: string[] = [];
  if (!UNIT.test(words) && !ANY_UNIT.has(name)) problems.push(`${name}: no unit`);
  if (!SOURCE.test(words)) problems.push(`${name}: no source`);
  // A blending index may state its range as data instead of words.
  if (!RANGE.test(words) && !/\bdomain: /.test(code)) problems.push(`${name}: no range of validity`);
  return problems;
}
