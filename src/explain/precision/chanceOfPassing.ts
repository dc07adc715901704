import type { PredictedProperties } from '../../blend/predictedProperties';
import type { Order } from '../../optimise/order';
import type { LimitCheck } from '../../optimise/outcome';
import {
  type MixViscosities,
  type Precisions,
  R_PER_SIGMA,
  reproducibilityAt,
  reproducibilityOfIndex,
} from './methodPrecision';
import { normalBelow } from './normalDistribution';

/** KV40 and KV100 of a prediction [mm²/s], where both are known. */
export function viscositiesOf(predicted: PredictedProperties | undefined): MixViscosities | undefined {
  const at = (wanted: number) =>
    predicted?.properties.find(({ property, celsius }) => property === 'kv' && celsius === wanted)?.value;
  const [kv40, kv100] = [at(40), at(100)];
  return kv40 === undefined || kv100 === undefined ? undefined : { kv40, kv100 };
}

/**
 * Chance [0..1] that one result of a laboratory lies within the stated ends of a limit if the mix has the predicted
 * value: normal, σ = R/2.77 of the method at that value, both ends counted. On an end it is one half. The margin
 * ("inside by") is what the mix keeps, not what the laboratory judges by, so it is not counted; nor is the rounding of
 * results, nor how far the prediction itself may be off.
 *
 * @param predicted needed for a limit on the viscosity index, whose precision is that of both viscosities.
 * @returns undefined where the limit has no ends or no precision is known.
 */
export function chanceOfPassing(
  check: LimitCheck,
  order: Order,
  predicted?: PredictedProperties,
  precisions: Precisions = {},
): number | undefined {
  const limit = order.limits[check.limit];
  const { property, celsius, value } = check;
  if (!limit || !Number.isFinite(value)) return undefined;
  const uppers = [limit.max, typeof limit.below === 'number' ? limit.below : undefined].filter(
    (end) => end !== undefined,
  );
  if (limit.min === undefined && uppers.length === 0) return undefined;
  const viscosities = viscositiesOf(predicted);
  const r =
    property === 'vi'
      ? viscosities && reproducibilityOfIndex(viscosities, order, precisions)
      : reproducibilityAt(celsius === undefined ? { property } : { property, celsius }, value, order, precisions);
  if (r === undefined) return undefined;
  const sigma = r / R_PER_SIGMA;
  const below = normalBelow((Math.min(Infinity, ...uppers) - value) / sigma);
  return Math.max(0, below - normalBelow(((limit.min ?? -Infinity) - value) / sigma));
}
