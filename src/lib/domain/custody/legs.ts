import type { Handover } from '../receiving/assessment';
import type { Stretch } from '../shelf-life/course';

/** Time in one holder's hands, before anything is known of what it used. */
export interface Leg {
	readonly ordinal: number;
	readonly handover: Handover;
	readonly fromMs: number;
	readonly toMs: number;
	/** Null unless both ends were planned. */
	readonly plannedMs: number | null;
}

/**
 * When a handover took place: the actual instant, else the planned one; null when neither is known.
 */
export function handoverMs(handover: Handover): number | null {
	return handover.actualMs ?? handover.plannedMs;
}

/** The legs between neighbouring handovers, numbered from 1 in order of time; instants nobody knows are left out. */
export function legsOf(handovers: readonly Handover[], lastReadingMs: number): Leg[] {
	const placed = inOrder(handovers, lastReadingMs);
	return placed.slice(1).map((next, i) => {
		const { handover, ms } = placed[i] as Placed;
		const isPlanned = handover.plannedMs !== null && next.handover.plannedMs !== null;
		return {
			ordinal: i + 1,
			handover,
			fromMs: ms,
			toMs: next.ms,
			plannedMs: isPlanned ? (next.handover.plannedMs as number) - (handover.plannedMs as number) : null
		};
	});
}

/** First to last handover: only readings in it count. Null with fewer than two known instants: then all do. */
export function custodyWindow(handovers: readonly Handover[], lastReadingMs: number): Stretch | null {
	const placed = inOrder(handovers, lastReadingMs);
	const first = placed[0];
	const last = placed[placed.length - 1];
	if (first === undefined || last === undefined || placed.length < 2) return null;
	return { fromMs: first.ms, toMs: last.ms };
}

interface Placed {
	readonly handover: Handover;
	readonly ms: number;
}

/**
 * A last handover without an actual time has not been logged yet: the load is still in the earlier hands, so it is
 * placed no sooner than the last reading. The plan must not hide the hours a load is late.
 */
function inOrder(handovers: readonly Handover[], lastReadingMs: number): Placed[] {
	const placed: Placed[] = [];
	for (const handover of handovers) {
		const ms = handoverMs(handover);
		if (ms !== null) placed.push({ handover, ms });
	}
	placed.sort((a, b) => a.ms - b.ms);
	const last = placed[placed.length - 1];
	if (last !== undefined && last.handover.actualMs === null && placed.length > 1) {
		placed[placed.length - 1] = { ...last, ms: Math.max(last.ms, lastReadingMs) };
	}
	return placed;
}
