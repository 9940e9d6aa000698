import type { Spec } from '../shelf-life/spec';
import type { Assessment, OpeningBalance } from './assessment';
import type { FindingGrades } from './recommendation';

/** A pulp temperature taken at the door. */
export interface PulpReading {
	readonly celsius: number;
	/** Where in the load, as the dock wrote it. */
	readonly position: string;
}

/** How far two loggers of one load are apart, and how far their accuracies allow. */
export interface Disagreement {
	readonly differenceCelsius: number;
	readonly allowedCelsius: number;
	readonly serials: readonly string[];
}

/** Everything the recommendation for one line rests on. What nobody looked at is null or empty, never a hold. */
export interface Evidence {
	readonly spec: Spec;
	/** Null: no trace for this line. */
	readonly assessment: Assessment | null;
	readonly accuracyCelsius: number;
	readonly openingKind: OpeningBalance['kind'];
	/** The line's lowest accepted life, hours; the assessment's own need is the same figure where there is one. */
	readonly neededHours: number;
	readonly seal: { readonly text: string; readonly isIntact: boolean } | null;
	readonly pulp: readonly PulpReading[];
	readonly cases: { readonly advised: number; readonly received: number } | null;
	/** Loggers of the line with their due days, YYYY-MM-DD; null where the register has none. */
	readonly calibrations: readonly { readonly serial: string; readonly dueOn: string | null }[];
	/** Day of arrival at the site, YYYY-MM-DD: what a due day is held against. */
	readonly arrivedOn: string;
	readonly disagreement: Disagreement | null;
	/** When custody ended, for a logger that stopped before; null where the arrival is not logged. */
	readonly journeyEndMs: number | null;
	/** When custody began; null or left out where no handover says so. */
	readonly journeyStartMs?: number | null;
	/** What the journey was planned to take; null or left out where it was not planned. */
	readonly plannedJourneyMs?: number | null;
	/** The governing logger begins to record so long after it was started. */
	readonly startDelayMinutes?: number;
	/** Product and lane ask for a logger on this line. */
	readonly isLoggerRequired?: boolean;
	/** The cooling unit as the door found it, against what was agreed for the last leg. */
	readonly unit?: UnitAtDoor | null;
	/** The printed date and what the customer asks of it. */
	readonly printedDate?: PrintedDate | null;
	/** Grades set by product and lane in place of the rules' own. */
	readonly grades?: FindingGrades;
}

/** What the cooling unit showed on arrival. */
export interface UnitAtDoor {
	readonly setPointCelsius: number | null;
	readonly agreedCelsius: number | null;
	readonly returnAirCelsius: number | null;
}

/** Days are calendar days, YYYY-MM-DD. */
export interface PrintedDate {
	readonly bestBeforeOn: string | null;
	/** The customer takes goods with this many days to the printed date at least; null: no such rule. */
	readonly neededDays: number | null;
	/** The latest date already received, where nothing older may follow; null: no such rule, or nothing before. */
	readonly lastBestBeforeOn: string | null;
}
