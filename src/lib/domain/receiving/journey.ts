import type { Course } from '../shelf-life/course';
import { meanKineticCelsius } from '../shelf-life/mean-kinetic';
import type { Passages } from '../shelf-life/passages';
import type { MktRule } from '../shelf-life/spec';
import { msPerHour } from '../units';
import type { Gap } from './assessment';
import { meanOverTime, type LevelTimes } from './level-times';
import type { LifeSides } from './life-sides';
import { worstWindowOf } from './rolling-kinetic';

/** Mean, extremes and mean kinetic temperature of a course with readings. */
export function journeyFigures(course: Course, rule: MktRule, times: LevelTimes) {
	const { levels } = course;
	const energy = rule.activationEnergyKilojoulesPerMole;
	const coldest = levels[0] as number;
	return {
		meanCelsius: meanOverTime(levels, times),
		minCelsius: coldest,
		maxCelsius: levels[levels.length - 1] as number,
		mktCelsius: meanKineticCelsius(levels, times.standsForMs, energy) ?? coldest,
		worstWindowMktCelsius:
			rule.windowHours === null ? null : worstWindowOf(course, rule.windowHours * msPerHour, energy)
	};
}

/** Every gap with what it used: bridged linearly, and bracketed by its neighbours. */
export function gapsOf({ times }: Course, { silent }: Passages, sides: LifeSides): Gap[] {
	return silent.map((at) => ({
		fromMs: times[at] as number,
		toMs: times[at + 1] as number,
		usedHours: sides.acrossGap(at)
	}));
}
