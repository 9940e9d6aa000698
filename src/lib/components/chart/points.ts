import type { SeriesView } from '../../schemas/docket';

/** A reading as the crosshair tells it; null is not known. */
export interface Point {
	ms: number;
	celsius: number | null;
	leftHours: number | null;
	leftLowHours: number | null;
	leftHighHours: number | null;
}

/** The readings that the crosshair steps over. */
export interface Points {
	times: ArrayLike<number>;
	at: (index: number) => Point;
}

/** As many as are drawn: where a trace was thinned, not every one. */
export function pointsOf(series: SeriesView): Points {
	return {
		times: series.times,
		at: (index) => ({
			ms: series.times[index] ?? 0,
			celsius: series.celsius[index] ?? null,
			leftHours: series.remainingHours?.[index] ?? null,
			leftLowHours: series.remainingLowHours?.[index] ?? null,
			leftHighHours: series.remainingHighHours?.[index] ?? null
		})
	};
}
