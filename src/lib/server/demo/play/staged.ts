import { msPerHour, msPerMinute } from '../../../domain/units';
import { suppliers } from '../cast/partners';
import { sites } from '../cast/sites';
import { chanceOf, type Chance } from '../chance';
import type { PlacedLeg, Ride } from '../journeys/journey';
import { placeLegs } from '../journeys/place-legs';
import type { Goods, Lane } from '../loads/lane';
import { lanes } from '../loads/lanes';
import type { LoadPlan } from '../loads/load';
import { drawnTogether, instantOf } from '../loads/when';

/** A load with its times worked out. */
export interface Staged {
	plan: LoadPlan;
	lane: Lane;
	zone: string;
	goods: readonly Goods[];
	rides: readonly Ride[];
	legs: readonly PlacedLeg[];
	dueMs: number;
	arrivedMs: number;
	/** When its docket was opened. */
	advisedMs: number;
	/** By how much the minutes after the arrival are drawn together. */
	pace: number;
	/** Lots of the same day that went on other loads. */
	lotFrom: number;
}

const positions = ['Pallet 2, nose', 'Pallet 6, middle', 'Pallet 9, door end'] as const;
/** Nobody opens a docket later than this before the load is due. */
const latestAdviceHours = 1.5;

/** Ordinary loads vary by a few pallets. */
function usualGoods(lane: Lane, chance: Chance): Goods[] {
	return lane.goods.map((row) => ({
		...row,
		cases: row.cases + chance.whole(-1, 1) * row.casesPerPallet,
		openingHours: row.openingHours === null ? null : row.openingHours + chance.whole(-1, 2)
	}));
}

function ridesOf(plan: LoadPlan, lane: Lane, lines: number): Ride[] {
	const usual = Array.from({ length: lines }, (_, at) => ({ line: at + 1 }));
	return (plan.rides ?? usual).map((ride, at) => ({
		line: 1,
		position: positions[at % positions.length] ?? positions[0],
		placement: lane.placement,
		exposure: 1,
		offsetCelsius: 0,
		layout: lane.layout,
		...ride
	}));
}

/** Works a plan's times out against the anchor. */
export function stage(plan: LoadPlan, anchor: Date): Staged {
	const lane = lanes[plan.lane];
	const { zone, opening } = sites[lane.site];
	const chance = chanceOf(plan.key);
	const isDoneToday = plan.decided && 'minutes' in plan.due;
	const pace = isDoneToday ? drawnTogether(anchor, zone, opening.mon?.[0] ?? '00:00') : 1;
	const due = 'minutes' in plan.due ? { minutes: plan.due.minutes * pace } : plan.due;
	const dueMs = Math.round(instantOf(due, anchor, zone) / msPerMinute) * msPerMinute;
	const late = plan.lateHours ?? [];
	const lateHours = late.reduce((sum, hours) => sum + hours, 0) * pace;
	const legs = placeLegs(lane.legs, dueMs, late);
	const lastStartMs = legs.at(-1)?.actualMs ?? dueMs;
	const goods = plan.goods ?? usualGoods(lane, chance);
	return {
		...{ plan, lane, zone, goods, legs, dueMs, pace, lotFrom: 0 },
		rides: ridesOf(plan, lane, goods.length),
		arrivedMs: dueMs + Math.round(lateHours * 60) * msPerMinute,
		advisedMs: Math.min(
			Math.max(lastStartMs + 20 * msPerMinute, dueMs - 40 * msPerHour),
			dueMs - latestAdviceHours * msPerHour,
			anchor.getTime() - chance.whole(95, 180) * msPerMinute
		)
	};
}

/** Day of packing as it stands on cases: year and day of the year. */
function packedOn({ legs }: Staged): string {
	const packed = new Date(legs[0]?.actualMs ?? 0);
	const day = 1 + Math.floor((packed.getTime() - Date.UTC(packed.getUTCFullYear(), 0, 1)) / (24 * msPerHour));
	return `${packed.getUTCFullYear() % 100}${String(day).padStart(3, '0')}`;
}

/** The lots of a load: the supplier's letters, the day of packing, a number. */
export function lotOf(staged: Staged, line: number): string {
	const prefix = suppliers.find(({ key }) => key === staged.lane.supplier)?.prefix ?? 'LT';
	return `${prefix}-${packedOn(staged)}-${staged.lotFrom + line}`;
}

/** Numbers the lots that a supplier packs on one day over all its loads. */
export function withLots(loads: readonly Staged[]): Staged[] {
	const packed = new Map<string, number>();
	return loads.map((load) => {
		const key = `${load.lane.supplier} ${packedOn(load)}`;
		const lotFrom = packed.get(key) ?? 0;
		packed.set(key, lotFrom + load.goods.length);
		return { ...load, lotFrom };
	});
}
