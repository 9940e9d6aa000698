import { instantOf, type InstantFault, type SplitInstant } from './instant-text';

/** One upload's worth: three weeks of readings every two seconds. */
export const mostReadings = 1_000_000;

export type ReadingFault =
	| InstantFault
	| 'not-a-list'
	| 'no-readings'
	| 'too-many-readings'
	| 'not-a-pair'
	| 'not-a-number'
	| 'below-absolute-zero';

/** Readings in order of time, and where each stood as it was sent. */
export interface OrderedReadings {
	readonly first: SplitInstant;
	/** Since the first reading. */
	readonly timesMs: Float64Array;
	readonly celsius: Float64Array;
	/** `sentAt[i]`: the place of reading i in the list as sent; null where that was in order. */
	readonly sentAt: Uint32Array | null;
}

const absoluteZeroCelsius = -273.15;

/**
 * Readings as pairs of time and °C. Out of order they are sorted by time, and those of one time stay in the order
 * sent: two readings at one time are a jump, which takes no time and uses no life. The first fault ends the reading.
 */
export function orderedReadings(
	value: unknown,
	refuse: (field: string, code: ReadingFault) => void
): OrderedReadings | null {
	const no = (field: string, code: ReadingFault) => {
		refuse(field, code);
		return null;
	};
	if (!Array.isArray(value)) return no('readings', 'not-a-list');
	if (value.length === 0) return no('readings', 'no-readings');
	if (value.length > mostReadings) return no('readings', 'too-many-readings');
	const timesMs = new Float64Array(value.length);
	const celsius = new Float64Array(value.length);
	let first: SplitInstant | null = null;
	for (let at = 0; at < value.length; at++) {
		const pair: unknown = value[at];
		if (!Array.isArray(pair) || pair.length !== 2) return no(`readings.${at}`, 'not-a-pair');
		const instant = instantOf(pair[0]);
		if (typeof instant === 'string') return no(`readings.${at}.0`, instant);
		const reading: unknown = pair[1];
		if (typeof reading !== 'number' || !Number.isFinite(reading))
			return no(`readings.${at}.1`, 'not-a-number');
		if (reading <= absoluteZeroCelsius) return no(`readings.${at}.1`, 'below-absolute-zero');
		first ??= instant;
		timesMs[at] = (instant.seconds - first.seconds + (instant.fraction - first.fraction)) * 1000;
		celsius[at] = reading;
	}
	return first && inOrder(first, timesMs, celsius);
}

function inOrder(sentFirst: SplitInstant, sentMs: Float64Array, sentCelsius: Float64Array): OrderedReadings {
	const isSorted = sentMs.every((ms, at) => at === 0 || ms >= (sentMs[at - 1] as number));
	if (isSorted) return { first: sentFirst, timesMs: sentMs, celsius: sentCelsius, sentAt: null };
	const sentAt = Uint32Array.from(sentMs.keys()).sort(
		(a, b) => (sentMs[a] as number) - (sentMs[b] as number) || a - b
	);
	const earliestMs = sentMs[sentAt[0] as number] as number;
	return {
		first: { seconds: sentFirst.seconds, fraction: sentFirst.fraction + earliestMs / 1000 },
		timesMs: Float64Array.from(sentAt, (at) => (sentMs[at] as number) - earliestMs),
		celsius: Float64Array.from(sentAt, (at) => sentCelsius[at] as number),
		sentAt
	};
}
