import { msPerHour } from '../../../domain/units';
import type { Leg, PlacedLeg } from './journey';

/**
 * When each leg began: planned backwards from when the load is due, actual ones late by what they were late so far.
 * `lateHours` says by how much each leg overran.
 */
export function placeLegs(legs: readonly Leg[], dueMs: number, lateHours: readonly number[]): PlacedLeg[] {
	const plannedHours = legs.reduce((sum, leg) => sum + leg.hours, 0);
	let plannedMs = dueMs - plannedHours * msPerHour;
	let actualMs = plannedMs;
	return legs.map((leg, at) => {
		const placed = { ...leg, plannedMs, actualMs: minute(actualMs) };
		plannedMs += leg.hours * msPerHour;
		actualMs += (leg.hours + (lateHours[at] ?? 0)) * msPerHour;
		return placed;
	});
}

function minute(ms: number): number {
	return Math.round(ms / 60_000) * 60_000;
}
