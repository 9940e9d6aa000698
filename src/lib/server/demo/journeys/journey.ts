import type { Placement } from '../../../domain/trace/trace';

/** One pair of hands between two handovers, as planned. */
export interface Leg {
	/** Key of a partner. */
	by: string;
	/** Left out: the partner's name. */
	holder?: string;
	place: string;
	hours: number;
	setPointCelsius: number;
}

/** Something that happened to the load on a leg. */
export interface Incident {
	/** From 0. */
	leg: number;
	afterHours: number;
	hours: number;
	/** The air the goods stood in meanwhile. */
	airCelsius: number;
}

/** Where a logger rode and what became of it. */
export interface Ride {
	/** Line it belongs to, from 1; null: the load's. */
	line: number | null;
	position: string;
	placement: Placement;
	/** How much of an incident reaches it, 0–1. */
	exposure: number;
	/** Warmer or colder than the load throughout. */
	offsetCelsius: number;
	/** A stretch it wrote nothing. */
	gap?: { leg: number; afterHours: number; hours: number };
	/** It stopped so long before the load arrived. */
	stopsEarlyHours?: number;
	layout: LayoutName;
}

export const layoutNames = [
	'iso',
	'german',
	'american',
	'json-list',
	'json-nested',
	'tabs',
	'with-humidity',
	'two-probes',
	'no-unit'
] as const;
/** How its export is written. The last two leave something to ask. */
export type LayoutName = (typeof layoutNames)[number];

/** A leg as it took place. */
export interface PlacedLeg extends Leg {
	plannedMs: number;
	actualMs: number;
}
