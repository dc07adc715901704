import { describe, expect, it } from 'vitest';
import { propertyDefinition } from '../../src';
import { GRADE_WINDOWS, GRADES, gradesOfViscosity } from '../../src/property/grades';
import { published } from './closeTo';
import { ISO_VG_LIMITS, J300_W_GRADES, J300_WINDOWS, J306_W_GRADES, J306_WINDOWS } from './publishedGrades';

function grade(id: string) {
  const found = GRADES.find((candidate) => candidate.id === id);
  if (!found) throw new Error(`no grade ${id}`);
  return found;
}

const limit = (id: string, property: string) => grade(id).limits.find((entry) => entry.property === property);
const windows = (kv: { kv40?: number; kv100?: number }) => gradesOfViscosity(kv).map((window) => window.grade.id);

describe('published: ISO 3448', () => {
  it.each(ISO_VG_LIMITS)('VG %d is %d to %d mm²/s at 40 °C', (number, min, max) => {
    expect(limit(`ISO VG ${number}`, 'kv')).toEqual({ property: 'kv', celsius: 40, min, max });
    expect(windows({ kv40: min })).toEqual([`ISO VG ${number}`]);
    expect(windows({ kv40: max })).toEqual([`ISO VG ${number}`]);
    expect(windows({ kv40: min * 0.9999 })).toEqual([]);
    expect(windows({ kv40: max * 1.0001 })).toEqual([]);
  });

  it('has twenty grades, each its midpoint less and more ten per cent', () => {
    expect(GRADES.filter(({ system }) => system === 'ISO 3448')).toHaveLength(20);
    for (const [number, min, max] of ISO_VG_LIMITS) {
      const midpoint = { 2: 2.2, 3: 3.2, 5: 4.6, 7: 6.8 }[number] ?? number;
      published(`VG ${number} min`, min, 0.9 * midpoint, { relative: 1e-12 });
      published(`VG ${number} max`, max, 1.1 * midpoint, { relative: 1e-12 });
    }
  });
});

describe('published: SAE J300', () => {
  it.each(J300_W_GRADES)('SAE %s: CCS at most %d mPa·s at %d °C, KV100 at least %d', (name, ccs, celsius, kv100) => {
    expect(grade(`SAE ${name}`).limits).toEqual([
      { property: 'ccs', celsius, max: ccs },
      { property: 'kv', celsius: 100, min: kv100 },
    ]);
    // The pumping limit is 60 000 mPa·s, five degrees below the cranking one.
    expect(grade(`SAE ${name}`).laboratoryOnly.join()).toContain(`at ${celsius - 5} °C: at most 60 000 mPa·s`);
  });

  it.each(J300_WINDOWS)('SAE %s: KV100 from %d to below %d, HTHS at least %d', (name, min, below, hths) => {
    expect(grade(`SAE ${name}`).limits).toEqual([
      { property: 'kv', celsius: 100, min, below },
      { property: 'hths', min: hths },
    ]);
    expect(gradesOfViscosity({ kv100: min }).some((window) => window.grade.name === name.split(' ')[0])).toBe(true);
    expect(windows({ kv100: below })).not.toContain(`SAE ${name}`);
  });

  it('recorded: says both grades where two windows overlap, and one where they meet', () => {
    const engine = (kv100: number) => windows({ kv100 }).filter((id) => !id.includes('J306'));
    expect(engine(5.5)).toEqual(['SAE 8', 'SAE 12']);
    expect(engine(7)).toEqual(['SAE 12', 'SAE 16', 'SAE 20']);
    expect(engine(9.3)).toEqual(['SAE 30']);
    expect(engine(12.4999)).toEqual(['SAE 30']);
    expect(engine(12.5)).toEqual(['SAE 40']);
    expect(engine(3.99)).toEqual([]);
    expect(engine(26.1)).toEqual([]);
  });
});

describe('published: SAE J306', () => {
  const rows = J306_WINDOWS.map(([name, min, below]) => ({ name, min, below }));
  it.each(rows)('SAE $name: KV100 from $min to below $below', ({ name, min, below }) => {
    expect(limit(`SAE J306 ${name}`, 'kv')).toEqual({ property: 'kv', celsius: 100, min, ...(below && { below }) });
    expect(windows({ kv100: min })).toContain(`SAE J306 ${name}`);
    expect(windows({ kv100: min * 0.9999 })).not.toContain(`SAE J306 ${name}`);
    if (below) expect(windows({ kv100: below })).not.toContain(`SAE J306 ${name}`);
  });

  it('leaves 250 open above', () => {
    expect(windows({ kv100: 2000 })).toEqual(['SAE J306 250']);
  });

  it.each(J306_W_GRADES)(
    'SAE %s: 150 000 mPa·s at %d °C for the laboratory, KV100 at least %d',
    (name, celsius, min) => {
      expect(grade(`SAE J306 ${name}`).limits).toEqual([{ property: 'kv', celsius: 100, min }]);
      expect(grade(`SAE J306 ${name}`).laboratoryOnly.join()).toContain(`at ${celsius} °C: at most 150 000 mPa·s`);
    },
  );
});

describe('the windows of a mix', () => {
  it('claims no W grade, whatever the viscosities', () => {
    for (let kv = 1; kv < 4000; kv *= 1.02) {
      for (const { grade: found, words } of gradesOfViscosity({ kv40: kv, kv100: kv })) {
        expect(`${found.name} ${words}`).not.toMatch(/\dW/);
      }
    }
  });

  it('says where the mix lies, not what it is', () => {
    expect(gradesOfViscosity({ kv40: 46, kv100: 14 }).map(({ words }) => words)).toEqual([
      'inside the KV40 window of ISO VG 46',
      'inside the KV100 window of SAE 40',
      'inside the KV100 window of SAE J306 90',
    ]);
  });

  it('says nothing of a viscosity that is unknown or no number', () => {
    expect(gradesOfViscosity({})).toEqual([]);
    expect(gradesOfViscosity({ kv40: Number.NaN, kv100: Number.NaN })).toEqual([]);
    expect(windows({ kv40: 46 })).toEqual(['ISO VG 46']);
  });
});

describe('the list of grades', () => {
  it('has unique names, windows in rising order, and the edition with each', () => {
    expect(new Set(GRADES.map(({ id }) => id)).size).toBe(GRADES.length);
    expect(GRADES).toHaveLength(20 + 15 + 14);
    for (const { note } of GRADES) expect(note).toMatch(/\((2019|2021)\)|:1992/);
    for (const { note } of GRADES) expect(note).toContain('check the current edition');
    for (const system of ['ISO 3448', 'SAE J300', 'SAE J306']) {
      const least = GRADE_WINDOWS.filter((window) => window.grade.system === system).map(({ min }) => min);
      expect(least).toEqual([...least].sort((a, b) => a - b));
    }
  });

  it('limits only properties of the table, at temperatures that they have', () => {
    for (const { id, limits } of GRADES) {
      for (const { property, celsius, min, max, below } of limits) {
        const definition = propertyDefinition(property);
        if (!definition) throw new Error(`${id}: ${property} is not in the property table`);
        expect(definition.temperatures ?? [undefined], `${id}: ${property}`).toContain(celsius);
        for (const end of [min, max, below]) {
          if (end === undefined) continue;
          expect(end, `${id}: ${property}`).toBeGreaterThanOrEqual(definition.sense.min);
          expect(end, `${id}: ${property}`).toBeLessThanOrEqual(definition.sense.max);
        }
      }
    }
  });
});
