/** A storage life read at one temperature. */
export interface LifePoint {
	readonly celsius: number;
	readonly lifeHours: number;
}

/** How fast life runs, relative to 1 at the spec's reference temperature. See design of each in rate-*.ts. */
export type RateModel =
	| { readonly kind: 'constant-q10'; readonly q10: number }
	| { readonly kind: 'two-lives'; readonly lower: LifePoint; readonly upper: LifePoint }
	| { readonly kind: 'banded-q10'; readonly bands: readonly Q10Band[] }
	| { readonly kind: 'arrhenius'; readonly activationEnergyKilojoulesPerMole: number }
	| { readonly kind: 'life-table'; readonly points: readonly LifePoint[] }
	| { readonly kind: 'square-root'; readonly minCelsius: number };

export type RateModelKind = RateModel['kind'];

export interface Q10Band {
	readonly fromCelsius: number;
	readonly toCelsius: number;
	readonly q10: number;
}

/** A limit on one side. Minutes count time beyond the limit; an event ends when back by the hysteresis. */
export interface Limit {
	readonly celsius: number;
	readonly graceMinutes: number;
	readonly graceMinutesInAll: number;
	readonly hysteresisCelsius: number;
	/** An event this long is major, or critical; shorter is minor. */
	readonly majorMinutes: number;
	readonly criticalMinutes: number;
	/** Grace of traces that rode in the air; left out, the same as for the others. */
	readonly airGraceMinutes?: number;
	readonly airGraceMinutesInAll?: number;
}

export interface MktRule {
	/** null: the customary 83.144 kJ/mol. */
	readonly activationEnergyKilojoulesPerMole: number | null;
	/** Also the worst over a rolling window of this many hours; null: whole journey only. */
	readonly windowHours: number | null;
	readonly limitCelsius: number | null;
}

/** The published figure a spec rests on. */
export interface SpecSource {
	readonly text: string;
	readonly point: LifePoint | null;
	/** Highest figure where the source prints a range (21–28 d). */
	readonly lifeHoursHigh: number | null;
}

/** Life that must be left, as whoever needs it says it: so long at that temperature. */
export interface LifeNeed {
	readonly hours: number;
	readonly celsius: number;
}

/** A signed version's figures: everything the assessment needs to know about the product. */
export interface Spec {
	readonly referenceCelsius: number;
	/** Full shelf life at the reference temperature, and how far it may be off either way. */
	readonly fullLifeHours: number;
	readonly fullLifeUncertaintyHours: number;
	readonly model: RateModel;
	/** Outside this range the rate is held at its end and the time is reported. */
	readonly validFromCelsius: number;
	readonly validToCelsius: number;
	/** Colder earns no credit. */
	readonly chillingCelsius: number | null;
	/** Absolute stop: highest freezing point. */
	readonly freezingCelsius: number | null;
	/** Absolute stop: food-safety ceiling. */
	readonly ceilingCelsius: number | null;
	readonly upper: Limit | null;
	readonly lower: Limit | null;
	/** Life needed at the dock, in hours at the reference temperature. */
	readonly neededHours: number;
	/** Opening balance when nobody declared one: what the pessimist assumes was used before the first reading. */
	readonly openingDefaultHours: number;
	readonly mkt: MktRule;
	readonly sources: readonly SpecSource[];
	readonly caution: string | null;
	/** ± of the model's own figure: Q10, kJ/mol, or °C of a square root's Tmin. Left out where none is known. */
	readonly sensitivityPlusMinus?: number | undefined;
	/** Life needed at the dock as it was stated; `neededHours` is its worth at the reference temperature. */
	readonly neededAtDock?: LifeNeed | undefined;
	/** Life that must be left when the customer has it, onward trip over. */
	readonly neededAtCustomer?: LifeNeed | undefined;
}
