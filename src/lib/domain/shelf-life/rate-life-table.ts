import { exp } from '../math/exp';
import { ln } from '../math/ln';
import { exponentialPiece, type RatePiece } from './piece';
import type { LifePoint } from './spec';

/**
 * Between two points the logarithm of life is linear in temperature; rate = life at the reference / life at T.
 * The reference need not be a point, but must lie within the table.
 */
export function lifeTablePieces(points: readonly LifePoint[], referenceCelsius: number): RatePiece[] {
	const referenceHours = tableLifeHours(points, referenceCelsius);
	return points.slice(1).map((upper, i) => {
		const lower = points[i] as LifePoint;
		const slope = ln(lower.lifeHours / upper.lifeHours) / (upper.celsius - lower.celsius);
		const rate = referenceHours / lower.lifeHours;
		return exponentialPiece(lower.celsius, upper.celsius, slope, lower.celsius, rate);
	});
}

/** Life at a temperature by the table, held at its ends: whoever asks outside must say so beside the figure. */
export function tableLifeHours(points: readonly LifePoint[], celsius: number): number {
	const first = points[0] as LifePoint;
	const last = points[points.length - 1] as LifePoint;
	if (celsius <= first.celsius) return first.lifeHours;
	if (celsius >= last.celsius) return last.lifeHours;
	const at = points.findIndex((point) => point.celsius >= celsius);
	const lower = points[at - 1] as LifePoint;
	const upper = points[at] as LifePoint;
	if (upper.celsius === celsius) return upper.lifeHours;
	const fraction = (celsius - lower.celsius) / (upper.celsius - lower.celsius);
	return lower.lifeHours * exp(fraction * ln(upper.lifeHours / lower.lifeHours));
}
