import { describe, expect, it } from 'vitest';
import { added, costPer, difference } from '../../../app/explain/costWords';
import { changeInWords, relaxationInWords } from '../../../app/explain/ladderWords';
import { priceInShort, priceStory } from '../../../app/explain/limitPriceWords';
import { chanceInWords } from '../../../app/explain/PassingChance';
import { everyDigit } from '../../../app/explain/Rounded';
import { byNearness, entryInWords, lossInWords, standsInWords } from '../../../app/explain/stockWords';
import { type LimitPrice, type PropertyDefinition, propertyDefinition, type UsedStock } from '../../../src';
import { orderOf } from '../answer/answers';

const EURO = { currency: 'EUR', unit: 't' } as const;

function definitionOf(id: string): PropertyDefinition {
  const definition = propertyDefinition(id);
  if (!definition) throw new Error(`${id} is not in the property table.`);
  return definition;
}

describe('differences of cost', () => {
  it('carry their unit, and no more digits than money has', () => {
    expect(costPer(913.412, 'EUR')).toBe('€913.41/t');
    expect(difference(1.2, 'EUR', 'm³')).toBe('€1.20/m³');
    expect(added(12.3, 'EUR')).toBe('+€12.30/t');
    expect(added(-12.3, 'EUR')).toBe('−€12.30/t');
  });

  it('tell little from nothing', () => {
    expect(difference(0.004, 'EUR')).toBe('under €0.01/t');
    expect(added(0.004, 'EUR')).toBe('+ under €0.01/t');
    expect(difference(0, 'EUR')).toBe('nothing');
    expect(added(1e-9, 'EUR')).toBe('no dearer');
  });
});

describe('the price of a limit', () => {
  const least: LimitPrice = {
    limit: 0,
    end: 'min',
    stated: 44.6,
    step: 0.2,
    looserSaves: 1.2,
    tighterCosts: 1.3,
    holdsTo: 41.4,
    withoutSaves: 8.55,
    proven: true,
  };

  it('says which way, by how much and per what', () => {
    expect(priceInShort(least, definitionOf('kv'), EURO)).toBe('0.20 mm²/s looser saves €1.20/t');
    expect(priceInShort({ ...least, step: 1 }, definitionOf('vi'), EURO)).toBe('1 unit looser saves €1.20/t');
    expect(priceInShort({ ...least, proven: false }, definitionOf('kv'), { ...EURO, unit: 'm³' })).toBe(
      '0.20 mm²/s looser saves €1.20/m³ (not proven)',
    );
  });

  it('names the end that each figure speaks of', () => {
    expect(priceStory(least, definitionOf('kv'), EURO)).toEqual([
      'Looser by 0.20 mm²/s (44.40 mm²/s) saves €1.20/t.',
      'Loosening goes on saving at this rate down to 41.40 mm²/s.',
      'Tighter by 0.20 mm²/s (44.80 mm²/s) adds €1.30/t.',
      'Without this end the order costs €8.55/t less.',
    ]);
  });

  it('turns round for an upper end, and says what is impossible, free or unknown', () => {
    const { tighterCosts: _, holdsTo: __, ...bare } = least;
    const most: LimitPrice = { ...bare, end: 'max', stated: 8, step: 0.05, looserSaves: 0, withoutSaves: 0 };
    const story = priceStory(most, definitionOf('noack'), EURO);
    expect(story).toEqual([
      'Looser by 0.05 % m/m (8.05 % m/m) saves nothing.',
      'Tighter by 0.05 % m/m (7.95 % m/m): no recipe meets it.',
      'Without this end the order costs the same.',
    ]);
    expect(priceStory({ ...most, proven: false }, definitionOf('noack'), EURO)[1]).toMatch(/no recipe was found/);
  });
});

describe('stocks', () => {
  const used: UsedStock = {
    stockId: 'light',
    pricePerTonne: 900,
    massFraction: 0.5,
    impossibleWithout: false,
    proven: true,
  };

  it('stand between prices, as far as ends were found', () => {
    expect(standsInWords({ ...used, standsFrom: 860, standsTo: 910 }, 'EUR')).toBe('€860.00 to €910.00');
    expect(standsInWords({ ...used, standsTo: 910 }, 'EUR')).toBe('up to €910.00');
    expect(standsInWords({ ...used, standsFrom: 860 }, 'EUR')).toBe('from €860.00 up');
    expect(standsInWords(used, 'EUR')).toBe('no end found');
  });

  it('cost something to do without, cannot be spared, or are not proven', () => {
    expect(lossInWords({ ...used, lossCosts: 12.3 }, 'EUR', 't')).toBe('+€12.30/t');
    expect(lossInWords({ ...used, lossCosts: 12.3, proven: false }, 'EUR', 't')).toBe('+€12.30/t, not proven');
    expect(lossInWords({ ...used, impossibleWithout: true }, 'EUR', 't')).toBe('no recipe');
    expect(lossInWords(used, 'EUR', 't')).toBe('not proven');
  });

  it('come in below a price, the nearest first', () => {
    const entry = { pricePerTonne: 1000, proven: true };
    const far = { ...entry, stockId: 'far', entersBelow: 500 };
    const never = { ...entry, stockId: 'never' };
    const near = { ...entry, stockId: 'near', entersBelow: 990 };
    expect(byNearness([never, far, near]).map(({ stockId }) => stockId)).toEqual(['near', 'far', 'never']);
    expect(entryInWords(near, 'EUR')).toBe('below €990.00');
    expect(entryInWords(never, 'EUR')).toBe('not even at zero');
    expect(entryInWords({ ...near, proven: false }, 'EUR')).toBe('below €990.00, not proven');
  });
});

describe('what is within reach', () => {
  const order = orderOf({
    limits: [
      { property: 'kv', celsius: 40, min: 46 },
      { property: 'noack', max: 8 },
    ],
  });

  it('says the new end and the one that was asked for', () => {
    const kv = { limit: 0, end: 'min' as const, stated: 46, to: 44.1 };
    const noack = { limit: 1, end: 'max' as const, stated: 8, to: 9 };
    expect(changeInWords(kv, order)).toBe('KV40 down to 44.10 mm²/s (asked at least 46.00)');
    expect(relaxationInWords({ changes: [kv, noack], effort: 1, costPerTonne: 1, proven: true }, order)).toBe(
      'KV40 down to 44.10 mm²/s (asked at least 46.00); Noack up to 9.0 % m/m (asked at most 8.0)',
    );
  });
});

it('a chance is never certain', () => {
  expect([1, 0.9995, 0.994, 0.97, 0.5, 0.004, 0].map(chanceInWords)).toEqual([
    'over 99.9 %',
    'over 99.9 %',
    '99.4 %',
    '97 %',
    '50 %',
    '0.4 %',
    'under 0.1 %',
  ]);
});

it('an amount off its step shows every digit', () => {
  expect(everyDigit(0.85, 1)).toBe('0.85');
  expect(everyDigit(64.7, 1)).toBe('64.7');
  expect(everyDigit(100 / 3, 1)).toBe('33.333333');
});
