import { FAMILIES, type Family } from '../../src';

/** Other ways of writing a family that mean one thing only. */
const OTHER_NAMES: readonly [RegExp, Family][] = [
  [/^(api )?(group|gr|grp|gp|g) ?(iii|3)( ?(\+|plus))?$|^iii\+?$/, 'Group III'],
  [/^(api )?(group|gr|grp|gp|g) ?(ii|2)( ?(\+|plus))?$|^ii\+?$/, 'Group II'],
  [/^(api )?(group|gr|grp|gp|g) ?(i|1)$|^i$/, 'Group I'],
  [/^(api )?(group|gr|grp|gp|g) ?(iv|4)$|^iv$|^poly ?alpha ?olefins?$|^paos?( ?\d+)?$/, 'PAO'],
  [/^m ?paos?( ?\d+)?$|^metallocene pao( ?\d+)?$/, 'mPAO'],
  [/^(di|poly|polyol |complex |synthetic )?esters?$/, 'ester'],
  [/^alkyl(ated)? ?naphthalenes?$|^ans?$/, 'alkylated naphthalene'],
  [/^naphthenics?( oils?)?$/, 'naphthenic'],
  [/^poly ?isobut(yl)?enes?$|^pib( ?\d+)?$/, 'polyisobutene'],
  [/^(polymer )?thickeners?$|^vi ?improvers?$|^vii$|^vm$/, 'thickener'],
  [/^(additive )?(packages?|pack)$|^additives?$/, 'package'],
  [/^(pour ?point )?depressants?$|^ppd$/, 'depressant'],
  [/^others?$/, 'other'],
];

/** A family as people write it ("Gr. III", "ppd"), or undefined. Group V is more than one family, so it is none. */
export function readFamily(text: string): Family | undefined {
  const plain = text.trim().toLowerCase().replace(/[._-]/g, ' ').replace(/\s+/g, ' ').trim();
  return (
    FAMILIES.find((family) => family.toLowerCase() === plain) ?? OTHER_NAMES.find(([name]) => name.test(plain))?.[1]
  );
}

/** The family that a typed text means: by its name, or as the only one that begins so; else why there is none. */
export function chooseFamily(text: string): { choice: Family; whole: boolean } | { problem: string } {
  const named = readFamily(text);
  if (named) return { choice: named, whole: true };
  const begins = FAMILIES.filter((family) => family.toLowerCase().startsWith(text.trim().toLowerCase()));
  const [only] = begins;
  if (only && begins.length === 1) return { choice: only, whole: false };
  return {
    problem: only
      ? `Type more: ${begins.join(', ')}`
      : `“${text.trim()}” is no family here. The families: ${FAMILIES.join(', ')}`,
  };
}
