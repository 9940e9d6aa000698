import type { Excursion, Handover } from '../receiving/assessment';
import type { FoundExcursion } from '../excursions/find-excursions';
import { msPerMinute } from '../units';
import { handoverMs, type Leg } from './legs';

/**
 * Says which legs an excursion touched and splits its cost between them by time.
 * One that begins within the error of a handover's instant belongs to neither neighbour until a person decides; legs
 * it ran on into beyond those are named all the same.
 */
export function placeExcursion(
	excursion: FoundExcursion,
	legs: readonly Leg[],
	handovers: readonly Handover[]
): Excursion {
	const unsettled = handovers.find((handover) => isWithinError(excursion.fromMs, handover));
	const touched = legs.filter((leg) => overlapMs(excursion, leg) > 0);
	const named = touched.filter((leg) => unsettled === undefined || !isNeighbour(leg, unsettled));
	const spanMs = excursion.toMs - excursion.fromMs;
	return {
		...excursion,
		legs: named.map((leg) => leg.ordinal),
		legCostHours: named.map((leg) => (excursion.costHours * overlapMs(excursion, leg)) / spanMs),
		...(unsettled === undefined ? {} : { unsettledHandoverId: unsettled.id })
	};
}

function overlapMs(excursion: FoundExcursion, leg: Leg): number {
	return Math.min(excursion.toMs, leg.toMs) - Math.max(excursion.fromMs, leg.fromMs);
}

function isWithinError(ms: number, handover: Handover): boolean {
	const at = handoverMs(handover);
	return (
		at !== null &&
		handover.plusMinusMinutes > 0 &&
		Math.abs(ms - at) <= handover.plusMinusMinutes * msPerMinute
	);
}

function isNeighbour(leg: Leg, handover: Handover): boolean {
	return leg.handover.id === handover.id || leg.toMs === handoverMs(handover);
}
