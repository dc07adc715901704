import { isBaseOil } from '../../stock/family';
import { findFigure } from '../../stock/findFigure';
import type { Stock } from '../../stock/stock';
import { LEAST_KV100_FOR_VI, reportedViscosityIndex, viscosityIndex } from '../viscosityIndex';

export type ApiGroup = 'I' | 'II' | 'III' | 'IV' | 'V';

/**
 * The limits of API 1509, Annex E (base oil interchangeability guidelines), which class base stocks, not mixes. Check
 * the current edition. Source: API 1509, Annex E; read against printed copies of it and of its table.
 */
export const API_GROUP_LIMITS = {
  /** Least saturates of Groups II and III [% m/m]; Group I has less, or too much sulphur. */
  saturates: 90,
  /** Greatest sulphur of Groups II and III [mg/kg]: 0.03 % m/m. */
  sulphur: 300,
  /** Least VI of Groups I and II [-]. */
  leastVi: 80,
  /** Least VI of Group III [-]; Groups I and II stay below. */
  groupIIIVi: 120,
} as const;

export interface ApiGroupOfStock {
  /** Absent: the known figures do not decide. */
  group: ApiGroup | undefined;
  /** Why, in one sentence. */
  reason: string;
  /** How the stated family differs from what the figures say. */
  contradiction?: string;
}

interface GroupFigures {
  saturates?: number;
  sulphur?: number;
  /** As reported: a whole number. */
  vi?: number;
  /** Why there is no VI. */
  viMissing: string;
}

function viOf(stock: Stock): { vi?: number; viMissing: string } {
  const kv40 = findFigure(stock, 'kv', 40)?.value;
  const kv100 = findFigure(stock, 'kv', 100)?.value;
  if (kv100 !== undefined && kv100 < LEAST_KV100_FOR_VI) {
    return { viMissing: `the viscosity index is not defined below a KV100 of ${LEAST_KV100_FOR_VI} mm²/s` };
  }
  if (kv40 !== undefined && kv100 !== undefined && kv40 > kv100) {
    return { vi: reportedViscosityIndex(viscosityIndex(kv40, kv100)), viMissing: '' };
  }
  const stated = findFigure(stock, 'vi')?.value;
  if (stated !== undefined) return { vi: reportedViscosityIndex(stated), viMissing: '' };
  return { viMissing: 'the viscosity index is unknown: enter KV40 and KV100' };
}

function figuresOf(stock: Stock): GroupFigures {
  return {
    saturates: findFigure(stock, 'saturates')?.value,
    sulphur: findFigure(stock, 'sulphur')?.value,
    ...viOf(stock),
  };
}

/** Whether saturates and sulphur are those of Groups II and III; undefined where the known figures do not decide. */
function isRefined({ saturates, sulphur }: GroupFigures): boolean | undefined {
  if (saturates !== undefined && saturates < API_GROUP_LIMITS.saturates) return false;
  if (sulphur !== undefined && sulphur > API_GROUP_LIMITS.sulphur) return false;
  return saturates === undefined || sulphur === undefined ? undefined : true;
}

function figuresInWords({ saturates, sulphur, vi }: GroupFigures): string {
  return [
    saturates === undefined ? '' : `saturates ${saturates} %`,
    sulphur === undefined ? '' : `sulphur ${sulphur} mg/kg`,
    vi === undefined ? '' : `VI ${vi}`,
  ]
    .filter(Boolean)
    .join(', ');
}

function unknownInWords({ saturates, sulphur }: GroupFigures): string {
  const missing = [saturates === undefined ? 'saturates' : '', sulphur === undefined ? 'sulphur' : ''].filter(Boolean);
  return `Unknown: ${missing.join(' and ')}. Enter the figure to class the stock.`;
}

/** The group by figures alone: I, II, III, or V for a viscosity index outside all three. */
function groupByFigures(figures: GroupFigures): ApiGroupOfStock {
  const { vi } = figures;
  if (vi === undefined) return { group: undefined, reason: `Not classed: ${figures.viMissing}.` };
  const words = figuresInWords(figures);
  if (vi < API_GROUP_LIMITS.leastVi) return { group: 'V', reason: `${words}: below the VI of Groups I to III.` };
  const refined = isRefined(figures);
  if (refined === undefined) return { group: undefined, reason: unknownInWords(figures) };
  const high = vi >= API_GROUP_LIMITS.groupIIIVi;
  if (refined) return { group: high ? 'III' : 'II', reason: `${words}.` };
  return high
    ? { group: 'V', reason: `${words}: the VI is above Group I, the rest is not of Group III.` }
    : { group: 'I', reason: `${words}.` };
}

/** Chemistry decides for these, whatever the figures (Annex E: IV is PAO, V is all others). */
function groupByFamily({ family }: Stock): ApiGroup | undefined {
  if (family === 'PAO' || family === 'mPAO') return 'IV';
  if (family === 'ester' || family === 'alkylated naphthalene' || family === 'polyisobutene') return 'V';
  return undefined;
}

const STATED: Readonly<Partial<Record<Stock['family'], ApiGroup>>> = {
  'Group I': 'I',
  'Group II': 'II',
  'Group III': 'III',
  naphthenic: 'V',
};

/**
 * API base stock group of a stock: IV and V by chemistry, the others by saturates [% m/m], sulphur [mg/kg] and the
 * viscosity index as reported (whole number, ASTM D2270). An unknown figure that decides leaves the group undefined
 * and is named; a figure outside the group that the family states is reported, never corrected.
 */
export function apiGroupOf(stock: Stock): ApiGroupOfStock {
  if (!isBaseOil(stock.family)) return { group: undefined, reason: 'An additive, not a base stock.' };
  const chemical = groupByFamily(stock);
  if (chemical) return { group: chemical, reason: `By chemistry: ${stock.family}.` };
  const found = groupByFigures(figuresOf(stock));
  const stated = STATED[stock.family];
  if (found.group === undefined || stated === undefined || stated === found.group) return found;
  return { ...found, contradiction: `Entered as ${stock.family}, but the figures class it as Group ${found.group}.` };
}
