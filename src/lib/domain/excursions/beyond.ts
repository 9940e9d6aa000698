import type { Course } from '../shelf-life/course';
import { trimmed } from '../shelf-life/course';
import { blockReadings, blocksOf, type LevelBlocks } from '../trace/levels';

/** Which side of a limit is the wrong one. */
export type Side = 'above' | 'below';

/** One unbroken time beyond a limit, with its crossings found on the straight line between readings. */
export interface Beyond {
	readonly fromMs: number;
	readonly toMs: number;
	/** °C beyond the limit, integrated over ms. */
	readonly degreeMs: number;
	readonly extremeCelsius: number;
	readonly extremeAtMs: number;
	/** Back within the limit, then past this far inside it, before anything else happens: the event is over. */
	readonly isSettled: boolean;
	/** The readings end while it lasts. */
	readonly isOpen: boolean;
}

/** A level within the limit by the hysteresis at least, within it by less, or beyond it. */
const settled = 0;
const within = 1;
const beyond = 2;

/**
 * Every time the course is strictly beyond the limit (or at it, with `includesLimit`), in order.
 * `settledAtCelsius` is where an event counts as over: the limit less the hysteresis.
 */
export function stretchesBeyond(
	course: Course,
	limitCelsius: number,
	side: Side,
	settledAtCelsius: number,
	includesLimit = false
): Beyond[] {
	const sign = side === 'above' ? 1 : -1;
	const excess = new Float64Array(course.levels.length);
	const settledExcess = sign * (settledAtCelsius - limitCelsius);
	const states = new Uint8Array(excess.length);
	for (let level = 0; level < excess.length; level++) {
		const by = sign * ((course.levels[level] as number) - limitCelsius);
		excess[level] = by;
		states[level] = by > 0 || (includesLimit && by === 0) ? beyond : by <= settledExcess ? settled : within;
	}
	if (!states.includes(beyond)) return [];
	return new BeyondWalk(course, excess, states).all();
}

/** Goes along the readings once; holds the stretch that is open and those that are closed. */
class BeyondWalk {
	readonly #course: Course;
	readonly #excess: Float64Array;
	readonly #states: Uint8Array;
	readonly #blocks: LevelBlocks;
	readonly #found: Beyond[] = [];
	/** Closed, but the temperature has not come back by the hysteresis since. */
	#unsettled: Beyond | null = null;

	constructor(course: Course, excess: Float64Array, states: Uint8Array) {
		this.#course = course;
		this.#excess = excess;
		this.#states = states;
		this.#blocks = course.blocks ?? blocksOf(course.levelOf);
	}

	/** From one reading beyond to the next: between them nothing need be added up. */
	all(): Beyond[] {
		const { levelOf } = this.#course;
		const states = this.#states;
		let at = 0;
		while (at < levelOf.length) {
			if (states[levelOf[at] as number] === beyond) at = this.#run(at);
			else if (this.#unsettled === null) at = this.#nextBeyond(at);
			else at = this.#lookForRest(at);
		}
		if (this.#unsettled !== null) this.#found.push(this.#unsettled);
		return this.#found;
	}

	/** Quiet blocks are passed over whole. */
	#nextBeyond(from: number): number {
		const { levelOf } = this.#course;
		const states = this.#states;
		let at = from;
		while (at < levelOf.length && states[levelOf[at] as number] !== beyond) {
			at = at % blockReadings === 0 ? this.#blockBeyond(at) : at + 1;
		}
		return Math.min(at, levelOf.length);
	}

	/** The reading after this one, or the first of the next block that goes beyond. */
	#blockBeyond(at: number): number {
		const { coldest, warmest } = this.#blocks;
		let block = at / blockReadings;
		if (this.#goesBeyond(block)) return at + 1;
		while (block < coldest.length && !this.#goesBeyond(block)) block++;
		return block < warmest.length ? block * blockReadings : Infinity;
	}

	/** States worsen towards one end of the levels, so a block's own ends tell. */
	#goesBeyond(block: number): boolean {
		const { coldest, warmest } = this.#blocks;
		return (
			this.#states[coldest[block] as number] === beyond || this.#states[warmest[block] as number] === beyond
		);
	}

	/** One reading within the limit after a stretch: has it settled, by the temperature or by a trim? */
	#lookForRest(at: number): number {
		const { levelOf, steps } = this.#course;
		if (this.#states[levelOf[at] as number] === settled || (at > 0 && steps[at - 1] === trimmed))
			this.#settle();
		return at + 1;
	}

	#settle(): void {
		if (this.#unsettled === null) return;
		this.#found.push({ ...this.#unsettled, isSettled: true });
		this.#unsettled = null;
	}

	/** Takes a run of readings beyond the limit and closes its stretch; the index of the first reading after it. */
	#run(first: number): number {
		const { times, levels, steps, levelOf } = this.#course;
		const isCut = first > 0 && steps[first - 1] === trimmed;
		if (isCut) this.#settle();
		if (this.#unsettled !== null) this.#found.push(this.#unsettled);
		this.#unsettled = null;
		const states = this.#states;
		const excess = this.#excess;
		let extremeAt = first;
		let degreeMs = this.#entering(first, isCut);
		let at = first;
		while (at + 1 < levelOf.length && steps[at] !== trimmed && states[levelOf[at + 1] as number] === beyond) {
			const from = excess[levelOf[at] as number] as number;
			const to = excess[levelOf[at + 1] as number] as number;
			degreeMs += ((from + to) / 2) * ((times[at + 1] as number) - (times[at] as number));
			at++;
			if (to > (excess[levelOf[extremeAt] as number] as number)) extremeAt = at;
		}
		const leaving = this.#leaving(at);
		this.#unsettled = {
			fromMs: this.#crossingBefore(first, isCut),
			toMs: leaving.toMs,
			degreeMs: degreeMs + leaving.degreeMs,
			extremeCelsius: levels[levelOf[extremeAt] as number] as number,
			extremeAtMs: times[extremeAt] as number,
			isSettled: false,
			isOpen: at + 1 >= levelOf.length
		};
		if (at + 1 < levelOf.length && steps[at] === trimmed) this.#settle();
		return at + 1;
	}

	#excessAt(at: number): number {
		return this.#excess[this.#course.levelOf[at] as number] as number;
	}

	#crossingBefore(first: number, isCut: boolean): number {
		const { times } = this.#course;
		if (first === 0 || isCut) return times[first] as number;
		return crossing(
			times[first - 1] as number,
			this.#excessAt(first - 1),
			times[first] as number,
			this.#excessAt(first)
		);
	}

	#entering(first: number, isCut: boolean): number {
		const fromMs = this.#crossingBefore(first, isCut);
		return (this.#excessAt(first) / 2) * ((this.#course.times[first] as number) - fromMs);
	}

	#leaving(last: number): { toMs: number; degreeMs: number } {
		const { times, steps } = this.#course;
		const lastMs = times[last] as number;
		if (last + 1 >= times.length || steps[last] === trimmed) return { toMs: lastMs, degreeMs: 0 };
		const toMs = crossing(lastMs, this.#excessAt(last), times[last + 1] as number, this.#excessAt(last + 1));
		return { toMs, degreeMs: (this.#excessAt(last) / 2) * (toMs - lastMs) };
	}
}

/** Where the line between two readings meets the limit. */
function crossing(fromMs: number, from: number, toMs: number, to: number): number {
	return from === to ? fromMs : fromMs + ((toMs - fromMs) * from) / (from - to);
}
