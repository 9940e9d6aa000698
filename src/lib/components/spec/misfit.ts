import type { Spec } from '../../domain/shelf-life/spec';
import { lifeHoursAt, spokenFor } from './life-at';

/** A published life the curve does not pass: which source, and how far off. */
export interface Misfit {
	/** Number of the source, from 1. */
	source: number;
	celsius: number;
	publishedHours: number;
	curveHours: number;
	/** Of the published life; below zero where the curve says less. */
	fraction: number;
}

/** As much as a curve may differ from a printed life, which is itself a round number. */
const tolerance = 0.05;

/** The published point the curve misses by most, if it misses any by more than a twentieth. */
export function worstMisfit(spec: Spec): Misfit | null {
	const { fromCelsius, toCelsius } = spokenFor(spec);
	let worst: Misfit | null = null;
	spec.sources.forEach(({ point, lifeHoursHigh }, at) => {
		if (!point || point.celsius < fromCelsius || point.celsius > toCelsius) return;
		const curveHours = lifeHoursAt(spec, point.celsius);
		if (curveHours === null) return;
		const highHours = lifeHoursHigh ?? point.lifeHours;
		const publishedHours = curveHours > highHours ? highHours : point.lifeHours;
		const isWithin = curveHours >= point.lifeHours && curveHours <= highHours;
		const fraction = isWithin ? 0 : curveHours / publishedHours - 1;
		if (Math.abs(fraction) <= Math.max(tolerance, Math.abs(worst?.fraction ?? 0))) return;
		worst = { source: at + 1, celsius: point.celsius, publishedHours, curveHours, fraction };
	});
	return worst;
}
