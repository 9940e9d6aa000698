import type { Course } from '../shelf-life/course';
import type { Placement } from '../trace/trace';
import { msPerHour, msPerMinute } from '../units';
import { stretchesBeyond, type Beyond } from './beyond';

export const incidentKinds = ['door-opening', 'defrost'] as const;
export type IncidentKind = (typeof incidentKinds)[number];

/** A short rise of the air that went back by itself. It stays in every figure; this only says what it looks like. */
export interface Incident {
	readonly kind: IncidentKind;
	readonly fromMs: number;
	readonly toMs: number;
	readonly minutes: number;
	readonly extremeCelsius: number;
	readonly extremeAtMs: number;
	/** What the trace rests at: its median over time. */
	readonly restingCelsius: number;
}

/*
 * Common practice, no source: an opened door or an electric defrost lifts the air by some degrees for well under an
 * hour and it falls back; defrosts are started by a clock, doors by people.
 */
const riseCelsius = 2;
const backWithinCelsius = 1;
const longestMinutes = 45;
const fewestPeriodic = 3;
const shortestPeriodHours = 2;
const longestPeriodHours = 24;
const periodTolerance = 0.15;

/**
 * Short rises above where the trace rests: more than 2 °C above it, for no more than 45 min, and back to within 1 °C.
 * Three or more that follow each other at one distance of 2 to 24 h, within 15 %, are defrosts; the others door
 * openings. A probe in the product does not show such things, so there none are named.
 */
export function findIncidents(course: Course, placement: Placement, levelMs: Float64Array): Incident[] {
	if (placement === 'in-product' || course.levels.length === 0) return [];
	const restingCelsius = medianOver(course.levels, levelMs);
	const stretches = stretchesBeyond(
		course,
		restingCelsius + riseCelsius,
		'above',
		restingCelsius + backWithinCelsius
	);
	const rises = risesOf(stretches).filter((rise) => rise.minutes <= longestMinutes);
	const periodic = periodicOf(rises.map(({ fromMs }) => fromMs));
	return rises.map((rise, i) => ({
		kind: periodic.has(i) ? 'defrost' : 'door-opening',
		...rise,
		restingCelsius
	}));
}

type Rise = Omit<Incident, 'kind' | 'restingCelsius'>;

/** Stretches between which the air did not come back are one rise; one that never did is none. */
function risesOf(stretches: readonly Beyond[]): Rise[] {
	const rises: Rise[] = [];
	let first: Beyond | null = null;
	let worst: Beyond | null = null;
	for (const stretch of stretches) {
		first ??= stretch;
		if (worst === null || stretch.extremeCelsius > worst.extremeCelsius) worst = stretch;
		if (!stretch.isSettled) continue;
		rises.push({
			fromMs: first.fromMs,
			toMs: stretch.toMs,
			minutes: (stretch.toMs - first.fromMs) / msPerMinute,
			extremeCelsius: worst.extremeCelsius,
			extremeAtMs: worst.extremeAtMs
		});
		first = null;
		worst = null;
	}
	return rises;
}

/** The level below which half the time was spent. */
function medianOver(levels: Float64Array, levelMs: Float64Array): number {
	const half = levelMs.reduce((sum, ms) => sum + ms, 0) / 2;
	let sum = 0;
	for (let level = 0; level < levels.length; level++) {
		sum += levelMs[level] as number;
		if (sum >= half) return levels[level] as number;
	}
	return levels[levels.length - 1] as number;
}

/** Which starts follow each other at one distance: the longest chains first, each start in one chain only. */
function periodicOf(starts: readonly number[]): Set<number> {
	const periodic = new Set<number>();
	for (const chain of chainsOf(starts).sort((a, b) => b.length - a.length)) {
		if (chain.some((at) => periodic.has(at))) continue;
		for (const at of chain) periodic.add(at);
	}
	return periodic;
}

function chainsOf(starts: readonly number[]): number[][] {
	const chains: number[][] = [];
	for (let i = 0; i < starts.length; i++) {
		for (let j = i + 1; j < starts.length; j++) {
			const periodMs = (starts[j] as number) - (starts[i] as number);
			if (periodMs > longestPeriodHours * msPerHour) break;
			// One that an earlier start leads to is part of that one's chain.
			if (periodMs < shortestPeriodHours * msPerHour || hasBefore(starts, i, periodMs)) continue;
			const chain = chainFrom(starts, i, j, periodMs);
			if (chain.length >= fewestPeriodic) chains.push(chain);
		}
	}
	return chains;
}

function hasBefore(starts: readonly number[], at: number, periodMs: number): boolean {
	for (let before = at - 1; before >= 0; before--) {
		const apartMs = (starts[at] as number) - (starts[before] as number);
		if (apartMs > periodMs * (1 + periodTolerance)) return false;
		if (apartMs >= periodMs * (1 - periodTolerance)) return true;
	}
	return false;
}

function chainFrom(starts: readonly number[], first: number, second: number, periodMs: number): number[] {
	const chain = [first, second];
	let last = second;
	for (let at = second + 1; at < starts.length; at++) {
		const apartMs = (starts[at] as number) - (starts[last] as number);
		if (apartMs > periodMs * (1 + periodTolerance)) break;
		if (apartMs < periodMs * (1 - periodTolerance)) continue;
		chain.push(at);
		last = at;
	}
	return chain;
}
