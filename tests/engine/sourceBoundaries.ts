/** Which layers of src/ may import which. The compiler enforces the same through project references. */
export const LAYERS: Readonly<Record<string, readonly string[]>> = {
  stock: [],
  property: ['stock'],
  blend: ['property', 'stock'],
  optimise: ['blend', 'property', 'stock'],
  explain: ['optimise', 'blend', 'property', 'stock'],
  workbook: ['optimise', 'blend', 'property', 'stock'],
  index: ['workbook', 'explain', 'optimise', 'blend', 'property', 'stock'],
};

/** The packages the engine stands on: linear programs only. */
const PACKAGES = new Set(['highs', 'javascript-lp-solver']);

/** The only file of the engine that may mention a clock: the default of an option. */
const CLOCK_FILE = 'optimise/solveOptions.ts';

const SURROUNDINGS =
  /(?<![\w$.'"])(document|window|self|navigator|localStorage|sessionStorage|indexedDB|performance|process|console|fetch|XMLHttpRequest|WebSocket|Worker|setTimeout|setInterval|queueMicrotask|requestAnimationFrame)\b(?=\s*[.([])/g;
const WHOLE_WORLD = /(?<![\w$.'"])globalThis\b/g;
const CLOCK = /(?<![\w$.])(?:Date\s*\.|new\s+Date\b|Date\s*\()/g;
const CHANCE = /\bMath\s*\.\s*random\b|(?<![\w$.])crypto\s*\./g;

/** Comments, and on request the contents of strings, replaced by blanks. Enough for this code base, not a parser. */
export function withoutWords(code: string, strings: boolean): string {
  return code.replace(/\/\*[\s\S]*?\*\/|\/\/[^\n]*|'(?:\\.|[^'\\\n])*'|"(?:\\.|[^"\\\n])*"/g, (token) =>
    token.startsWith('/') || strings ? ' ' : token,
  );
}

function importedFrom(code: string): string[] {
  const pattern = /\bfrom\s*(['"])([^'"]+)\1|\bimport\s*(?:\(\s*)?(['"])([^'"]+)\3/g;
  return [...withoutWords(code, false).matchAll(pattern)].map((match) => match[2] ?? match[4] ?? '');
}

/** The path of `specifier` seen from `file`, both relative to src/, or undefined outside it. */
function resolveInSource(file: string, specifier: string): string | undefined {
  const path = new URL(specifier, `file:///above/src/${file}`).pathname;
  return path.startsWith('/above/src/') ? path.slice('/above/src/'.length) : undefined;
}

/** The layer of a file relative to src/: its folder, or "index" for the public face. */
function layerOf(file: string): string {
  return file.includes('/') ? file.slice(0, file.indexOf('/')) : file.replace(/\.ts$/, '');
}

function importProblem(file: string, specifier: string): string | undefined {
  if (!specifier.startsWith('.')) return PACKAGES.has(specifier) ? undefined : `imports the package "${specifier}"`;
  const target = resolveInSource(file, specifier);
  if (target === undefined) return `imports "${specifier}" from outside src/`;
  const [from, to] = [layerOf(file), layerOf(target)];
  if (!(from in LAYERS)) return `lies in the unknown layer "${from}"`;
  return from === to || LAYERS[from]?.includes(to) ? undefined : `imports "${specifier}": ${from} may not use ${to}`;
}

/** Whether the file has a variable or parameter of this name: a workbook's `document` is not the page's. */
function declares(bare: string, name: string): boolean {
  return new RegExp(`\\b(?:const|let|var|function)\\s+${name}\\b|[(,]\\s*${name}\\s*(?::|\\)?\\s*=>)`).test(bare);
}

/** What is wrong with the code of a file of src/ (path relative to src/): forbidden imports and surroundings. */
export function sourceProblems(file: string, code: string): string[] {
  const bare = withoutWords(code, true);
  const surroundings = [...bare.matchAll(SURROUNDINGS)].filter((match) => !declares(bare, match[0]));
  const mentions = [...surroundings, ...bare.matchAll(WHOLE_WORLD), ...bare.matchAll(CHANCE)];
  if (file !== CLOCK_FILE) mentions.push(...bare.matchAll(CLOCK));
  return [
    ...importedFrom(code).flatMap((specifier) => importProblem(file, specifier) ?? []),
    ...mentions.map((match) => `mentions ${match[0].trim()}`),
  ].map((problem) => `src/${file} ${problem}`);
}

/** What is wrong with a file of app/ (path relative to app/): the face knows the engine by its index only. */
export function appProblems(file: string, code: string): string[] {
  const above = '../'.repeat(file.split('/').length);
  return importedFrom(code)
    .filter((specifier) => /(^|\/)src(\/|$)/.test(specifier) && specifier.startsWith('.'))
    .filter((specifier) => specifier !== `${above}src` && specifier !== `${above}src/index`)
    .map((specifier) => `app/${file} imports "${specifier}" past src/index.ts`);
}
