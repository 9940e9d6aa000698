import { describe, expect, it } from 'vitest';
import type { Ingestion, ReadContext } from '../ingestion';
import { readExport } from '../read-export';

const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 4, 1),
	siteZone: 'UTC',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};

const read = (text: string, known: Partial<ReadContext> = {}): Ingestion =>
	readExport(new TextEncoder().encode(text), { ...context, ...known });

const days = (first: string): string => {
	const from = Date.parse(`${first}T10:00:00Z`);
	const rows = [0, 1, 2, 3].map((i) => `${new Date(from + i * 600_000).toISOString()};4.${i}`);
	return ['time;temp °C', ...rows, ''].join('\n');
};

/** Days counted from 1900: 46 125 is 2026-04-13. Source: ECMA-376 part 1 §18.17.4.1, 45 292 being 2024-01-01. */
const serials = (first: number, before = ''): string =>
	[
		...(before === '' ? [] : [before, '']),
		'Date;temp °C',
		...[0, 1, 2, 3].map((i) => `${(first + i / 144).toFixed(8)};4.${i}`),
		''
	].join('\n');

const firstOf = (ingestion: Ingestion): string =>
	ingestion.kind === 'ok'
		? new Date(ingestion.understanding.firstMs).toISOString()
		: ingestion.kind === 'question'
			? `asked ${ingestion.question.code} ${ingestion.question.why}`
			: `refused ${ingestion.code}`;

describe('dates', () => {
	it.each([
		['before loggers existed', '1970-01-01', 'refused implausible-dates'],
		['of 1974', '1974-12-31', 'refused implausible-dates'],
		['over a year ahead of the upload', '2027-06-01', 'refused implausible-dates'],
		['some months ahead', '2026-09-01', '2026-09-01T10:00:00.000Z'],
		['of twenty years ago', '2006-03-05', '2006-03-05T10:00:00.000Z'],
		['of this month', '2026-04-13', '2026-04-13T10:00:00.000Z'],
		['at which a clock begins that was never set', '2000-01-01', 'asked start clock-never-set'],
		['at which another such clock begins', '1980-01-06', 'asked start clock-never-set']
	])('%s: %s', (_, first, expected) => {
		expect(firstOf(read(days(first)))).toBe(expected);
	});

	it('of a clock that was never set move as a whole to the start that is answered', () => {
		const startMs = Date.UTC(2026, 3, 20, 8);
		const ingestion = read(days('2000-01-01'), { answers: { startMs } });
		if (ingestion.kind !== 'ok') throw new Error(ingestion.kind);
		const { firstMs, lastMs, decisions } = ingestion.understanding;
		expect([firstMs, lastMs]).toEqual([startMs, startMs + 1_800_000]);
		expect(decisions).toContainEqual(expect.objectContaining({ field: 'start', because: 'answer' }));
	});

	it('at such a moment are right where the journey was then', () => {
		const known = { journeyFromMs: Date.UTC(2000, 0, 1), journeyToMs: Date.UTC(2000, 0, 2) };
		expect(firstOf(read(days('2000-01-01'), known))).toBe('2000-01-01T10:00:00.000Z');
	});
});

describe('days of a spreadsheet', () => {
	// 1 462 days lie between the calendars of 1900 and of 1904.
	it.each([
		['count from 1900', serials(46_125), '2026-04-13T00:00:00.000Z'],
		[
			'count from 1904 where the file says when it began',
			serials(44_663, 'Start: 2026-04-13 00:00'),
			'2026-04-13T00:00:00.000Z'
		],
		[
			'are asked about where only the calendar of 1904 makes them recent',
			serials(44_663),
			'asked start two-calendars'
		],
		[
			'stay where the start they state says so',
			serials(44_663, 'Start: 2022-04-12 00:00'),
			'2022-04-12T00:00:00.000Z'
		]
	])('%s', (_, text, expected) => {
		expect(firstOf(read(text))).toBe(expected);
	});

	it('count from 1904 where only so they fall into the journey', () => {
		const known = { journeyFromMs: Date.UTC(2026, 3, 12), journeyToMs: Date.UTC(2026, 3, 14) };
		expect(firstOf(read(serials(44_663), known))).toBe('2026-04-13T00:00:00.000Z');
	});
});
