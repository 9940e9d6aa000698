import type { LaneName } from './lanes';
import type { LoadPlan } from './load';

const plan = (lane: LaneName, day: number, clock: string): LoadPlan => ({
	key: `ahead ${lane} ${day} ${clock}`,
	lane,
	due: { day, clock },
	isExpected: true
});

/** What is advised for the next days, and one that was cancelled. */
export const ahead: readonly LoadPlan[] = [
	plan('cod', 1, '05:20'),
	plan('lettuce', 1, '06:10'),
	plan('milk', 1, '07:00'),
	plan('olmarisa', 1, '08:45'),
	plan('vaccine', 1, '11:30'),
	plan('tulips', 2, '06:00'),
	plan('peas', 2, '12:15'),
	plan('smoked', 3, '07:40'),
	plan('cv-berries', 1, '07:15'),
	plan('jb-lettuce', 1, '10:30'),
	plan('jb-tomatoes', 2, '09:00'),
	{ ...plan('grapes', 1, '13:00'), cancelled: 'Supplier shipped to another buyer' }
];
