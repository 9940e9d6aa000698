import type { Spec, SpecSource } from '../../domain/shelf-life/spec';
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

/** How far a life lies outside a printed one, or its range, as a part of the nearer end. */
function offBy(
	curveHours: number,
	{ point, lifeHoursHigh }: SpecSource
): { hours: number; fraction: number } {
	const low = point?.lifeHours ?? 0;
	const high = lifeHoursHigh ?? low;
	if (curveHours >= low && curveHours <= high) return { hours: curveHours, fraction: 0 };
	const hours = curveHours > high ? high : low;
	return { hours, fraction: curveHours / hours - 1 };
}

/**
 * The published point the curve misses by most, if it misses any by more than a twentieth. Where sources disagree at one
 * temperature, a curve that follows one of them is not blamed for the other.
 */
export function worstMisfit(spec: Spec): Misfit | null {
	const { fromCelsius, toCelsius } = spokenFor(spec);
	const misfits = spec.sources.flatMap((source, at): Misfit[] => {
		const celsius = source.point?.celsius ?? null;
		if (celsius === null || celsius < fromCelsius || celsius > toCelsius) return [];
		const curveHours = lifeHoursAt(spec, celsius);
		if (curveHours === null) return [];
		const rivals = spec.sources.filter(({ point }) => point?.celsius === celsius);
		if (rivals.some((rival) => Math.abs(offBy(curveHours, rival).fraction) <= tolerance)) return [];
		const { hours, fraction } = offBy(curveHours, source);
		return [{ source: at + 1, celsius, publishedHours: hours, curveHours, fraction }];
	});
	return misfits.sort((a, b) => Math.abs(b.fraction) - Math.abs(a.fraction))[0] ?? null;
}
