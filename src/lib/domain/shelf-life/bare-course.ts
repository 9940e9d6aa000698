import { usualIntervalMs } from '../trace/interval';
import { observed, type Course } from './course';

/** A course of bare readings in order of time, every one of which counts; nothing in it is a gap or a trim. */
export function bareCourse(timesMs: Float64Array, celsius: Float64Array): Course {
	const levels = Float64Array.from(new Set(celsius)).sort();
	const places = new Map(Array.from(levels, (level, at) => [level, at]));
	return {
		times: timesMs,
		celsius,
		steps: new Uint8Array(Math.max(0, timesMs.length - 1)).fill(observed),
		levels,
		levelOf: Int32Array.from(celsius, (reading) => places.get(reading) as number),
		usualIntervalMs: usualIntervalMs(timesMs)
	};
}
