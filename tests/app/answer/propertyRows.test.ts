import { describe, expect, it } from 'vitest';
import { apiGroupsInWords } from '../../../app/answer/apiGroups';
import { conflictInWords } from '../../../app/answer/Conflict';
import { looksOf, PATTERNS } from '../../../app/answer/familyTone';
import { gradesInWords } from '../../../app/answer/gradesInWords';
import { propertyRows } from '../../../app/answer/propertyRows';
import { otherRules } from '../../../app/answer/ruleSpread';
import { HEAVY, LIGHT, mixOf, orderOf, outcomeOf } from './answers';

const KV40 = { property: 'kv', celsius: 40, min: 30, max: 40 };

describe('the predicted properties', () => {
  it('stand beside their limits with the room left', () => {
    const check = { limit: 0, ...KV40, value: 38.12, room: 1.88, passes: true, onLimit: false };
    const rows = propertyRows(orderOf({ limits: [KV40] }), mixOf({ checks: [check] }));
    const kv40 = rows.find(({ fullName }) => fullName === 'Kinematic viscosity at 40 °C');
    expect(kv40).toMatchObject({ name: 'KV40', value: '38.12', unit: 'mm²/s' });
    expect(kv40?.limits).toEqual([{ place: 0, range: '30.00 to 40.00 mm²/s', room: 'room 1.88 mm²/s', tone: 'plain' }]);
  });

  it('say how far inside its limit the mix has to stay, and who took the value of the rest', () => {
    const limit = { ...KV40, insideBy: 0.5 };
    const check = { limit: 0, ...KV40, value: 38.12, room: 1.38, passes: true, onLimit: false };
    const kv40 = {
      property: 'kv',
      celsius: 40,
      value: 38.12,
      unknownFrom: [],
      asTheRest: ['heavy'],
      estimatedFrom: [],
    };
    const outcome = mixOf({ checks: [check], properties: { properties: [kv40], spread: [] } });
    const [row] = propertyRows(orderOf({ limits: [limit] }), outcome);
    expect(row?.limits[0]?.range).toBe('30.00 to 40.00 mm²/s, inside by 0.50 mm²/s');
    expect(row?.asTheRest).toEqual(['Heavy oil']);
  });

  it('name the stocks that leave a property unknown', () => {
    const noack = propertyRows(orderOf(), mixOf()).find(({ name }) => name === 'Noack');
    expect(noack).toMatchObject({ value: '–', unknown: 'unknown: Heavy oil has no figure' });
  });

  it('say that the pour point is the one with depressant where the order uses it', () => {
    const pour = { property: 'pourPoint', value: -30, unknownFrom: [], asTheRest: [], estimatedFrom: ['heavy'] };
    const outcome = mixOf({ properties: { properties: [pour], spread: [] } });
    const [row] = propertyRows(orderOf({ depressant: true }), outcome);
    expect(row?.fullName).toBe('Pour point, with depressant');
    expect(row?.estimated).toBe('rests on estimated figures of Heavy oil');
    expect(propertyRows(orderOf(), outcome)[0]?.fullName).toBe('Pour point');
  });

  it('are none without a recipe', () => {
    expect(propertyRows(orderOf({ limits: [KV40] }), outcomeOf())).toEqual([]);
  });
});

describe('what other blending rules say', () => {
  it('is their range, without this order’s own rule and without the cube root', () => {
    const [spread] = mixOf().properties?.spread ?? [];
    expect(spread && otherRules(spread, 'wright')).toBe('35.50 to 42.30');
    expect(spread && otherRules({ ...spread, byRule: [{ rule: 'walther' }] }, 'wright')).toBeUndefined();
  });
});

describe('the viscosity windows of a mix', () => {
  it('are those of the published tables; no grade is claimed', () => {
    // ISO 3448: VG 46 is 41.4 to 50.6 at 40 °C. At 100 °C SAE J300: 12 is 5.0 to below 7.1, 16 is 6.1 to below 8.2, 20 is 6.9 to
    // below 9.3; SAE J306: 75 is 6.5 to below 8.5.
    const kv = (celsius: number, value: number) => ({
      property: 'kv',
      celsius,
      value,
      unknownFrom: [],
      asTheRest: [],
      estimatedFrom: [],
    });
    const properties = { properties: [kv(40, 46), kv(100, 7)], spread: [] };
    expect(gradesInWords({ properties })).toBe(
      'Inside the KV40 window of ISO VG 46, and the KV100 windows of SAE 12, SAE 16, SAE 20, SAE J306 75.',
    );
    expect(gradesInWords({})).toMatch(/^Inside no viscosity window/);
  });
});

describe('the API groups of a recipe', () => {
  it('are shares by mass; PAO is Group IV (API 1509, Annex E), and what figures do not decide is as stated', () => {
    // The light oil has neither saturates nor sulphur.
    expect(apiGroupsInWords(orderOf(), mixOf().recipe ?? [])).toBe('III as stated 75.0 %, IV 25.0 %');
    const order = orderOf({ stocks: [{ ...LIGHT, family: 'package' }, HEAVY] });
    expect(apiGroupsInWords(order, mixOf().recipe ?? [])).toBe('IV 25.0 %, package 75.0 %');
  });
});

describe('what is in the way of an impossible order', () => {
  it('is named limit by limit, with the rules beside', () => {
    const order = orderOf({ limits: [KV40, { property: 'vi', min: 120 }] });
    const outcome = outcomeOf({ conflict: [0, 1], conflictRules: ['the dose of Heavy oil'] });
    expect(conflictInWords(order, outcome)).toEqual([
      'Kinematic viscosity at 40 °C: 30.00 to 40.00 mm²/s',
      'Viscosity index: at least 120',
      'the dose of Heavy oil',
    ]);
  });
});

describe('the looks of the proportion bar', () => {
  it('never gives neighbours the same pattern, so that no colour is needed to tell them apart', () => {
    const looks = looksOf(Array.from({ length: 12 }, () => 'PAO' as const));
    for (const [place, look] of looks.slice(1).entries()) expect(look.pattern).not.toBe(looks[place]?.pattern);
    expect(new Set(looks.map(({ pattern }) => pattern)).size).toBe(PATTERNS.length);
  });

  it('differ for all stocks of a tone, as far as there are patterns', () => {
    const families = (['PAO', 'ester', 'PAO', 'mPAO', 'ester', 'Group I', 'PAO'] as const).slice();
    const looks = looksOf(families).map(({ tone, pattern }) => `${tone} ${pattern}`);
    expect(new Set(looks).size).toBe(families.length);
    // The fourth after five other tones took the same pattern when it went by the place in the recipe.
    const far = looksOf(['PAO', 'ester', 'Group I', 'Group II', 'Group III', 'mPAO']);
    expect(far[5]).not.toEqual(far[0]);
  });
});
