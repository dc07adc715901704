import { describe, expect, it } from 'vitest';
import { recipeRows } from '../../../app/answer/recipeRows';
import { recipeText } from '../../../app/answer/recipeText';
import { recipeTexts } from '../../../app/answer/recipeTexts';
import { HEAVY, LIGHT, mixOf, orderOf, outcomeOf } from './answers';

describe('the rows of a recipe', () => {
  it('weighs, measures and prices each stock for the batch, the largest share first', () => {
    const { rows, totals } = recipeRows(orderOf({ batchTonnes: 8 }), mixOf());
    expect(rows.map(({ name }) => name)).toEqual(['Light oil', 'Heavy oil']);
    const [light, heavy] = rows;
    // By hand: 6000 kg at 800 kg/m³ are 7500 L, 2000 kg at 900 kg/m³ are 2222.2 L; 750 and 750 of 1500 a tonne.
    expect(light).toMatchObject({ kilograms: 6000, costShare: 0.5, leftTonnes: 14 });
    expect(light?.litres).toBeCloseTo(7500, 3);
    expect(heavy?.litres).toBeCloseTo(2222.222, 2);
    expect(heavy).toMatchObject({ kilograms: 2000, costShare: 0.5 });
    expect(totals.kilograms).toBe(8000);
    expect(totals.litres).toBeCloseTo(9722.222, 2);
  });

  it('says nothing of what is left where the quantity on hand is not known', () => {
    const { rows } = recipeRows(orderOf({ batchTonnes: 8 }), mixOf());
    expect(rows.find(({ name }) => name === 'Heavy oil')).not.toHaveProperty('leftTonnes');
  });

  it('counts for 1000 kg without a batch, and takes nothing from the tanks', () => {
    const { rows, batch } = recipeRows(orderOf(), mixOf());
    expect(batch).toMatchObject({ kilograms: 1000, given: false });
    expect(rows[0]).toMatchObject({ kilograms: 750 });
    expect(rows.every((row) => row.leftTonnes === undefined)).toBe(true);
  });

  it('counts for the smallest batch of a range', () => {
    expect(recipeRows(orderOf({ batchTonnes: { min: 5, max: 9 } }), mixOf()).totals.kilograms).toBe(5000);
  });

  it('leaves litres out, never at zero, where a density is unknown', () => {
    const properties = { properties: [], spread: [] };
    const { rows, totals } = recipeRows(orderOf({ batchTonnes: 8 }), mixOf({ properties }));
    expect(totals).not.toHaveProperty('litres');
    expect(rows[0]).not.toHaveProperty('litres');
  });

  it('has no rows without a recipe', () => {
    expect(recipeRows(orderOf(), outcomeOf()).rows).toEqual([]);
  });
});

describe('the sums', () => {
  it('are those of the rows as they stand', () => {
    const { totals } = recipeRows(orderOf(), mixOf({ recipe: [{ stockId: 'light', massFraction: 0.9 }] }));
    expect(totals.massFraction).toBeCloseTo(0.9, 12);
    expect(totals.kilograms).toBeCloseTo(900, 9);
  });

  it('leave shares of the cost out where a stock is paid to be taken', () => {
    const paid = { ...HEAVY, pricePerTonne: -100 };
    const { rows, totals } = recipeRows(orderOf({ stocks: [LIGHT, paid] }), mixOf({ costPerTonne: 725 }));
    expect(rows.every(({ costShare }) => costShare === undefined)).toBe(true);
    expect(totals).not.toHaveProperty('costShare');
    const idle = recipeRows(orderOf({ stocks: [LIGHT, HEAVY, { ...paid, id: 'idle' }] }), mixOf());
    expect(idle.totals.costShare).toBeCloseTo(1, 12);
  });
});

describe('amounts as shown', () => {
  const shown = (heavy: number, batchTonnes: number) => {
    const recipe = [
      { stockId: 'heavy', massFraction: heavy },
      { stockId: 'light', massFraction: 1 - heavy },
    ];
    const { rows, totals, batch } = recipeRows(orderOf({ batchTonnes }), mixOf({ recipe, properties: undefined }));
    return recipeTexts(rows, totals, batch, { percent: 2, costPercent: 1 }, '–');
  };

  it('keep three significant figures of the smallest dose, whatever the batch', () => {
    // By hand: 0.025 % of 10 t is 2.5 kg, and 9997.5 kg are left for the other.
    const { rows, total } = shown(0.00025, 10);
    expect(rows[1]).toMatchObject({ kilograms: '2.50', massPercent: '0.0250' });
    expect(rows[0]).toMatchObject({ kilograms: '9998', massPercent: '99.98' });
    expect(total).toMatchObject({ kilograms: '10000', massPercent: '100.00' });
  });

  it('show no more than a scale of that batch can where every share is large', () => {
    const { rows, total } = shown(0.25, 20);
    expect(rows.map(({ kilograms }) => kilograms)).toEqual(['15000', '5000']);
    expect(total.kilograms).toBe('20000');
    expect(total.litres).toBe('–');
  });
});

describe('the recipe as a block for a spreadsheet', () => {
  const copied = (name = LIGHT.name) => {
    const order = orderOf({ batchTonnes: 8, stocks: [{ ...LIGHT, name }, HEAVY] });
    const remarks = ['Make a trial blend first.'];
    return recipeText({ title: 'Gear oil', proof: 'Cheapest.', remarks, ...recipeRows(order, mixOf()) }).split('\n');
  };

  it('says above the figures what they are for, what is proven and what to do first', () => {
    expect(copied().slice(0, 3)).toEqual([
      'Gear oil',
      'Cheapest. A prediction: passing is for the laboratory.',
      'Make a trial blend first.',
    ]);
  });

  it('has a heading, a line a stock and the total, with as many cells each', () => {
    const lines = copied().slice(3);
    expect(lines).toHaveLength(4);
    expect(new Set(lines.map((line) => line.split('\t').length))).toEqual(new Set([8]));
    expect(lines[1]).toBe('Light oil\tGroup III\t75.000\t77.143\t6000.0\t7500.0\t50.0\t14.00');
    expect(lines[3]).toBe('Total\t\t100.000\t100.000\t8000.0\t9722.2\t100.0\t');
  });

  it('copies a small dose with its significant figures', () => {
    const order = orderOf({ batchTonnes: 10 });
    const recipe = [
      { stockId: 'heavy', massFraction: 0.00025 },
      { stockId: 'light', massFraction: 0.99975 },
    ];
    const of = recipeRows(order, mixOf({ recipe }));
    const text = recipeText({ title: 'Gear oil', proof: 'Cheapest.', remarks: [], ...of });
    expect(text).toMatch(/\nHeavy oil\tPAO\t0\.0250\t[\d.]+\t2\.50\t/);
  });

  it('gives a spreadsheet no formula and no stray cells', () => {
    expect(copied('=1+1')[4]).toMatch(/^'=1\+1\t/);
    expect(copied('a\tb\nc')[4]).toMatch(/^a b c\tGroup III/);
  });
});
