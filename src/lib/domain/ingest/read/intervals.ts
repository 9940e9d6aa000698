import { usualIntervalMs } from '../../trace/interval';

/** The usual interval and what departs from it. */
export interface Intervals {
	readonly usualMs: number;
	/** Indexes of readings that follow a gap. */
	readonly gaps: readonly number[];
	/** Second interval of the file, and the reading at which it begins, where the logger was set anew. */
	readonly changed: { readonly fromMs: number; readonly toMs: number; readonly at: number } | null;
}

/** A gap is longer than three usual intervals and longer than half an hour. */
const gapFactor = 3;
const gapFloorMs = 30 * 60_000;
/** So many equal steps in a row are a setting, not jitter. */
const sustained = 5;

/** The most frequent step, the gaps, and a lasting change of interval. */
export function intervalsOf(times: Float64Array): Intervals {
	const usualMs = usualIntervalMs(times);
	const gaps: number[] = [];
	let changed: Intervals['changed'] = null;
	let run = 0;
	let previous = NaN;
	let settled = NaN;
	for (let i = 1; i < times.length; i++) {
		const step = (times[i] ?? 0) - (times[i - 1] ?? 0);
		if (step > gapFactor * usualMs && step > gapFloorMs) gaps.push(i);
		run = step === previous ? run + 1 : 1;
		previous = step;
		if (run < sustained) continue;
		if (!Number.isNaN(settled) && step !== settled)
			changed ??= { fromMs: settled, toMs: step, at: i - run + 1 };
		settled = step;
	}
	return {
		usualMs,
		gaps:
			changed === null
				? gaps
				: gaps.filter(
						(i) => (times[i] ?? 0) - (times[i - 1] ?? 0) > gapFactor * Math.max(changed.fromMs, changed.toMs)
					),
		changed
	};
}
