import { rateAt, type RateSpec } from './rate-curve';
import type { LifeNeed } from './spec';

/** What a need at its own temperature is worth in hours at the spec's reference temperature. */
export function needWorthHours(spec: RateSpec, need: LifeNeed): number {
	return need.hours * rateAt(spec, need.celsius);
}
