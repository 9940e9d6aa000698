import { trimmed, type Course } from '../shelf-life/course';
import { boltzmannShares, meanKineticCelsius, worstWindowMeanKinetic } from '../shelf-life/mean-kinetic';

/** Shares are rounded to whole parts, few enough that a sliding sum of them is exact and never drifts. */
const wholeBits = 52;

/**
 * The worst mean kinetic temperature over any window of a course; over all of it where it is shorter.
 * On an even log whose steps divide the window, windows hold whole readings and one sum slides along them; else each
 * reading is weighed with the time it stands for.
 */
export function worstWindowOf(course: Course, windowMs: number, energy: number | null): number | null {
	const { levels, levelOf, usualIntervalMs } = course;
	const readings = windowMs / usualIntervalMs;
	if (!Number.isInteger(readings) || !course.isEven) {
		return worstWindowMeanKinetic(course.celsius, standsForMs(course), windowMs, energy);
	}
	const to = levelOf.length <= readings ? levelOf.length : worstEnd(course, readings, energy);
	const worst = Float64Array.from(
		levelOf.subarray(Math.max(0, to - readings), to),
		(level) => levels[level] as number
	);
	return meanKineticCelsius(worst, new Float64Array(worst.length).fill(1), energy);
}

/** Where the window of so many readings with the largest sum of shares ends, its last reading excluded. */
function worstEnd({ levels, levelOf }: Course, windowReadings: number, energy: number | null): number {
	// A quotient of doubles: as a whole number it makes the loop three times as fast.
	const readings = windowReadings | 0;
	const shares = boltzmannShares(levels, energy);
	const parts = 2 ** wholeBits / (readings + 1);
	const wholes = Float64Array.from(levels, (_, level) => Math.round(shares.at(level) * parts));
	let sum = 0;
	for (let i = 0; i < readings; i++) sum += wholes[levelOf[i] as number] as number;
	let worst = sum;
	let end = readings;
	for (let i = readings; i < levelOf.length; i++) {
		sum += (wholes[levelOf[i] as number] as number) - (wholes[levelOf[i - readings] as number] as number);
		if (sum > worst) {
			worst = sum;
			end = i + 1;
		}
	}
	return end;
}

/** Reading by reading what `levelTimes` adds up by level. */
function standsForMs({ times, steps, usualIntervalMs }: Course): Float64Array {
	const weights = new Float64Array(times.length).fill(usualIntervalMs);
	for (let i = 0; i < steps.length; i++) {
		const stepMs = (times[i + 1] as number) - (times[i] as number);
		weights[i] = steps[i] === trimmed ? Math.min(stepMs, usualIntervalMs) : stepMs;
	}
	return weights;
}
