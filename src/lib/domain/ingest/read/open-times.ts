import type { Answers, Decision, Oddity, QuestionCode, RefusalCode } from '../ingestion';
import type { DateOrder } from '../times/date-order';
import type { Instants } from './instants';
import type { OrderBy } from './order';
import type { UsedZone } from './zone-choice';

/** Every row in UTC, with what was taken to get there. */
export interface TimeAxis extends Instants {
	readonly zone: UsedZone;
	readonly order: DateOrder | null;
	readonly orderBy: OrderBy | null;
	/** Whether local times had to be placed in a zone at all. */
	readonly isLocal: boolean;
	/** Rows that were left out on purpose, by their place; they are told under a code of their own. */
	readonly setAside?: ReadonlySet<number>;
	/** What else was decided or seen on the way, told as it stands. */
	readonly decisions?: readonly Decision[];
	readonly oddities?: readonly Oddity[];
}

/** One answer with the times it would give. */
export interface TimeOption {
	readonly answer: Answers;
	readonly label: string;
	readonly ms: Float64Array | null;
}

/** What stays open about the times. */
export interface OpenTimes {
	readonly code: QuestionCode;
	readonly why: string;
	readonly options: readonly TimeOption[];
}

/** Times under which the file cannot be read at all. */
export interface NoTimes {
	readonly refusal: RefusalCode;
	readonly found: string | null;
}

export type AxisOrOpen = TimeAxis | OpenTimes | NoTimes;

/** First and last finite moment; NaN without any. */
export function endsOf(ms: Float64Array): { readonly firstMs: number; readonly lastMs: number } {
	let [first, last] = [Infinity, -Infinity];
	for (const at of ms) {
		if (at < first) first = at;
		if (at > last) last = at;
	}
	return Number.isFinite(first) ? { firstMs: first, lastMs: last } : { firstMs: NaN, lastMs: NaN };
}

/** The same times moved so that the first falls on another moment. */
export function startingAt(ms: Float64Array, startMs: number): Float64Array {
	const shift = startMs - endsOf(ms).firstMs;
	return ms.map((at) => at + shift);
}
