import { ownRoom, type Room } from '../trace/room';
import { observed, unobserved, type Course } from './course';

/** How long the temperature took from each level to each: what depends on two readings alone is worked out once. */
export interface Passages {
	/** Neighbours this many levels apart at most stand in the table. */
	readonly reach: number;
	/** Whole ms from level a to level b over all watched steps, at a × (2 × reach + 1) + b − a + reach. */
	readonly ms: Float64Array;
	/** Readings after which a watched step leads further than the reach. */
	readonly far: readonly number[];
	/** Readings after which nobody watched. */
	readonly silent: readonly number[];
}

const leastReach = 8;
const mostReach = 64;
/** The table is cleared and gone through each time: it may have one place for so many readings, or these few. */
const readingsPerPlace = 4;
const fewPlaces = 4096;

/** Goes along the steps once. Trimmed ones pass nowhere. */
export function passagesOf(course: Course, room: Room = ownRoom): Passages {
	const reach = reachOf(course);
	const width = 2 * reach + 1;
	const ms = room.floats('passages', course.levels.length * width).fill(0);
	if (course.isEven) return { reach, ms, far: countEven(course, reach, ms, room), silent: [] };
	return { reach, ms, ...addUneven(course, reach, ms) };
}

/** Where the temperature passes from one level to another in the table of passages; −1 beyond its reach. */
export function passageAt({ reach }: Pick<Passages, 'reach'>, from: number, to: number): number {
	const apart = to - from + reach;
	return apart >= 0 && apart <= 2 * reach ? from * (2 * reach + 1) + apart : -1;
}

/** Calls with every passage of the table that took place: its place, from and to which level, and for how long. */
export function eachPassage(
	{ reach, ms }: Passages,
	call: (at: number, from: number, to: number, passingMs: number) => void
): void {
	const width = 2 * reach + 1;
	for (let at = 0; at < ms.length; at++) {
		const passingMs = ms[at] as number;
		if (passingMs === 0) continue;
		const from = Math.floor(at / width);
		call(at, from, from + (at % width) - reach, passingMs);
	}
}

function reachOf({ levels, levelOf }: Course): number {
	const places = Math.max(fewPlaces, levelOf.length / readingsPerPlace);
	const reach = Math.floor((places / Math.max(1, levels.length) - 1) / 2);
	return Math.min(mostReach, Math.max(leastReach, reach));
}

function countEven({ levelOf, usualIntervalMs }: Course, reach: number, ms: Float64Array, room: Room) {
	const width = 2 * reach + 1;
	const places = ms.length;
	const last = levelOf.length - 1;
	const far: number[] = [];
	// Two counters take turns: a logger repeats itself, and one would wait for its own last write.
	const counts = room.wholes('counts', 2 * places).fill(0);
	let from = levelOf[0] ?? 0;
	for (let i = 1; i <= last; i += 2) {
		const middle = levelOf[i] as number;
		const there = middle - from + reach;
		if (there >= 0 && there < width) {
			const at = from * width + there;
			counts[at] = ((counts[at] as number) + 1) | 0;
		} else far.push(i - 1);
		if (i === last) break;
		const to = levelOf[i + 1] as number;
		const on = to - middle + reach;
		if (on >= 0 && on < width) {
			const at = middle * width + on + places;
			counts[at] = ((counts[at] as number) + 1) | 0;
		} else far.push(i);
		from = to;
	}
	for (let at = 0; at < places; at++) {
		ms[at] = ((counts[at] as number) + (counts[places + at] as number)) * usualIntervalMs;
	}
	return far;
}

function addUneven({ times, steps, levelOf }: Course, reach: number, ms: Float64Array) {
	const far: number[] = [];
	const silent: number[] = [];
	for (let i = 0; i < steps.length; i++) {
		if (steps[i] === unobserved) silent.push(i);
		if (steps[i] !== observed) continue;
		const at = passageAt({ reach }, levelOf[i] as number, levelOf[i + 1] as number);
		if (at < 0) far.push(i);
		else ms[at] = (ms[at] as number) + ((times[i + 1] as number) - (times[i] as number));
	}
	return { far, silent };
}
