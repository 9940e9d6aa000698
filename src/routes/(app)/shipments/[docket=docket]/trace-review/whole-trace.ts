import type { Point, Points } from '$lib/components/chart/points';
import { assess, AssessmentRefusal, type AssessmentRefusalCode } from '$lib/domain/receiving/assess';
import type { Assessment, Trim } from '$lib/domain/receiving/assessment';
import { unpackTrace } from '$lib/domain/trace/pack';
import { celsiusOf, type Trace } from '$lib/domain/trace/trace';
import type { AssessedBasis, TraceBasis } from '$lib/schemas/trace-basis';

/** Every reading of a trace, its clock put right, with what its lines were assessed from. */
export interface WholeTrace {
	traceId: string;
	trace: Trace;
	celsius: Float64Array;
	assessed: readonly AssessedBasis[];
}

export function wholeTraceOf({ traceId, packed, clockShiftMs, assessed }: TraceBasis): WholeTrace {
	const bytes = Uint8Array.from(atob(packed), (character) => character.charCodeAt(0));
	const kept = unpackTrace(bytes);
	const trace = { ...kept, times: kept.times.map((ms) => ms + clockShiftMs) };
	return { traceId, trace, celsius: celsiusOf(trace), assessed };
}

/** One line assessed by this trace as the server does it, with other trims where they are given; or why it cannot be. */
export function assessWhole(
	{ trace }: WholeTrace,
	basis: AssessedBasis,
	trims: readonly Trim[] = basis.trims
): Assessment | AssessmentRefusalCode {
	try {
		return assess({ ...basis, trace, trims });
	} catch (error) {
		if (error instanceof AssessmentRefusal) return error.code;
		throw error;
	}
}

/** Index of the reading at just this moment; −1 without. */
export function indexAt(times: ArrayLike<number>, ms: number): number {
	let [low, high] = [0, times.length - 1];
	while (low <= high) {
		const middle = (low + high) >> 1;
		const at = times[middle] ?? 0;
		if (at === ms) return middle;
		if (at < ms) low = middle + 1;
		else high = middle - 1;
	}
	return -1;
}

/** Life left at a reading, with its bounds; null where the reading does not count. */
export function leftAt(
	{ series, fullLifeHours, openingHours }: Assessment,
	{ spec }: AssessedBasis,
	ms: number
): { usedHours: number; value: number; low: number; high: number } | null {
	const at = indexAt(series.times, ms);
	if (at < 0) return null;
	const plusMinusHours = spec.fullLifeUncertaintyHours;
	const usedHours = series.usedHours[at] ?? 0;
	return {
		usedHours,
		value: fullLifeHours - openingHours.value - usedHours,
		low: fullLifeHours - plusMinusHours - openingHours.high - (series.usedHighHours[at] ?? 0),
		high: fullLifeHours + plusMinusHours - openingHours.low - (series.usedLowHours[at] ?? 0)
	};
}

/** What the crosshair steps over: every reading, however few the chart draws. */
export function pointsOfWhole(
	whole: WholeTrace,
	assessed: { assessment: Assessment; basis: AssessedBasis } | null
): Points {
	return {
		times: whole.trace.times,
		at: (index): Point => {
			const ms = whole.trace.times[index] ?? 0;
			const left = assessed && leftAt(assessed.assessment, assessed.basis, ms);
			return {
				ms,
				celsius: whole.celsius[index] ?? null,
				leftHours: left?.value ?? null,
				leftLowHours: left?.low ?? null,
				leftHighHours: left?.high ?? null
			};
		}
	};
}
