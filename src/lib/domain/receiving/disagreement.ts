import { RunningSum } from '../math/sum';
import { celsiusOf, type Trace } from '../trace/trace';
import type { Disagreement } from './evidence';

/** A logger of the line with what it read. */
export interface LoggerTrace {
	readonly serial: string;
	readonly trace: Trace;
	readonly accuracyCelsius: number;
}

/**
 * How far two loggers are apart on average over the time both were running, second less first in size, and how far
 * their accuracies allow together. Null where they never ran at once. The mean and not the worst moment: two places
 * in one load differ for minutes and are right to.
 */
export function disagreementOf(first: LoggerTrace, second: LoggerTrace): Disagreement | null {
	const mine = celsiusOf(first.trace);
	const other = celsiusOf(second.trace);
	const sum = new RunningSum();
	let compared = 0;
	let at = 0;
	for (let i = 0; i < mine.length; i++) {
		const ms = first.trace.times[i] as number;
		while (at + 1 < other.length && (second.trace.times[at + 1] as number) <= ms) at++;
		const there = celsiusAt(second.trace.times, other, at, ms);
		if (there === null) continue;
		sum.add(there - (mine[i] as number));
		compared++;
	}
	if (compared === 0) return null;
	return {
		differenceCelsius: Math.abs(sum.total / compared),
		allowedCelsius: first.accuracyCelsius + second.accuracyCelsius,
		serials: [first.serial, second.serial]
	};
}

/** On the line after reading `at`; null outside the readings. */
function celsiusAt(times: Float64Array, celsius: Float64Array, at: number, ms: number): number | null {
	const fromMs = times[at];
	if (fromMs === undefined || ms < fromMs) return null;
	const from = celsius[at] as number;
	if (ms === fromMs) return from;
	const toMs = times[at + 1];
	if (toMs === undefined) return null;
	return from + ((celsius[at + 1] as number) - from) * ((ms - fromMs) / (toMs - fromMs));
}
