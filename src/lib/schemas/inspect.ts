import { z } from 'zod';
import { parts, type Answers } from '../domain/ingest/ingestion';
import { isZone } from '../domain/ingest/times/zone';
import type { TemperatureUnit } from '../domain/units';

/** Names of the units in answers and results. Source: UCUM, case-sensitive codes. */
export const unitCodes = { celsius: 'Cel', fahrenheit: '[degF]', kelvin: 'K' } as const satisfies Record<
	TemperatureUnit,
	string
>;

/** What may be answered beforehand; a question names one of these. */
export const answerFields = [
	'dateOrder',
	'zone',
	'unit',
	'column',
	'start',
	'intervalSeconds',
	'part'
] as const;
export type AnswerField = (typeof answerFields)[number];

const longestIntervalSeconds = 31 * 86_400;

/** An answer left empty is not given. */
function given<Field extends z.ZodType>(field: Field) {
	return z.preprocess((value) => {
		const text = typeof value === 'number' ? String(value) : value;
		return typeof text === 'string' && text.trim() === '' ? undefined : text;
	}, field.optional());
}

const unitFault = 'unit is one of Cel, [degF], K.';

/** The answer fields of an inspection, as a form or command line gives them. */
export const inspectAnswers = z
	.object({
		dateOrder: given(
			z
				.string()
				.trim()
				.toLowerCase()
				.pipe(z.enum(['dmy', 'mdy', 'ymd'], 'dateOrder is one of DMY, MDY, YMD.'))
		),
		zone: given(
			z
				.string()
				.trim()
				.max(64)
				.refine(isZone, 'zone is an IANA name such as Europe/Amsterdam or an offset such as +02:00.')
		),
		unit: given(
			z
				.enum(['Cel', '[degF]', 'K'], unitFault)
				.transform((code) => (code === 'Cel' ? 'celsius' : code === 'K' ? 'kelvin' : 'fahrenheit'))
		),
		column: given(z.string().trim().max(200, 'column has at most 200 characters.')),
		start: given(
			z.iso
				.datetime({ offset: true, error: 'start is an instant such as 2026-04-03T06:10:00Z.' })
				.transform((text) => Date.parse(text))
		),
		intervalSeconds: given(
			z.coerce
				.number('intervalSeconds is a number of seconds.')
				.positive('intervalSeconds is more than 0.')
				.max(longestIntervalSeconds, 'intervalSeconds is at most 31 days.')
		),
		part: given(z.enum(parts, `part is one of ${parts.join(', ')}.`))
	})
	.transform(({ dateOrder, zone, unit, column, start, intervalSeconds, part }): Answers => ({
		...(dateOrder && { dateOrder }),
		...(zone && { zone }),
		...(unit && { unit }),
		...(column && { temperatureColumn: column }),
		...(start !== undefined && { startMs: start }),
		...(intervalSeconds && { intervalSeconds }),
		...(part && { part })
	}));

/** Why a file is refused, as other programs are told. */
export type InspectRefusalCode =
	| 'empty'
	| 'not-text'
	| 'web-page'
	| 'no-readings'
	| 'no-temperature'
	| 'no-time'
	| 'json-syntax'
	| 'truncated'
	| 'too-deep'
	| 'line-too-long'
	| 'unclosed-quote'
	| 'no-time-progress'
	| 'two-recordings'
	| 'implausible-dates'
	| 'too-large';

/** One of the readings that stay possible. `value`, sent back in the question's field, settles it. */
export interface InspectChoice {
	value: string;
	label: string;
	/** First and last reading of the file as they would be read, UTC. */
	first: string | null;
	last: string | null;
}

/** One column of measurements. Times are UTC, ISO 8601. */
export interface InspectChannel {
	name: string;
	quantity: string;
	unit: string | null;
	primary: boolean;
	readings: number;
	/** Rows without a usable value. */
	missing: number;
	firstAt: string | null;
	lastAt: string | null;
	minCelsius: number | null;
	maxCelsius: number | null;
	meanCelsius: number | null;
	/** The most frequent step. */
	intervalSeconds: number | null;
	/** Steps over 1.5 times the usual one. */
	longSteps: [from: string, to: string][];
}

/** What is told of a file that was inspected. Every key is always there. */
export interface InspectAnswer {
	outcome: 'ok' | 'question' | 'refused';
	/** One at a time; empty unless the outcome is `question`. */
	questions: { field: AnswerField; prompt: string; choices: InspectChoice[] }[];
	refusal: { code: InspectRefusalCode; message: string; line: number | null } | null;
	warnings: { code: string; message: string; count: number; lines: number[] }[];
	decisions: { field: string; value: string; because: string }[];
	channels: InspectChannel[];
}
