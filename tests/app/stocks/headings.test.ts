import { describe, expect, it } from 'vitest';
import { readHeading } from '../../../app/stocks/headings';
import { stockColumns } from '../../../app/stocks/stockColumns';

const COLUMNS = stockColumns(['zinc', 'ccs@-30', 'baseNumber', 'saturates'], [], 'EUR', true);

/** The column, and what a typed 10 becomes there; "left out" where its unit cannot be turned. */
function taken(heading: string): [string, number | 'left out'] | undefined {
  const found = readHeading(heading, COLUMNS);
  if (!found) return undefined;
  const { column, conversion } = found;
  return [column.id, conversion ? Number((10 * conversion.factor + conversion.offset).toPrecision(9)) : 'left out'];
}

describe('headings with units', () => {
  // SI prefixes and definitions (BIPM SI brochure); °F, cP and cSt by NIST SP 811, appendix B.8; ppm and % by mass.
  it.each([
    ['Price', 'pricePerTonne', 10],
    ['Price [€/kg]', 'pricePerTonne', 10_000],
    ['Price (EUR/t)', 'pricePerTonne', 10],
    ['Cost per tonne [EUR]', 'pricePerTonne', 10],
    ['Price/kg', 'pricePerTonne', 10_000],
    ['price EUR per 100 kg', 'pricePerTonne', 100],
    ['Sulphur [% m/m]', 'sulphur', 100_000],
    ['Sulfur, wt. %', 'sulphur', 100_000],
    ['Sulphur % (m/m)', 'sulphur', 100_000],
    ['S ppm', 'sulphur', 10],
    ['Zn [%]', 'zinc', 100_000],
    ['Noack (ppm)', 'noack', 0.001],
    ['NOACK %', 'noack', 10],
    ['On hand [kg]', 'availableTonnes', 0.01],
    ['Quantity, kg', 'availableTonnes', 0.01],
    ['Stock [t]', 'availableTonnes', 10],
    ['On hand (MT)', 'availableTonnes', 10],
    ['Flash (°F)', 'flashPoint', -12.2222222],
    ['Flash point COC [°C]', 'flashPoint', 10],
    ['Pour point, °C', 'pourPoint', 10],
    ['Pour deg F', 'pourPoint', -12.2222222],
    ['Density [g/cm³]', 'density@15', 10_000],
    ['Density at 15 °C (kg/L)', 'density@15', 10_000],
    ['Density (15 °C) [kg/m^3]', 'density@15', 10],
    ['KV40 cSt', 'kv@40', 10],
    ['KV @ 40 °C [mm²/s]', 'kv@40', 10],
    ['Viscosity (cSt at 100 °C)', 'kv@100', 10],
    ['Viscosity @ 100 °C [mm2/s] (ASTM D445)', 'kv@100', 10],
    ['CCS -30 °C [cP]', 'ccs@-30', 10],
    ['BN [mg KOH/g]', 'baseNumber', 10],
    ['Max dose, % m/m', 'greatestDose', 10],
    ['VI', 'vi', 10],
    ['Sulphur %', 'sulphur', 100_000],
    ['Sulphur in %', 'sulphur', 100_000],
    ['Total sulphur content %', 'sulphur', 100_000],
    ['Zinc %', 'zinc', 100_000],
    ['Price €/t', 'pricePerTonne', 10],
    ['Price€/kg', 'pricePerTonne', 10_000],
    ['Price in €/t', 'pricePerTonne', 10],
    ['Flash °F', 'flashPoint', -12.2222222],
    ['FlashPoint °F', 'flashPoint', -12.2222222],
    ['Flash in °F', 'flashPoint', -12.2222222],
    ['Density kg/m3', 'density@15', 10],
    ['Density15 g/cm³', 'density@15', 10_000],
  ])('%s', (heading, column, ten) => {
    expect(taken(heading)).toEqual([column, ten]);
  });

  it.each([
    ['KV40 (SUS)', 'kv@40'],
    ['KV100 (°F)', 'kv@100'],
    ['KV at 100 °F [cSt]', 'kv@100'],
    ['Price [$/t]', 'pricePerTonne'],
    ['Price [€/l]', 'pricePerTonne'],
    ['Price per m³', 'pricePerTonne'],
    ['On hand [tons]', 'availableTonnes'],
    ['On hand (L)', 'availableTonnes'],
    ['Saturates [% v/v]', 'saturates'],
    ['Density (°API)', 'density@15'],
    ['Max dose [kg/t]', 'greatestDose'],
  ])('%s is left out for its unit', (heading, column) => {
    expect(taken(heading)).toEqual([column, 'left out']);
  });

  it.each(['Density 20', '% sulphur', 'Colour', 'Product code', ''])('“%s” is no column here', (heading) => {
    expect(taken(heading)).toBeUndefined();
  });

  it('reads the headings that the table itself has', () => {
    for (const { id, label, unit, kind } of COLUMNS) {
      if (kind === 'use' || kind === 'share') continue;
      expect(taken(label)).toEqual([id, 10]);
      if (unit) expect(taken(`${label} [${unit}]`)).toEqual([id, 10]);
    }
  });
});
