import type { Family } from '../../src';

/** Tone of the proportion bar: one for each kind of stock. */
export type Tone = 'one' | 'two' | 'three' | 'pao' | 'polar' | 'rest' | 'additive';

const TONES: Record<Family, Tone> = {
  'Group I': 'one',
  'Group II': 'two',
  'Group III': 'three',
  PAO: 'pao',
  mPAO: 'pao',
  ester: 'polar',
  'alkylated naphthalene': 'polar',
  naphthenic: 'rest',
  polyisobutene: 'rest',
  other: 'rest',
  thickener: 'additive',
  package: 'additive',
  depressant: 'additive',
};

/** Patterns tell apart what shares a tone, and everything where no colour is seen. */
export const PATTERNS = ['plain', 'rising', 'dotted', 'falling', 'level'] as const;

export interface Look {
  tone: Tone;
  pattern: (typeof PATTERNS)[number];
}

/** A look for each stock, in the order of the recipe; no two alike among the first few of a tone, nor side by side. */
export function looksOf(families: readonly Family[]): Look[] {
  return families.map((family, place) => ({
    tone: TONES[family],
    pattern: PATTERNS[place % PATTERNS.length] ?? 'plain',
  }));
}
