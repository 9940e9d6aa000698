import type { Excursion, LegUse, Range, StopHit } from '../domain/receiving/assessment';
import type { ConditionKind, Whereabouts } from '../domain/receiving/line-groups';
import type { Outcome, Reason, Recommended } from '../domain/receiving/recommendation';
import type { Placement } from '../domain/trace/trace';
import type { TemperatureUnit } from '../domain/units';
import type { ClockCorrectionView } from './clock-correction';
import type { LaterFigures } from './later-figures';
import type { NoteView } from './note';
import type { CorrectionView, DeterminationView, ReviewView } from './signing';

/** Where a docket stands; follows from its facts, never stored by itself. */
export const stages = ['expected', 'at-the-door', 'on-hold', 'done'] as const;
export type Stage = (typeof stages)[number];

/** How a done docket ended, over all lines. `part`: some in, some refused. */
export type Verdict = 'accepted' | 'conditions' | 'part' | 'rejected';

/** Instants travel as ISO 8601 strings in UTC, calendar days as YYYY-MM-DD; temperatures as °C; life as hours. */
export interface SiteView {
	id: string;
	/** What its dockets' numbers begin with. */
	code: string;
	name: string;
	gln: string | null;
	zone: string;
	temperatureUnit: TemperatureUnit;
	address: string;
}

export interface PartyView {
	id: string | null;
	name: string;
	gln: string | null;
	note: string | null;
}

export interface DocketLineView {
	id: string;
	ordinal: number;
	product: string;
	variety: string | null;
	lot: string;
	gtin: string | null;
	firstSscc: string | null;
	pallets: number;
	casesAdvised: number;
	casesReceived: number | null;
	valueMinor: number | null;
	currency: string | null;
	bestBeforeOn: string | null;
	neededHours: number;
	fullLifeHours: number;
	referenceCelsius: number;
	/** Loggers (labels L1, L2 …) assigned to this line; the first governs. */
	loggers: string[];
	remainingHours: Range | null;
	recommendation: { recommended: Recommended; reasons: Reason[] } | null;
	/** Signed outcome, when there is one; of a split line the gravest of its groups, with the whole line's counts. */
	outcome: LineOutcomeView | null;
	/** The groups a split line was decided by; absent where the line is whole. */
	groups?: LineOutcomeView[];
}

/** What was signed of a line or of one group of it. Records from before groups lack what is optional. */
export interface LineOutcomeView {
	outcome: Outcome;
	condition: string | null;
	reason: string | null;
	cases: number;
	pallets: number;
	name?: string;
	conditionKind?: ConditionKind | null;
	awaited?: string | null;
	untilAt?: string | null;
	whereabouts?: Whereabouts | null;
	place?: string | null;
}

export interface DocketLoggerView {
	label: string;
	serial: string;
	traceId: string | null;
	readId: string | null;
	status: 'expected' | 'found' | 'not-found' | 'dead' | 'not-started' | 'other-load';
	position: string | null;
	placement: Placement;
	accuracyCelsius: number | null;
	calibrationDueOn: string | null;
	everyMinutes: number | null;
	readings: number | null;
	mktCelsius: number | null;
	meanCelsius: number | null;
	minCelsius: number | null;
	maxCelsius: number | null;
	gapMinutes: number | null;
	fileName: string | null;
	fileSha256: string | null;
	fileBytes: number | null;
	zoneBy: 'file' | 'answer' | 'site' | null;
}

/** The assessment of one line by its governing trace, without the series (that is fetched at the zoom in view). */
export interface AssessmentView extends LaterFigures {
	id: string;
	lineId: string;
	traceId: string;
	logger: string;
	isGoverning: boolean;
	engineVersion: string;
	specId: string;
	specName: string;
	specVersion: number;
	windowFromAt: string;
	windowToAt: string;
	openingHours: Range;
	openingBasis: string;
	openingKind: 'declared' | 'computed' | 'undeclared';
	usedHours: Range;
	remainingHours: Range;
	neededHours: number;
	fullLifeHours: number;
	accuracyCelsius: number;
	upperCelsius: number | null;
	lowerCelsius: number | null;
	freezingCelsius: number | null;
	ceilingCelsius: number | null;
	meanCelsius: number;
	mktCelsius: number;
	minCelsius: number;
	maxCelsius: number;
	gaps: { fromAt: string; toAt: string; usedHours: number }[];
	unobservedHours: number;
	unobservedUsedHours: number;
	belowModelHours: number;
	aboveModelHours: number;
	chilledHours: number;
	trimmedHours: number;
	excursions: Excursion[];
	stops: StopHit[];
	legs: LegUse[];
}

