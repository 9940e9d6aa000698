import { chanceOf } from '../chance';
import type { LaneName } from './lanes';
import type { LoadPlan } from './load';

/** Ordinary days: which lane came so many days ago, at what time. */
const days: readonly (readonly [number, LaneName, string])[] = [
	[-1, 'cod', '05:10'],
	[-1, 'tulips', '06:05'],
	[-1, 'milk', '07:20'],
	[-1, 'jb-broccoli', '09:40'],
	[-2, 'tessil', '07:50'],
	[-2, 'cv-berries', '08:20'],
	[-4, 'smoked', '08:05'],
	[-5, 'tomatoes', '05:45'],
	[-7, 'olmarisa', '06:30'],
	[-10, 'salmon', '04:50'],
	[-11, 'jb-tomatoes', '08:30'],
	[-13, 'peas', '12:20'],
	[-16, 'lettuce', '06:40'],
	[-17, 'cv-strawberries', '06:50'],
	[-22, 'vaccine', '10:50'],
	[-26, 'ice-cream', '11:20'],
	[-29, 'cod', '05:25'],
	[-35, 'cv-berries', '07:40'],
	[-39, 'broccoli', '06:00'],
	[-47, 'tessil', '07:15'],
	[-52, 'jb-lettuce', '10:05'],
	[-58, 'olmarisa', '06:55']
];

/** Loads on which nothing happened but a little waiting. */
export const pastOrdinary: readonly LoadPlan[] = days.map(([day, lane, clock]) => {
	const key = `ordinary ${lane} ${day}`;
	const chance = chanceOf(key);
	return {
		...{ key, lane, due: { day, clock } },
		lateHours: [0, (chance.whole(0, 10) - 3) / 10],
		decided: { afterMinutes: chance.whole(28, 75) }
	};
});
