import { type Product, reportedViscosityIndex, VI_DEFINITION, viscosityIndex } from '../../src';
import type { CellView, Column } from './column';
import { figureColumn } from './figureColumn';
import { countingValue } from './productFigures';
import { estimatedKv40, needsStatedVi } from './statedVi';

const STATED = figureColumn(VI_DEFINITION);
const unknown = (title: string): CellView => ({ text: '–', edit: '', state: 'unknown', title });

/** VI by ASTM D2270 from the two viscosities. It may be typed (from a data sheet) only where KV40 is unknown. */
export const VI_COLUMN: Column = {
  ...STATED,
  id: 'vi',
  title: `${VI_DEFINITION.label}, calculated from KV40 and KV100 (${VI_DEFINITION.method})`,
  locked: (product) =>
    needsStatedVi(product) ? undefined : 'Calculated. A viscosity index is typed only where KV40 is unknown.',
  read: (product) => (needsStatedVi(product) ? statedView(product) : calculatedView(product)),
};

function statedView(product: Product): CellView {
  const view = STATED.read(product);
  if (view.state === 'unknown') return unknown('unknown: it needs KV40 and KV100');
  const estimate = estimatedKv40(product);
  if (estimate && 'problem' in estimate && !view.problem) return { ...view, problem: estimate.problem };
  return { ...view, title: 'as stated; KV40 is estimated from it' };
}

function calculatedView(product: Product): CellView {
  const kv40 = countingValue(product, { property: 'kv', celsius: 40 });
  const kv100 = countingValue(product, { property: 'kv', celsius: 100 });
  if (kv40 === undefined || kv100 === undefined) return unknown('unknown: it needs KV40 and KV100');
  if (kv100 < 2) return unknown('not defined below a KV100 of 2 mm²/s (ASTM D2270)');
  if (kv40 <= kv100) return unknown('unknown: KV40 must be above KV100');
  const text = String(reportedViscosityIndex(viscosityIndex(kv40, kv100)));
  return { text, edit: '', title: 'calculated from KV40 and KV100' };
}
