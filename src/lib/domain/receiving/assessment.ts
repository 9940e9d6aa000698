import type { Incident } from '../excursions/find-incidents';
import type { LimitTime } from '../excursions/limit-times';
import type { Placement, Trace } from '../trace/trace';
import type { Spec } from '../shelf-life/spec';
import type { RangePart } from './range-parts';

/** A figure with its bounds. The low decides. */
export interface Range {
	readonly value: number;
	readonly low: number;
	readonly high: number;
}

/** Life used before the first reading, hours at the reference temperature. */
export type OpeningBalance =
	| {
			readonly kind: 'declared';
			readonly hours: number;
			readonly plusMinusHours: number;
			readonly basis: string;
	  }
	| {
			readonly kind: 'computed';
			readonly sinceMs: number;
			readonly celsius: number;
			readonly plusMinusCelsius: number;
			readonly basis: string;
	  }
	| { readonly kind: 'undeclared' };

/** A stretch that was not the journey; its readings do not count but stay visible. */
export interface Trim {
	readonly fromMs: number;
	readonly toMs: number;
}

/** Custody changes hands. A leg lies between two neighbours and belongs to the earlier one's holder. */
export interface Handover {
	readonly id: string;
	readonly holder: string;
	readonly place: string;
	readonly plannedMs: number | null;
	readonly actualMs: number | null;
	readonly plusMinusMinutes: number;
	/** Set-point agreed for the leg that begins here; null: the spec's reference temperature. */
	readonly setPointCelsius: number | null;
	/** Allowance of that leg; null: the planned time at the set-point. */
	readonly allowedHours: number | null;
}

export interface AssessInput {
	readonly spec: Spec;
	readonly trace: Trace;
	readonly accuracyCelsius: number;
	readonly placement: Placement;
	readonly opening: OpeningBalance;
	readonly handovers: readonly Handover[];
	readonly trims: readonly Trim[];
	/** Life needed for this line; null: the spec's. */
	readonly neededHours: number | null;
}

/** Every reading that counts, with what had been used by then. All arrays have one length. */
export interface LifeSeries {
	readonly times: Float64Array;
	readonly celsius: Float64Array;
	/** Life used since the first of these readings, hours at the reference temperature; the opening balance comes on top. */
	readonly usedHours: Float64Array;
	readonly usedLowHours: Float64Array;
	readonly usedHighHours: Float64Array;
}

export interface Gap {
	readonly fromMs: number;
	readonly toMs: number;
	/** Bridged linearly; low and high hold the colder or warmer neighbour all through. */
	readonly usedHours: Range;
}

export const severities = ['minor', 'major', 'critical'] as const;
export type Severity = (typeof severities)[number];
export type ExcursionKind = 'too-warm' | 'too-cold';

export interface Excursion {
	readonly kind: ExcursionKind;
	readonly severity: Severity;
	readonly limitCelsius: number;
	readonly fromMs: number;
	readonly toMs: number;
	readonly minutes: number;
	readonly extremeCelsius: number;
	readonly extremeAtMs: number;
	readonly meanCelsius: number;
	readonly degreeMinutes: number;
	/** Life used while it lasted beyond what the limit temperature would have used; never negative. */
	readonly costHours: number;
	/** Ordinals of the legs it touched; empty before the first handover is known. */
	readonly legs: readonly number[];
	/** Its cost apportioned to those legs by time, in the same order. */
	readonly legCostHours?: readonly number[];
	/** It begins within the ± of this handover: until a person decides, neither neighbouring leg is named. */
	readonly unsettledHandoverId?: string;
	/** The instrument's accuracy straddles the limit throughout. */
	readonly isInDoubt: boolean;
	/** Still running when the readings end. */
	readonly isOpen: boolean;
}

export type StopKind = 'freezing' | 'ceiling';

/** An absolute stop was reached, or may have been within the instrument's accuracy. */
export interface StopHit {
	readonly kind: StopKind;
	readonly stopCelsius: number;
	readonly extremeCelsius: number;
	readonly firstAtMs: number;
	readonly minutes: number;
	readonly isInDoubt: boolean;
}

export interface LegUse {
	readonly ordinal: number;
	readonly handoverId: string;
	readonly holder: string;
	readonly place: string;
	readonly fromMs: number;
	readonly toMs: number;
	readonly plannedMinutes: number | null;
	readonly tookMinutes: number;
	readonly setPointCelsius: number;
	readonly allowedHours: number | null;
	readonly usedHours: number;
	/** used − allowed = tooWarm + tooLate, exactly; null without an allowance. */
	readonly overHours: number | null;
	readonly tooWarmHours: number | null;
	readonly tooLateHours: number | null;
	/** Part of all life used in the window, 0–1. */
	readonly shareOfUsed: number;
	/** Life that would be left had this leg used just its allowance; null without one. */
	readonly butForRemainingHours: number | null;
	/** Readings cover this much of the leg, 0–1. */
	readonly coveredFraction: number;
}

/** What one trace says about one line. All life in hours at the spec's reference temperature. */
export interface Assessment {
	readonly engineVersion: string;
	readonly windowFromMs: number;
	readonly windowToMs: number;
	readonly readings: number;
	readonly usualIntervalMs: number;
	readonly fullLifeHours: number;
	readonly neededHours: number;
	readonly openingHours: Range;
	readonly usedHours: Range;
	/** Full − opening − used; negative when over-consumed, never clipped. */
	readonly remainingHours: Range;
	/** What lies between that figure and its low and high. */
	readonly rangeParts: readonly RangePart[];
	readonly meanCelsius: number;
	readonly minCelsius: number;
	readonly maxCelsius: number;
	readonly mktCelsius: number;
	readonly worstWindowMktCelsius: number | null;
	readonly gaps: readonly Gap[];
	readonly unobservedHours: number;
	readonly unobservedUsedHours: Range;
	readonly belowModelHours: number;
	readonly aboveModelHours: number;
	/** Hours below the chilling threshold, which earned no credit. */
	readonly chilledHours: number;
	readonly limitTimes: readonly LimitTime[];
	/** Door openings and defrosts, kept as what they are; excursions count them all the same. */
	readonly incidents: readonly Incident[];
	readonly excursions: readonly Excursion[];
	readonly stops: readonly StopHit[];
	readonly legs: readonly LegUse[];
	readonly series: LifeSeries;
}
