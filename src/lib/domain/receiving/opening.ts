import type { RateBounds } from '../shelf-life/rate-bounds';
import { curveRateAt, type RateCurve } from '../shelf-life/rate-curve';
import type { Spec } from '../shelf-life/spec';
import { msPerHour } from '../units';
import type { OpeningBalance, Range } from './assessment';

/**
 * Life used before the first reading, with its range.
 * Declared: as declared, ± its own error. Computed: the time since pack or harvest at the assumed temperature, colder
 * and warmer by its error, at the slowest and the fastest the model can be. Undeclared: the spec's pessimistic default is both figure and high, and the low is nothing
 * used; silence is never kinder than an honest declaration, and the range says how little is known.
 */
export function openingHours(
	opening: OpeningBalance,
	spec: Pick<Spec, 'openingDefaultHours'>,
	curve: RateCurve,
	firstReadingMs: number,
	bounds: RateBounds = { low: curve, high: curve }
): Range {
	switch (opening.kind) {
		case 'declared':
			return {
				value: opening.hours,
				low: Math.max(0, opening.hours - opening.plusMinusHours),
				high: opening.hours + opening.plusMinusHours
			};
		case 'computed': {
			const hours = Math.max(0, firstReadingMs - opening.sinceMs) / msPerHour;
			return {
				value: hours * curveRateAt(curve, opening.celsius),
				low: hours * curveRateAt(bounds.low, opening.celsius - opening.plusMinusCelsius),
				high: hours * curveRateAt(bounds.high, opening.celsius + opening.plusMinusCelsius)
			};
		}
		case 'undeclared':
			return { value: spec.openingDefaultHours, low: 0, high: spec.openingDefaultHours };
	}
}
