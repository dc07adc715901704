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

/** A look for each stock, in the order of the recipe: neighbours differ, and so do all of a tone up to five. */
export function looksOf(families: readonly Family[]): Look[] {
  const looks: Look[] = [];
  for (const family of families) {
    const tone = TONES[family];
    const used = looks.filter((look) => look.tone === tone).length;
    // The next pattern for the tone; one further where the neighbour has it, whose tone may not be seen as another.
    const free = PATTERNS.filter((pattern) => !looks.some((look) => look.tone === tone && look.pattern === pattern));
    const left = looks.at(-1)?.pattern;
    const pattern = free.find((one) => one !== left) ?? free[0] ?? PATTERNS[used % PATTERNS.length] ?? 'plain';
    looks.push({ tone, pattern });
  }
  return looks;
}
