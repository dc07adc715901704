import type { Limit, PropertyDefinition } from '../../src';
import { upperEnd } from '../parts/limitEnds';

/** One result, 95 %, one-sided: 1.645/2.772 of the reproducibility R. Source: ISO 4259-2, ASTM D3244. */
const SHARE_OF_R = 1.645 / 2.772;

/** The margin that the method's precision asks for at the limit, rounded up to the digits shown. */
export function precisionMargin(limit: Limit, { reproducibility, digits }: PropertyDefinition): number | undefined {
  const end = Math.max(Math.abs(limit.min ?? 0), Math.abs(upperEnd(limit).value ?? 0));
  if (!reproducibility || (limit.min === undefined && upperEnd(limit).value === undefined)) return undefined;
  const r = 'absolute' in reproducibility ? reproducibility.absolute : reproducibility.relative * end;
  const unit = 10 ** -digits;
  return r > 0 ? Number((Math.ceil((SHARE_OF_R * r) / unit - 1e-9) * unit).toFixed(digits)) : undefined;
}
