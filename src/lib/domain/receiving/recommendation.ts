import type { StopKind } from './assessment';

export const outcomes = ['accept', 'conditions', 'hold', 'reject'] as const;
/** What may be done with goods. The last three of these need a reason. */
export type Outcome = (typeof outcomes)[number];

/** The engine never recommends conditions: those are a person's. */
export type Recommended = 'accept' | 'hold' | 'reject';

export const grades = ['inform', 'note', 'hold', 'reject'] as const;
export type Grade = (typeof grades)[number];

/** A rule that fired, with its figures; the sentence comes from the message catalogue under the same code. */
export type Reason =
	| {
			readonly code: 'life-suffices';
			readonly grade: Grade;
			readonly lowHours: number;
			readonly valueHours: number;
			readonly neededHours: number;
	  }
	| {
			readonly code: 'life-low-short';
			readonly grade: Grade;
			readonly lowHours: number;
			readonly valueHours: number;
			readonly neededHours: number;
	  }
	| {
			readonly code: 'life-short';
			readonly grade: Grade;
			readonly lowHours: number;
			readonly highHours: number;
			readonly valueHours: number;
			readonly neededHours: number;
	  }
	| { readonly code: 'life-not-known'; readonly grade: Grade }
	| {
			readonly code: 'customer-life-short';
			readonly grade: Grade;
			readonly lowHours: number;
			/** What the customer's need is worth at the reference temperature. */
			readonly neededHours: number;
			readonly customerHours: number;
			readonly customerCelsius: number;
	  }
	| {
			readonly code: 'stop-reached';
			readonly grade: Grade;
			readonly stop: StopKind;
			readonly stopCelsius: number;
			readonly extremeCelsius: number;
			readonly atMs: number;
			readonly minutes: number;
	  }
	| {
			readonly code: 'stop-in-doubt';
			readonly grade: Grade;
			readonly stop: StopKind;
			readonly stopCelsius: number;
			readonly extremeCelsius: number;
			readonly accuracyCelsius: number;
	  }
	| {
			readonly code: 'excursion';
			readonly grade: Grade;
			readonly kind: 'too-warm' | 'too-cold';
			readonly severity: 'minor' | 'major' | 'critical';
			readonly ordinal: number;
			readonly extremeCelsius: number;
			readonly limitCelsius: number;
			readonly minutes: number;
			readonly costHours: number;
			readonly holders: readonly string[];
	  }
	| {
			readonly code: 'unobserved';
			readonly grade: Grade;
			readonly hours: number;
			readonly usedHours: number;
			readonly gaps: number;
	  }
	| { readonly code: 'logger-stopped-early'; readonly grade: Grade; readonly missingHours: number }
	| { readonly code: 'opening-undeclared'; readonly grade: Grade; readonly assumedHours: number }
	| {
			readonly code: 'loggers-disagree';
			readonly grade: Grade;
			readonly differenceCelsius: number;
			readonly allowedCelsius: number;
			readonly serials: readonly string[];
	  }
	| {
			readonly code: 'calibration-overdue';
			readonly grade: Grade;
			readonly serial: string;
			readonly dueOn: string;
	  }
	| { readonly code: 'seal-broken'; readonly grade: Grade; readonly seal: string }
	| {
			readonly code: 'pulp-above-limit';
			readonly grade: Grade;
			readonly pulpCelsius: number;
			readonly limitCelsius: number;
			readonly position: string;
	  }
	| {
			readonly code: 'pulp-against-air';
			readonly grade: Grade;
			readonly pulpCelsius: number;
			readonly traceCelsius: number;
	  }
	| {
			readonly code: 'cases-differ';
			readonly grade: Grade;
			readonly advised: number;
			readonly received: number;
	  }
	| {
			readonly code: 'mkt-over-limit';
			readonly grade: Grade;
			readonly mktCelsius: number;
			readonly limitCelsius: number;
			readonly windowHours: number | null;
	  }
	| {
			readonly code: 'outside-model';
			readonly grade: Grade;
			readonly hours: number;
			readonly fromCelsius: number;
			readonly toCelsius: number;
	  }
	| GateReason;

/** What is found without a trace, or beside it: the door, the unit, the clock, the calendar. */
type GateReason =
	| { readonly code: 'evidence-incomplete'; readonly grade: Grade }
	| { readonly code: 'logger-missing'; readonly grade: Grade }
	| {
			readonly code: 'logger-started-late';
			readonly grade: Grade;
			readonly missingHours: number;
			readonly startDelayMinutes: number;
	  }
	| {
			readonly code: 'transit-late';
			readonly grade: Grade;
			readonly tookHours: number;
			readonly plannedHours: number;
	  }
	| {
			readonly code: 'unit-set-point-differs';
			readonly grade: Grade;
			readonly setPointCelsius: number;
			readonly agreedCelsius: number;
	  }
	| {
			readonly code: 'unit-return-air-warm';
			readonly grade: Grade;
			readonly returnAirCelsius: number;
			readonly limitCelsius: number;
	  }
	| {
			readonly code: 'interval-too-long';
			readonly grade: Grade;
			readonly everyMinutes: number;
			readonly allowedMinutes: number;
			readonly journeyHours: number;
	  }
	| { readonly code: 'date-passed'; readonly grade: Grade; readonly bestBeforeOn: string }
	| {
			readonly code: 'date-short';
			readonly grade: Grade;
			readonly bestBeforeOn: string;
			readonly days: number;
			readonly neededDays: number;
	  }
	| { readonly code: 'date-missing'; readonly grade: Grade }
	| {
			readonly code: 'older-than-last';
			readonly grade: Grade;
			readonly bestBeforeOn: string;
			readonly lastBestBeforeOn: string;
	  };

export type ReasonCode = Reason['code'];

/** What a product or a lane may make of a finding. */
export const settableGrades = ['inform', 'note', 'hold'] as const;
export type SettableGrade = (typeof settableGrades)[number];
export type FindingGrades = Partial<Record<ReasonCode, SettableGrade>>;

/** The strictest firing rule decides: any reject-grade reason rejects, any hold-grade reason holds. */
export interface Recommendation {
	readonly recommended: Recommended;
	readonly reasons: readonly Reason[];
}
