import type { Leg, LayoutName } from '../journeys/journey';
import type { SiteKey } from '../cast/sites';

/** What a supplier usually sends, by which way. */
export interface Lane {
	site: SiteKey;
	supplier: string;
	/** Who stands at the door: the last carrier. */
	carrier: string;
	mode: 'road' | 'sea' | 'air';
	legs: readonly Leg[];
	goods: readonly Goods[];
	rejectWithinHours: number;
	placement: 'air' | 'between-cases' | 'in-product';
	layout: LayoutName;
	dock: number;
}

export interface Goods {
	/** Name of a product of the catalogue. */
	product: string;
	/** As on the papers. */
	description: string;
	cases: number;
	casesPerPallet: number;
	/** Value of one, in the currency of the site. */
	each: number;
	/** Life used before the first reading, declared; null: not declared. */
	openingHours: number | null;
	neededDays?: number;
}

export const leg = (
	by: string,
	place: string,
	hours: number,
	setPointCelsius: number,
	holder?: string
): Leg => ({
	...{ by, place, hours, setPointCelsius },
	...(holder ? { holder } : {})
});

export const goods = (
	[product, description]: readonly [string, string],
	[cases, casesPerPallet]: readonly [number, number],
	each: number,
	openingHours: number | null,
	neededDays?: number
): Goods => ({
	...{ product, description, cases, casesPerPallet, each, openingHours },
	...(neededDays === undefined ? {} : { neededDays })
});
