import { describe, expect, it } from 'vitest';
import { priceStepsText, readPriceSteps } from '../../../app/stocks/priceSteps';
import { PRICE_STEPS_COLUMN } from '../../../app/stocks/priceStepsColumn';
import type { Product } from '../../../src';

const product = (): Product => ({ id: 'a', name: 'A', family: 'Group II', figures: [], lots: [], pricePerTonne: 940 });

describe('price steps as a text', () => {
  it.each([
    [
      '5 t: 900; 10 t: 880',
      {
        priceSteps: [
          { fromTonnes: 5, pricePerTonne: 900 },
          { fromTonnes: 10, pricePerTonne: 880 },
        ],
      },
    ],
    ['from 2.5: 900 excess', { priceSteps: [{ fromTonnes: 2.5, pricePerTonne: 900 }], priceStepsFor: 'the excess' }],
    ['5 t = 900 (excess)', { priceSteps: [{ fromTonnes: 5, pricePerTonne: 900 }], priceStepsFor: 'the excess' }],
    ['', {}],
  ])('reads “%s”', (text, steps) => {
    expect(readPriceSteps(text, '.')).toEqual({ steps });
  });

  it.each(['5 t', '900', '5 t: dear', 'x: 900', '0 t: 900', '5 t: 900, 10 t: 880'])(
    'says what to write for “%s”',
    (text) => {
      expect(readPriceSteps(text, '.')).toEqual({ problem: expect.stringContaining('5 t: 900; 10 t: 880') });
    },
  );

  it('is written as it is read', () => {
    const steps = {
      priceSteps: [
        { fromTonnes: 10, pricePerTonne: 880 },
        { fromTonnes: 5, pricePerTonne: 900 },
      ],
      priceStepsFor: 'the excess' as const,
    };
    expect(priceStepsText(steps)).toBe('5 t: 900; 10 t: 880 excess');
  });
});

describe('the cell', () => {
  it('says where a price for all tonnes rises; for the excess it may', () => {
    const draft = product();
    PRICE_STEPS_COLUMN.write?.(draft, '5 t: 950', '.');
    expect(PRICE_STEPS_COLUMN.read(draft).problem).toContain('excess');
    PRICE_STEPS_COLUMN.write?.(draft, '5 t: 950 excess', '.');
    expect(PRICE_STEPS_COLUMN.read(draft).problem).toBeUndefined();
  });

  it('keeps what it cannot read, says why, and takes it once it is right', () => {
    const draft = product();
    PRICE_STEPS_COLUMN.write?.(draft, '5 t: cheap', '.');
    expect(draft.priceSteps).toBeUndefined();
    expect(PRICE_STEPS_COLUMN.read(draft)).toMatchObject({
      text: '5 t: cheap',
      problem: expect.stringContaining('left out'),
    });
    PRICE_STEPS_COLUMN.write?.(draft, '5 t: 900', '.');
    expect(draft.priceSteps).toEqual([{ fromTonnes: 5, pricePerTonne: 900 }]);
    expect(PRICE_STEPS_COLUMN.read(draft).problem).toBeUndefined();
    PRICE_STEPS_COLUMN.write?.(draft, '', '.');
    expect(draft.priceSteps).toBeUndefined();
  });
});
