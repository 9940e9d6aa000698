import { describe, expect, it } from 'vitest';
import type { Answers, Decision } from '../../domain/ingest/ingestion';
import { answersText, decisionText } from './ingest-decisions';

describe('what was decided about a file', () => {
	it.each<[Decision, string]>([
		[
			{ field: 'dateOrder', value: 'dmy', because: 'day-over-12', detail: null },
			'Dates: day first, a day is over 12'
		],
		[
			{ field: 'unit', value: 'fahrenheit', because: 'head', detail: null },
			'Unit: °F, the column’s head says so'
		],
		[
			{ field: 'column', value: 'Probe B', because: 'twin', detail: 'Probe B F' },
			'Temperature of the goods: Probe B, “Probe B F” shows the same in another unit'
		],
		[
			{ field: 'zone', value: 'Europe/Berlin', because: 'site', detail: null },
			'Zone of the times: Europe/Berlin, assumed: the file names none, this is the site’s'
		],
		[
			{ field: 'delimiter', value: '\t', because: 'found', detail: null },
			'Cells parted by: tab, found in the file'
		],
		[
			{ field: 'layout', value: 'row-a-sensor', because: 'found', detail: 'A, B' },
			'Written as: a row for each sensor, found in the file'
		],
		[
			{ field: 'intervalSeconds', value: '600', because: 'answer', detail: null },
			'Interval: 10 min, as answered here'
		],
		[
			{ field: 'intervalSeconds', value: '30', because: 'preamble', detail: null },
			'Interval: 30 s, the lines above the readings say so'
		],
		[
			{ field: 'decimal', value: ',', because: 'found', detail: null },
			'Decimal sign: comma, found in the file'
		],
		[
			{ field: 'time', value: '1904', because: 'journey', detail: null },
			'Times: days counted from 1904, only so do they fall into this journey'
		],
		[
			{ field: 'encoding', value: 'utf-16le', because: 'found', detail: null },
			'Characters: utf-16le, found in the file'
		]
	])('is said with what decided it: %o', (decision, said) => {
		const { name, value, because } = decisionText(decision);
		expect(`${name}: ${value}, ${because}`).toBe(said);
	});

	it.each<[Answers, string]>([
		[{ dateOrder: 'mdy', unit: 'celsius' }, 'month first, °C'],
		[{ temperatureColumn: 'Probe B', zone: 'UTC' }, 'times in UTC, column “Probe B”'],
		[{ temperatureColumn: '2' }, 'column 3'],
		[
			{ intervalSeconds: 300, startMs: Date.UTC(2026, 3, 3, 6, 10) },
			'every 5 min, start 2026-04-03 06:10 UTC'
		],
		[{ part: 'joined' }, 'all readings in turn'],
		[{ part: 'second' }, 'the second recording'],
		[{}, '']
	])('is said of answers in a few words: %o', (answers, said) => {
		expect(answersText(answers)).toBe(said);
	});
});
