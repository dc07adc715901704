import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { correlationsIn, missingIn } from './docComments';

const FOLDER = fileURLToPath(new URL('../../src/property', import.meta.url));

function sources() {
  return readdirSync(FOLDER, { recursive: true, encoding: 'utf8' })
    .filter((file) => file.endsWith('.ts'))
    .map((file) => ({ file, source: readFileSync(path.join(FOLDER, file), 'utf8') }));
}

const problemsIn = (source: string) => correlationsIn(source).flatMap(missingIn);

describe('every correlation of src/property', () => {
  it('names a unit, a source and a range of validity', () => {
    expect(sources().flatMap(({ file, source }) => problemsIn(source).map((problem) => `${file}: ${problem}`))).toEqual(
      [],
    );
  });

  it('is found by this check', () => {
    const names = sources().flatMap(({ source }) => correlationsIn(source).map(({ name }) => name));
    expect(names).toEqual(
      expect.arrayContaining([
        'waltherIndex',
        'kinematicViscosityAt',
        'viscosityIndex',
        'kv40ForViscosityIndex',
        'basicValues',
        'refutas',
        'huBurns',
        'wickeyChittenden',
        'anilinePoint',
      ]),
    );
  });

  it('is a table of grades with source and edition, too', () => {
    const tables = sources().filter(({ file }) => /iso3448|saeJ300|saeJ306|apiGroup/.test(file));
    expect(tables).toHaveLength(4);
    for (const { file, source } of tables) {
      expect(source, file).toMatch(/Source: /);
      expect(source.replaceAll('\n * ', ' '), file).toMatch(/Check the current edition|check the current edition/);
    }
  });
});

describe('the check itself', () => {
  const good = `/** Sulphur [mg/kg] from x, valid from 1 to 9. Source: ASTM D5453. */
export function sulphurOf(x: number): number {
  return x;
}
`;

  it('passes words that say all three', () => {
    expect(problemsIn(good)).toEqual([]);
  });

  it.each([
    ['no unit', good.replace(' [mg/kg]', '')],
    ['no source', good.replace(' Source: ASTM D5453.', '')],
    ['no range of validity', good.replace(', valid from 1 to 9', '')],
  ])('finds %s', (problem, source) => {
    expect(source).not.toBe(good);
    expect(problemsIn(source)).toEqual([`sulphurOf: ${problem}`]);
  });

  it('finds a correlation without any comment', () => {
    expect(problemsIn('export function f(x: number): number {\n  return x;\n}\n')).toEqual([
      'f: no unit',
      'f: no source',
      'f: no range of validity',
    ]);
    expect(problemsIn('const own: BlendingIndex = {\n  rising: true,\n};\n')).toHaveLength(3);
  });

  it('takes the opening comment of the file as said once for all, and no other comment', () => {
    const opening = '/** All in mm²/s, valid from 2 to 70. Source: ASTM D2270. */\n\n';
    const bare = 'export function f(x: number): number {\n  return x;\n}\n';
    expect(problemsIn(opening + bare)).toEqual([]);
    expect(problemsIn(`import { a } from './a';\n\n${opening}${bare}`)).toEqual([]);
    expect(problemsIn(`${opening.trimEnd()}\nexport const LEAST = 2;\n\n${bare}`)).toHaveLength(3);
  });

  it('takes the domain of a blending index as its range', () => {
    const words = '/** ν in mm²/s. Source: ASTM D7152. */\n';
    expect(problemsIn(`${words}const own: BlendingIndex = {\n  domain: { min: 1, max: 2 },\n};\n`)).toEqual([]);
    expect(problemsIn(`${words}const own: BlendingIndex = {\n  rising: true,\n};\n`)).toEqual([
      'own: no range of validity',
    ]);
  });
});
