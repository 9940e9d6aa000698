import type { Course } from '../shelf-life/course';
import { trimmed } from '../shelf-life/course';

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
	const walk = new BeyondWalk(limitCelsius, side, settledAtCelsius, includesLimit);
	const { times, celsius, steps } = course;
	for (let i = 0; i < times.length; i++) {
		walk.reading(times[i] as number, celsius[i] as number);
		if (i < steps.length && steps[i] === trimmed) walk.interrupt();
	}
	return walk.finish();
}

/** Goes along the readings once; holds the stretch that is open and those that are closed. */
class BeyondWalk {
	readonly #found: Beyond[] = [];
	#open: { fromMs: number; degreeMs: number; extreme: number; extremeAtMs: number } | null = null;
	#lastMs: number | null = null;
	#lastExcess = 0;
	readonly #sign: 1 | -1;
	readonly #settledExcess: number;

	constructor(
		readonly limitCelsius: number,
		side: Side,
		settledAtCelsius: number,
		readonly includesLimit: boolean
	) {
		this.#sign = side === 'above' ? 1 : -1;
		this.#settledExcess = this.#sign * (settledAtCelsius - limitCelsius);
	}

	reading(ms: number, celsius: number): void {
		const excess = this.#sign * (celsius - this.limitCelsius);
		if (this.#lastMs !== null) this.#line(this.#lastMs, this.#lastExcess, ms, excess);
		else if (this.#isBeyond(excess)) this.#begin(ms);
		this.#take(ms, celsius, excess);
		this.#lastMs = ms;
		this.#lastExcess = excess;
	}

	/** The line from the last reading to this one, of which only what is beyond matters. */
	#line(fromMs: number, from: number, toMs: number, to: number): void {
		const isBeyond = this.#isBeyond(to);
		if (this.#open === null && !isBeyond) return;
		const crossingMs = from === to ? fromMs : fromMs + ((toMs - fromMs) * from) / (from - to);
		if (this.#open === null) this.#begin(from >= 0 ? fromMs : crossingMs);
		if (this.#open === null) return;
		const startMs = Math.max(this.#open.fromMs, fromMs);
		const endMs = isBeyond ? toMs : crossingMs;
		this.#open.degreeMs += ((Math.max(0, from) + Math.max(0, to)) / 2) * (endMs - startMs);
		if (!isBeyond) this.#close(endMs, false);
	}

	#take(ms: number, celsius: number, excess: number): void {
		if (this.#open !== null && excess > this.#sign * (this.#open.extreme - this.limitCelsius)) {
			this.#open.extreme = celsius;
			this.#open.extremeAtMs = ms;
		}
		if (excess > this.#settledExcess || this.#open !== null) return;
		this.#settle();
	}

	#settle(): void {
		const last = this.#found[this.#found.length - 1];
		// Asked at every reading within the limit: almost always there is nothing to do.
		if (last === undefined || last.isSettled) return;
		this.#found[this.#found.length - 1] = { ...last, isSettled: true };
	}

	#isBeyond(excess: number): boolean {
		return excess > 0 || (this.includesLimit && excess === 0);
	}

	#begin(fromMs: number): void {
		const extreme = this.#sign * -Infinity;
		this.#open = { fromMs, degreeMs: 0, extreme, extremeAtMs: fromMs };
	}

	#close(toMs: number, isOpen: boolean): void {
		if (this.#open === null) return;
		const { fromMs, degreeMs, extreme, extremeAtMs } = this.#open;
		this.#found.push({
			fromMs,
			toMs,
			degreeMs,
			extremeCelsius: extreme,
			extremeAtMs,
			isSettled: false,
			isOpen
		});
		this.#open = null;
	}

	/** A trim: what is beyond it is another story. */
	interrupt(): void {
		if (this.#open !== null && this.#lastMs !== null) this.#close(this.#lastMs, false);
		this.#settle();
		this.#lastMs = null;
	}

	finish(): Beyond[] {
		if (this.#open !== null && this.#lastMs !== null) this.#close(this.#lastMs, true);
		return this.#found;
	}
}
