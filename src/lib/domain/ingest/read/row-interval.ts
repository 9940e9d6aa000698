import type { ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';

/** Settings of the trade, in seconds: what lies between stated start and end is split into one of these or not at all. */
const usualSeconds = [
	...[1, 2, 5, 10, 15, 20, 30, 60, 120, 180, 240, 300, 360, 600, 720, 900, 1200, 1800],
	...[3600, 5400, 7200, 10_800, 14_400, 21_600, 43_200, 86_400]
];
/** Lengths that a count without a unit may have: a second, a minute, an hour, a day. */
const unitSeconds = [1, 60, 3600, 86_400] as const;
/** Intervals to offer when the file names none: the usual settings of the trade (5 to 15 minutes). */
const offeredSeconds = [300, 600, 900] as const;
const longestSeconds = 400 * 86_400;
/** Starts and stops are often written without their seconds. */
const slackSeconds = 60;

/** What lies between rows that carry no time, or between counts without a unit. */
export type RowInterval =
	| { readonly seconds: number; readonly because: 'answer' | 'preamble' | 'declared' }
	| { readonly offered: readonly number[] };

/** Running numbers: how many steps of the usual size they make, and that size. */
export interface Steps {
	readonly count: number;
	/** 1 where rows merely follow each other. */
	readonly size: number;
	/** Whether the numbers count something, so that a step is so many seconds, minutes, hours. */
	readonly isCount: boolean;
}

/** The steps of running numbers. */
export function stepsOf(counts: Float64Array): Steps {
	const seen = new Map<number, number>();
	for (let i = 1; i < counts.length; i++) {
		const step = Math.abs((counts[i] ?? 0) - (counts[i - 1] ?? 0));
		if (step > 0) seen.set(step, (seen.get(step) ?? 0) + 1);
	}
	let [size, most] = [1, 0];
	for (const [step, times] of seen) if (times > most) [size, most] = [step, times];
	return { count: Math.abs((counts.at(-1) ?? 0) - (counts[0] ?? 0)) / size, size, isCount: true };
}

/**
 * How far apart the steps are: by the answer, by what the file states, by its start and end; else what may be is
 * offered. `spanMs` lies between start and end where both are known.
 */
export function intervalBetween(
	steps: Steps,
	stated: Pick<Stated, 'intervalMinutes' | 'intervalsNamed'>,
	spanMs: number | null,
	{ answers }: ReadContext
): RowInterval {
	if (answers.intervalSeconds !== undefined) return { seconds: answers.intervalSeconds, because: 'answer' };
	if (stated.intervalMinutes !== null) return { seconds: stated.intervalMinutes * 60, because: 'preamble' };
	const possible = steps.isCount
		? unitSeconds.map((unit) => unit * steps.size).filter((s) => s >= 1 && s * steps.count <= longestSeconds)
		: usualSeconds;
	// The stop may come up to an interval after the last reading.
	const fits = possible.filter((seconds) => {
		const rest = spanMs === null ? NaN : spanMs / 1000 - seconds * steps.count;
		return rest >= -slackSeconds && rest <= seconds + slackSeconds;
	});
	const [only] = fits;
	if (only !== undefined && fits.length === 1) return { seconds: only, because: 'declared' };
	if (stated.intervalsNamed.length > 1)
		return { offered: stated.intervalsNamed.map((minutes) => minutes * 60) };
	return { offered: fits.length > 1 ? fits : steps.isCount ? possible : offeredSeconds };
}
