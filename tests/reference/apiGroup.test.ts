import { describe, expect, it } from 'vitest';
import { type Family, kv40ForViscosityIndex, type Stock } from '../../src';
import { apiGroupOf } from '../../src/property/grades';
import { referenceStock } from './referenceStocks';

interface Figures {
  saturates?: number;
  sulphur?: number;
  vi?: number;
}

/** A stock with KV100 5 and the KV40 of the index. */
function stock({ vi, ...figures }: Figures, family: Family = 'other'): Stock {
  const kv40 = vi === undefined ? 25 : kv40ForViscosityIndex(vi, 5);
  const full = referenceStock('oil', { kv40, kv100: 5, density: 850, ...figures }, { family });
  if (vi !== undefined) return full;
  return { ...full, figures: full.figures.filter(({ property }) => property !== 'kv') };
}

const without = (base: Stock, property: string): Stock => ({
  ...base,
  figures: base.figures.filter((figure) => figure.property !== property),
});

// API 1509, Annex E: saturates 90 %, sulphur 0.03 % = 300 mg/kg, VI 80 and 120. Which side each boundary is on.
describe('published: the groups of API 1509 Annex E', () => {
  it.each([
    ['I', { saturates: 75, sulphur: 3800, vi: 100 }],
    ['I', { saturates: 89.9, sulphur: 10, vi: 100 }],
    ['I', { saturates: 95, sulphur: 301, vi: 100 }],
    ['I', { saturates: 75, sulphur: 3800, vi: 80 }],
    ['I', { saturates: 75, sulphur: 3800, vi: 119.4 }],
    ['II', { saturates: 90, sulphur: 300, vi: 100 }],
    ['II', { saturates: 99, sulphur: 5, vi: 80 }],
    ['II', { saturates: 99, sulphur: 5, vi: 119.4 }],
    ['III', { saturates: 90, sulphur: 300, vi: 120 }],
    ['III', { saturates: 99, sulphur: 0, vi: 135 }],
    ['V', { saturates: 60, sulphur: 500, vi: 79.4 }],
    ['V', { saturates: 99, sulphur: 5, vi: 60 }],
    ['V', { saturates: 80, sulphur: 500, vi: 121 }],
  ] as const)('%s: %o', (group, figures) => {
    expect(apiGroupOf(stock(figures)).group).toBe(group);
  });

  it('takes the index as it is reported: whole numbers, half to even (ASTM D2270)', () => {
    expect(apiGroupOf(stock({ saturates: 99, sulphur: 5, vi: 119.6 })).group).toBe('III');
    expect(apiGroupOf(stock({ saturates: 99, sulphur: 5, vi: 79.6 })).group).toBe('II');
  });

  it.each([
    ['PAO', 'IV'],
    ['mPAO', 'IV'],
    ['ester', 'V'],
    ['alkylated naphthalene', 'V'],
    ['polyisobutene', 'V'],
  ] as const)('%s is Group %s by chemistry, figures or none', (family, group) => {
    expect(apiGroupOf(stock({}, family)).group).toBe(group);
    expect(apiGroupOf(stock({ saturates: 99, sulphur: 0, vi: 130 }, family))).toEqual({
      group,
      reason: `By chemistry: ${family}.`,
    });
  });

  it.each(['thickener', 'package', 'depressant'] as const)('a %s has no group', (family) => {
    expect(apiGroupOf(stock({ saturates: 99, sulphur: 0, vi: 130 }, family))).toEqual({
      group: undefined,
      reason: 'An additive, not a base stock.',
    });
  });
});

describe('what is not known', () => {
  const groupTwo = stock({ saturates: 99, sulphur: 5, vi: 105 });

  it('leaves the group open and names the figure', () => {
    expect(apiGroupOf(without(groupTwo, 'saturates'))).toEqual({
      group: undefined,
      reason: 'Unknown: saturates. Enter the figure to class the stock.',
    });
    expect(apiGroupOf(without(groupTwo, 'sulphur')).reason).toContain('Unknown: sulphur.');
    expect(apiGroupOf(without(without(groupTwo, 'sulphur'), 'saturates')).reason).toContain('saturates and sulphur');
    expect(apiGroupOf(without(groupTwo, 'kv')).group).toBeUndefined();
    expect(apiGroupOf(without(groupTwo, 'kv')).reason).toContain('enter KV40 and KV100');
  });

  it('does not matter where the rest decides: much sulphur is Group I whatever the saturates', () => {
    expect(apiGroupOf(stock({ sulphur: 3800, vi: 100 })).group).toBe('I');
    expect(apiGroupOf(stock({ saturates: 70, vi: 100 })).group).toBe('I');
    expect(apiGroupOf(stock({ vi: 60 })).group).toBe('V');
  });

  it('takes a stated viscosity index where the viscosities are missing, and the viscosities where both are there', () => {
    const stated = { property: 'vi', value: 125, origin: 'typical' as const };
    const bare = without(groupTwo, 'kv');
    expect(apiGroupOf({ ...bare, figures: [...bare.figures, stated] }).group).toBe('III');
    expect(apiGroupOf({ ...groupTwo, figures: [...groupTwo.figures, stated] }).group).toBe('II');
  });

  it('says that an oil below KV100 2 has no viscosity index', () => {
    const spindle = referenceStock('spindle', { kv40: 5, kv100: 1.7, density: 830, saturates: 99, sulphur: 1 });
    expect(apiGroupOf(spindle)).toEqual({
      group: undefined,
      reason: 'Not classed: the viscosity index is not defined below a KV100 of 2 mm²/s.',
    });
  });
});

describe('a stated family that the figures do not bear out', () => {
  it('is reported and not corrected', () => {
    const result = apiGroupOf(stock({ saturates: 99, sulphur: 5, vi: 122 }, 'Group II'));
    expect(result.group).toBe('III');
    expect(result.contradiction).toBe('Entered as Group II, but the figures class it as Group III.');
    expect(apiGroupOf(stock({ saturates: 85, sulphur: 900, vi: 95 }, 'naphthenic')).contradiction).toContain(
      'Group I.',
    );
  });

  it('is silent where they agree, where the family states no group, and where nothing decides', () => {
    const silent = [
      stock({ saturates: 99, sulphur: 5, vi: 105 }, 'Group II'),
      stock({ saturates: 60, sulphur: 900, vi: 40 }, 'naphthenic'),
      stock({ saturates: 99, sulphur: 5, vi: 105 }, 'other'),
      stock({ vi: 105 }, 'Group III'),
    ];
    for (const oil of silent) expect(apiGroupOf(oil)).not.toHaveProperty('contradiction');
  });
});