export interface PulpView {
	id: string;
	lineId: string | null;
	lot: string | null;
	position: string;
	caseLabel: string | null;
	celsius: number;
	/** As written down. */
	text: string;
	instrument: string | null;
	takenAt: string;
}

export interface HandoverView {
	id: string;
	ordinal: number;
	holder: string;
	place: string;
	plannedAt: string | null;
	actualAt: string | null;
	setPointCelsius: number | null;
	source: string | null;
}

export interface ArrivalView {
	arrivedAt: string;
	dock: string | null;
	sealFound: string | null;
	isSealIntact: boolean | null;
	setPointCelsius: number | null;
	returnAirCelsius: number | null;
	conditionNote: string | null;
	driverName: string | null;
	hasDriverSignature: boolean;
	loggedBy: string;
}

export interface SignatureView {
	dispositionId: string;
	version: number;
	isCurrent: boolean;
	signedBy: string;
	signedByTitle: string;
	meaning: 'approval' | 'review' | 'authorship';
	signedAt: string;
	zone: string;
	reasons: string;
	amendmentReason: string | null;
	frozenSha256: string;
	report: { id: string; fileName: string; bytes: number; sha256: string } | null;
}

export interface ClockView {
	id: string;
	name: string;
	basis: string;
	startsAt: string;
	deadlineAt: string;
	metAt: string | null;
}

export interface DocketView {
	id: string;
	number: string;
	title: string;
	stage: Stage;
	verdict: Verdict | null;
	site: SiteView;
	dock: string | null;
	supplier: PartyView;
	carrier: PartyView | null;
	/** The name of its lane, where it is on one. */
	lane?: string;
	mode: 'road' | 'sea' | 'air' | 'rail';
	vehicle: string | null;
	seal: string | null;
	purchaseOrder: string | null;
	billOfLading: string | null;
	dueAt: string | null;
	hold: {
		sinceAt: string;
		by: string;
		reason: string;
		awaited?: string | null;
		untilAt?: string | null;
	} | null;
	arrival: ArrivalView | null;
	lines: DocketLineView[];
	loggers: DocketLoggerView[];
	assessments: AssessmentView[];
	handovers: HandoverView[];
	pulp: PulpView[];
	/** Stretches a person left out, and why. */
	/** Clocks of loggers that a person has put right. */
	clockCorrections: (ClockCorrectionView & { logger: string })[];
	trims: { id: string; logger: string; fromAt: string; toAt: string; reason: string; by: string }[];
	photos: { id: string; caption: string; kind: string; by: string; at: string; bytes: number }[];
	notes: NoteView[];
	clocks: ClockView[];
	signatures: SignatureView[];
	notices: {
		id: string;
		number: string;
		partner: string;
		state: 'queued' | 'sent' | 'failed';
		sentAt: string | null;
	}[];
	claimId: string | null;
	/** Newest last: what happened, from the audit trail. */
	record: { at: string; text: string; by: string }[];
}

/** What the chart draws of one trace at a zoom: at most the points asked for, extremes kept. Answer of traces/{id}/series. */
export interface SeriesView {
	traceId: string;
	label: string;
	isGoverning: boolean;
	fromAt: string;
	toAt: string;
	/** Parallel arrays; a null celsius breaks the line (gap). */
	times: number[];
	celsius: (number | null)[];
	/** Life left in hours at the reference temperature, present when assessed. */
	remainingHours: (number | null)[] | null;
	remainingLowHours: (number | null)[] | null;
	remainingHighHours: (number | null)[] | null;
	totalReadings: number;
}

/** What a disposition freezes: the docket as it stood, hashed as stored text; the report is drawn from nothing else. */
export interface FrozenDocket {
	docket: Omit<DocketView, 'signatures' | 'notices' | 'clocks' | 'claimId' | 'record' | 'stage'>;
	/** Thinned to what the printed chart resolves; the raw files are named by hash. */
	series: SeriesView[];
	engineVersion: string;
	frozenAt: string;
	/** SHA-256 of the facts the signer had on screen; see evidenceText. */
	evidenceSha256: string;
	/** The signature is part of what is hashed, so that neither can be lifted off the other. */
	signature: FrozenSignature;
	/** What was signed before and belongs to it; absent in records from before these were kept. */
	reviews?: ReviewView[];
	determinations?: DeterminationView[];
	corrections?: CorrectionView[];
}

export interface FrozenSignature {
	dispositionId: string;
	version: number;
	signedById: string;
	signedBy: string;
	signedByTitle: string;
	meaning: 'approval' | 'review' | 'authorship';
	signedAt: string;
	zone: string;
	reasons: string;
	amendmentReason: string | null;
}
