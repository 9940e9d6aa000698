import type { Quantity, Trace } from '../trace/trace';
import type { TemperatureUnit } from '../units';
import type { ClockProposal } from './read/clock-proposal';

/** What the dock knows beside the file. All of it is argument: the reader has no clock of its own. */
export interface ReadContext {
	/** The moment of upload, UTC ms: no reading can be later. */
	readonly uploadedMs: number;
	/** IANA zone of the receiving site. Assumed, visibly, for local times without one. */
	readonly siteZone: string;
	/** Planned or actual journey, where known: settles a date order the file alone cannot. */
	readonly journeyFromMs: number | null;
	readonly journeyToMs: number | null;
	readonly answers: Answers;
}

/** The dock's answers to earlier questions about this file. */
export interface Answers {
	readonly dateOrder?: 'dmy' | 'mdy' | 'ymd';
	readonly unit?: TemperatureUnit;
	/** IANA zone or fixed offset (`+02:00`) of the file's local times. */
	readonly zone?: string;
	/** Column (0-based) or JSON key of the temperature to use. */
	readonly temperatureColumn?: string;
	readonly intervalSeconds?: number;
	/** First moment of running times; for times counted back from the receipt, that moment. */
	readonly startMs?: number;
	/** Which of several sections; where a clock restarts, `before` it only or both `joined`. */
	readonly part?: Part;
}

/** Sections of a file by their place, up to what a person would tell apart. */
export const sectionParts = [
	'first',
	'second',
	'third',
	'fourth',
	'fifth',
	'sixth',
	'seventh',
	'eighth'
] as const;
export const parts = [...sectionParts, 'before', 'joined'] as const;
export type Part = (typeof parts)[number];

export type QuestionCode =
	'date-order' | 'unit' | 'zone' | 'temperature-column' | 'interval' | 'start' | 'part';

/** One of two or three possible readings of the file, shown on the file's own first and last rows. */
export interface Choice {
	readonly answer: Answers;
	readonly firstMs: number | null;
	readonly lastMs: number | null;
	readonly firstCelsius: number | null;
	readonly lastCelsius: number | null;
	/** Codes of what speaks for or against: `fits-journey`, `before-journey`, `after-upload`, `plausible`, `implausible`. */
	readonly evidence: readonly string[];
	/** Days or hours the evidence speaks of (30 days before loading). */
	readonly evidenceHours: number | null;
	/** What is being named: a column's header, a zone. */
	readonly label: string;
}

/** A line of the file as it stands, for showing an example; `marks` are the ambiguous parts. */
export interface ExampleRow {
	readonly line: number;
	readonly text: string;
	readonly marks: readonly { readonly from: number; readonly to: number }[];
}

export interface Question {
	readonly code: QuestionCode;
	/** The ambiguous text itself, e.g. `03/04`. */
	readonly subject: string;
	readonly choices: readonly Choice[];
	readonly rows: readonly ExampleRow[];
	/** Rows between the first and last shown. */
	readonly rowsBetween: number;
	/**
	 * Why the file cannot tell: `all-one-day`, `all-days-up-to-12`, `no-unit`, `no-zone`, `several-temperatures`,
	 * `unknown-zone`, `several-zones`, `daylight`, `no-times`, `relative-times`, `two-calendars`, `two-languages`,
	 * `clock-never-set`, `several-parts`, `clock-restarts`.
	 */
	readonly why: string;
}

/** Something a careful person would mention. `lines` holds the first few line numbers, `count` all of them. */
export interface Oddity {
	readonly code:
		| 'duplicate-dropped'
		| 'duplicate-conflict'
		| 'missing-value'
		| 'impossible-value'
		| 'resorted'
		| 'gap'
		| 'interval-changed'
		| 'future-reading'
		| 'zone-assumed'
		| 'clock-change'
		| 'footer-ignored'
		| 'short-row'
		| 'cut-short'
		| 'other-unit-column'
		| 'bad-time'
		| 'date-order-by-journey'
		| 'date-order-by-upload'
		/** The column heads stood again among the readings. */
		| 'header-repeated'
		/** The column in the other unit disagrees with the chosen one by more than rounding. */
		| 'twin-disagrees'
		/** A reading before the start that the file itself states. */
		| 'before-start'
		/** An answer that the file has no use for; its fields are the detail. */
		| 'answer-unused'
		/** The clock leaps ahead, or slips for a row or three (their number is the detail; they are set aside). */
		| 'clock-jump'
		/** The clock was put back: later rows are left out (`before`) or moved to follow (`joined`). */
		| 'clock-restart';
	readonly count: number;
	readonly lines: readonly number[];
	readonly detail: string | null;
}

/** What a decision is about; the first seven can also be answered. */
export type DecisionField =
	| 'dateOrder'
	| 'zone'
	| 'unit'
	| 'column'
	| 'start'
	| 'intervalSeconds'
	| 'part'
	| 'layout'
	| 'encoding'
	| 'delimiter'
	| 'decimal'
	| 'time';

