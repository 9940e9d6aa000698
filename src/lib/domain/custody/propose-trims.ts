import type { Placement } from '../trace/trace';
import { msPerHour } from '../units';

/** Readings at one end of the journey that look as if the logger had not yet, or no longer, been with the goods. */
export interface ProposedTrim {
	readonly end: 'from' | 'to';
	/** The reading that the journey would begin or end with. */
	readonly index: number;
	/** Of the outermost reading. */
	readonly outermostCelsius: number;
	/** Where the trace rests beyond that stretch. */
	readonly restingCelsius: number;
}

/*
 * Common practice, no source: a logger that is switched on in the hand or left on a desk comes from, or goes to,
 * another temperature within some hours, all on one side of where it rests. A probe inside the product does so within
 * the hour; what takes longer there is the product itself, and that is the journey.
 */
const longestHours: Readonly<Record<Placement, number>> = { air: 3, 'between-cases': 3, 'in-product': 1 };
const restHours = 2;
const fewestAtRest = 4;
const apartCelsius = 2;
const restingWithinCelsius = 1;

/**
 * What a trace shows before loading and after unloading: a run from another temperature to where it then rests (median
 * of the next two hours), over 2 °C apart and back within 1 °C in three hours, or one inside the product. Proposed to a
 * person; nothing is left out by itself.
 * @param times UTC ms, ascending, of the readings that count
 * @param celsius of the same readings
 */
export function proposeTrims(
	times: ArrayLike<number>,
	celsius: ArrayLike<number>,
	placement: Placement
): ProposedTrim[] {
	const last = times.length - 1;
	const forward = runIn((at) => [times[at] ?? 0, celsius[at] ?? 0], last, longestHours[placement]);
	const backward = runIn(
		(at) => [-(times[last - at] ?? 0), celsius[last - at] ?? 0],
		last,
		longestHours[placement]
	);
	const proposed: ProposedTrim[] = [];
	if (forward) proposed.push({ end: 'from', ...forward });
	// One run over the whole of a short trace is no journey with two ends.
	if (backward && last - backward.index > (forward?.index ?? -1))
		proposed.push({ end: 'to', ...backward, index: last - backward.index });
	return proposed;
}

type ReadingAt = (at: number) => readonly [ms: number, celsius: number];

/** The first reading at rest after a run from elsewhere; null where the trace begins at rest, or not so. */
function runIn(readingAt: ReadingAt, last: number, hours: number): Omit<ProposedTrim, 'end'> | null {
	if (last < fewestAtRest) return null;
	const [beganMs, outermostCelsius] = readingAt(0);
	for (let index = 0; index <= last; index++) {
		const [ms, celsius] = readingAt(index);
		if (ms - beganMs > hours * msPerHour) return null;
		const restingCelsius = restFrom(readingAt, index, last);
		if (restingCelsius === null) return null;
		if (Math.abs(celsius - restingCelsius) > restingWithinCelsius) continue;
		const isApart = Math.abs(outermostCelsius - restingCelsius) > apartCelsius;
		const isRun = isApart && isOneSided(readingAt, index, restingCelsius);
		return isRun ? { index, outermostCelsius, restingCelsius } : null;
	}
	return null;
}

/** Median of the two hours from a reading on; null where the trace does not go on so long. */
function restFrom(readingAt: ReadingAt, index: number, last: number): number | null {
	const untilMs = readingAt(index)[0] + restHours * msPerHour;
	const within: number[] = [];
	let at = index;
	for (; at <= last && readingAt(at)[0] <= untilMs; at++) within.push(readingAt(at)[1]);
	const goesOn = at <= last || readingAt(last)[0] === untilMs;
	if (!goesOn || within.length < fewestAtRest) return null;
	within.sort((a, b) => a - b);
	return within[within.length >> 1] ?? null;
}

function isOneSided(readingAt: ReadingAt, index: number, restingCelsius: number): boolean {
	const side = Math.sign(readingAt(0)[1] - restingCelsius);
	for (let at = 1; at < index; at++) if (Math.sign(readingAt(at)[1] - restingCelsius) !== side) return false;
	return true;
}
