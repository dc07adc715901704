import { describe, expect, it } from 'vitest';
import { apiGroupsInWords } from '../../../app/answer/apiGroups';
import { conflictInWords } from '../../../app/answer/Conflict';
import { looksOf, PATTERNS } from '../../../app/answer/familyTone';
import { propertyRows } from '../../../app/answer/propertyRows';
import { otherRules } from '../../../app/answer/ruleSpread';
import { mixOf, orderOf, outcomeOf } from './answers';

const KV40 = { property: 'kv', celsius: 40, min: 30, max: 40 };

describe('the predicted properties', () => {
  it('stand beside their limits with the room left', () => {
    const check = { limit: 0, ...KV40, value: 38.12, room: 1.88, passes: true, onLimit: false };
    const rows = propertyRows(orderOf({ limits: [KV40] }), mixOf({ checks: [check] }));
    const kv40 = rows.find(({ fullName }) => fullName === 'Kinematic viscosity at 40 °C');
    expect(kv40).toMatchObject({ name: 'KV40', value: '38.12', unit: 'mm²/s' });
    expect(kv40?.limits).toEqual([{ range: '30.00 to 40.00 mm²/s', room: 'room 1.88 mm²/s', tone: 'plain' }]);
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

describe('the API groups of a recipe', () => {
  it('are shares by mass; PAO is Group IV (API 1509, Annex E), and what figures do not decide is not classed', () => {
    // The light oil has neither saturates nor sulphur.
    expect(apiGroupsInWords(orderOf(), mixOf().recipe ?? [])).toBe('IV 25.0 %, not classed 75.0 %');
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
});
