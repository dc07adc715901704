import { describe, expect, it } from 'vitest';
import { contradiction, limitName, rangeInWords, roomInWords, shortLimitName } from '../../../app/parts/limitWords';
import { type Limit, type LimitCheck, type PropertyDefinition, propertyDefinition } from '../../../src';

function definitionOf(id: string): PropertyDefinition {
  const definition = propertyDefinition(id);
  if (!definition) throw new Error(`${id} is not in the property table.`);
  return definition;
}

const KV = definitionOf('kv');
const KV100: Limit = { property: 'kv', celsius: 100 };

describe('a limit in words', () => {
  it('names property and temperature', () => {
    expect(limitName(KV100)).toBe('Kinematic viscosity at 100 °C');
    expect(shortLimitName(KV100)).toBe('KV100');
    expect(shortLimitName({ property: 'ccs', celsius: -30 })).toBe('CCS -30 °C');
    expect(limitName({ property: 'colour' })).toBe('colour');
  });

  it.each<[Limit, string]>([
    [{ ...KV100, min: 5.8, max: 6.2 }, '5.80 to 6.20 mm²/s'],
    [{ ...KV100, min: 6.9, below: 9.3 }, 'at least 6.90 mm²/s, below 9.30 mm²/s'],
    [{ ...KV100, max: 9.3, below: true }, 'below 9.30 mm²/s'],
    [{ ...KV100, aim: 6 }, 'near 6.00 mm²/s'],
    [KV100, 'no end set'],
  ])('says what is allowed', (limit, words) => {
    expect(rangeInWords(limit, KV)).toBe(words);
  });

  it('says how the mix stands', () => {
    const check = (room: number | undefined, onLimit = false): LimitCheck => ({
      limit: 0,
      ...KV100,
      value: 6,
      passes: true,
      onLimit,
      ...(room !== undefined && { room }),
    });
    expect(roomInWords(check(0.4), KV)).toBe('room 0.40 mm²/s');
    expect(roomInWords(check(0.001), KV)).toBe('room under 0.01 mm²/s');
    expect(roomInWords(check(-1.25), KV)).toBe('outside by 1.25 mm²/s');
    expect(roomInWords(check(0, true), KV)).toBe('on the limit');
    expect(roomInWords(check(undefined), KV)).toBe('no end set');
  });

  it('finds limits that leave nothing', () => {
    expect(contradiction({ ...KV100, min: 5, max: 5 }, KV)).toBeUndefined();
    expect(contradiction({ ...KV100, min: 7, max: 6 }, KV)).toMatch(
      /least, 7.00 mm²\/s, is above the most, 6.00 mm²\/s/,
    );
    expect(contradiction({ ...KV100, min: 6, below: 6 }, KV)).toMatch(/Nothing lies at or above/);
    expect(contradiction({ ...KV100, min: 5.8, max: 6.2, insideBy: 0.3 }, KV)).toMatch(/margin inside leaves nothing/);
    expect(contradiction({ ...KV100, min: 5.8, max: 6.2, insideBy: 0.2 }, KV)).toBeUndefined();
  });
});