/** One thing that was decided about the file, with what decided it. */
export interface Decision {
	readonly field: DecisionField;
	/** The answer that would decide the same: `dmy`, `+02:00`, `fahrenheit`, a column's head. */
	readonly value: string;
	/** Code of what decided: `answer`, `day-over-12`, `head`, `preamble`, `site`, `only-one` … */
	readonly because: DecisionReason;
	/** What the sentence names beside the value; null without. */
	readonly detail: string | null;
}

export type DecisionReason =
	| 'answer'
	/** Of the order of dates. */
	| 'iso'
	| 'day-over-12'
	| 'continuity'
	| 'declared'
	| 'journey'
	| 'upload'
	| 'month-name'
	/** Of the zone. */
	| 'offset'
	| 'epoch'
	| 'zone-named'
	| 'site'
	/** Of the unit. */
	| 'beside-values'
	| 'head'
	| 'preamble'
	| 'standard'
	/** Of the column. */
	| 'only-one'
	| 'mean'
	| 'twin'
	/** Of what the file is written in. */
	| 'found';

/** How the file was understood: enough to read it again to the same digits. */
export interface Layout {
	readonly kind: 'delimited' | 'json' | 'senml' | 'epcis';
	readonly encoding: string;
	readonly delimiter: string | null;
	readonly decimalComma: boolean;
	readonly headerLine: number | null;
	readonly dateOrder: 'dmy' | 'mdy' | 'ymd' | null;
	/** What settled the order: `iso`, `day-over-12`, `continuity`, `declared`, `journey`, `upload`, `answer`, `month-name`. */
	readonly dateOrderBy: string | null;
	readonly zone: string;
	/** `file` offset or preamble, `answer`, or `site` when assumed. */
	readonly zoneBy: 'file' | 'answer' | 'site';
	/** Same for files of the same make: kind, delimiter, header words. */
	readonly fingerprint: string;
}

/** One column of measurements. All are kept, only the primary temperature is assessed. */
export interface Channel {
	readonly name: string;
	readonly quantity: Quantity;
	/** Unit as written; of a temperature the one it was read in (`celsius`); null where the file names none. */
	readonly unit: string | null;
	readonly isPrimary: boolean;
	/** Temperatures only: other quantities are kept as figures. */
	readonly trace: Trace | null;
	/** Line in the file of each reading of `trace`. */
	readonly lines: Int32Array | null;
	readonly readings: number;
	/** Rows without a usable value. */
	readonly missing: number;
	readonly firstMs: number | null;
	readonly lastMs: number | null;
	/** The most frequent step; null below two readings. */
	readonly usualIntervalMs: number | null;
	/** Steps over 1.5 × the usual one as from, to, from, to …, UTC ms. */
	readonly longSteps: Float64Array;
	/** Of temperatures only; the mean is arithmetic over readings. */
	readonly minCelsius: number | null;
	readonly maxCelsius: number | null;
	readonly meanCelsius: number | null;
}

/** What a preamble or metadata said. */
export interface Declared {
	readonly serial: string | null;
	readonly tripName: string | null;
	readonly startMs: number | null;
	readonly intervalMinutes: number | null;
	readonly zone: string | null;
}

export interface Understanding {
	readonly layout: Layout;
	readonly declared: Declared;
	/** What was decided, and by what. */
	readonly decisions: readonly Decision[];
	readonly channels: readonly Channel[];
	/** Index in `channels` of the temperature to assess. */
	readonly temperature: number;
	readonly readings: number;
	readonly firstMs: number;
	readonly lastMs: number;
	readonly usualIntervalMs: number;
	/** What the clock may have wrong against arrival and upload; null where the last reading fits, absent in old reads. */
	readonly clockProposal?: ClockProposal | null;
	readonly oddities: readonly Oddity[];
	/** First and last rows of the file, as they stand. */
	readonly rows: readonly ExampleRow[];
}

export type RefusalCode =
	| 'empty'
	| 'too-large'
	| 'spreadsheet'
	| 'pdf'
	| 'zip'
	| 'image'
	| 'html'
	| 'binary'
	| 'header-only'
	| 'no-temperature'
	| 'no-time'
	| 'one-reading'
	| 'broken-json'
	| 'broken-gzip'
	| 'xml'
	/** Text, but with no rows of readings in it. */
	| 'no-readings'
	/** A quoted cell that never closes. */
	| 'unclosed-quote'
	/** Ends in the middle: what is missing cannot be known. */
	| 'truncated'
	/** All rows carry the same moment. */
	| 'no-time-progress'
	/** Several lists of readings side by side. */
	| 'two-recordings'
	/** Read any way, the dates lie before loggers existed or far ahead of the upload. */
	| 'implausible-dates'
	| 'too-deep'
	| 'line-too-long'
	| 'too-many-columns'
	| 'too-many-readings';

/** What a read can be: nothing else. */
export type Ingestion =
	| { readonly kind: 'ok'; readonly understanding: Understanding }
	| { readonly kind: 'question'; readonly question: Question; readonly declared: Declared }
	| {
			readonly kind: 'refused';
			readonly code: RefusalCode;
			readonly line: number | null;
			readonly found: string | null;
	  };
