import { describe, expect, it } from 'vitest';
import type { Answers, Decision } from '../ingestion';
import { readExport } from '../read-export';
import { unusedAnswers } from './decisions';

const context = {
	uploadedMs: Date.UTC(2026, 4, 1),
	siteZone: 'Europe/Amsterdam',
	journeyFromMs: null,
	journeyToMs: null
};

function decisionsIn(text: string, answers: Answers = {}): readonly Decision[] {
	const ingestion = readExport(new TextEncoder().encode(text), { ...context, answers });
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion));
	return ingestion.understanding.decisions;
}

const clocks = ['10:00', '10:10', '10:20'];
const table = (head: string, day: string, value = (i: number) => `4.${i}`): string =>
	[head, ...clocks.map((clock, i) => `${day} ${clock};${value(i)}`), ''].join('\n');
const iso = (head: string): string => table(head, '2026-04-13');

describe('what was decided about a file', () => {
	it.each<[string, string, Answers, string, string, string]>([
		['a day over 12', table('time;temp °C', '13/04/2026'), {}, 'dateOrder', 'dmy', 'day-over-12'],
		['a year that stands first', iso('time;temp °C'), {}, 'dateOrder', 'ymd', 'iso'],
		['a month by its name', table('time;temp °C', '13 Apr 2026'), {}, 'dateOrder', 'ymd', 'month-name'],
		['an answer', table('time;temp °C', '03/04/2026'), { dateOrder: 'mdy' }, 'dateOrder', 'mdy', 'answer'],
		[
			'a start that is written out',
			`Start: 2026-04-03 10:00\n\n${table('time;temp °C', '03/04/2026')}`,
			{},
			'dateOrder',
			'dmy',
			'declared'
		],
		['the site', iso('time;temp °C'), {}, 'zone', 'Europe/Amsterdam', 'site'],
		['a zone above', `Time zone: UTC+3\n\n${iso('time;temp °C')}`, {}, 'zone', '+03:00', 'zone-named'],
		['an answered zone', iso('time;temp °C'), { zone: 'Asia/Tokyo' }, 'zone', 'Asia/Tokyo', 'answer'],
		['the head', iso('time;temp °F'), {}, 'unit', 'fahrenheit', 'head'],
		[
			'the values',
			table('time;temp', '2026-04-13', (i) => `4.${i} °C`),
			{},
			'unit',
			'celsius',
			'beside-values'
		],
		['the preamble', `Unit: °C\n\n${iso('time;temp')}`, {}, 'unit', 'celsius', 'preamble'],
		['an answered unit', iso('time;temp'), { unit: 'fahrenheit' }, 'unit', 'fahrenheit', 'answer'],
		['being alone', iso('time;temp °C'), {}, 'column', 'temp °C', 'only-one'],
		['what it is written in', iso('time;temp °C'), {}, 'delimiter', ';', 'found']
	])('by %s is told with what decided it', (_, text, answers, field, value, because) => {
		const made = decisionsIn(text, answers).find((decision) => decision.field === field);
		expect(made).toMatchObject({ value, because });
	});

	it('names an answered column only where the answer names one', () => {
		const text = ['time;air °C;pulp °C', ...clocks.map((c, i) => `2026-04-13 ${c};4.${i};5.${i}`), ''].join(
			'\n'
		);
		expect(decisionsIn(text, { temperatureColumn: 'pulp °C' })).toContainEqual(
			expect.objectContaining({ field: 'column', value: 'pulp °C', because: 'answer' })
		);
		const one = decisionsIn(iso('time;temp °C'), { temperatureColumn: 'core' });
		expect(one.find(({ field }) => field === 'column')?.because).toBe('only-one');
	});

	it('tells start and interval of rows without times, and whence they are', () => {
		const rows = 'Start: 13/04/2026 10:00\nInterval: 10 min\n\ntemp °C\n4.1\n4.2\n4.3\n';
		const told = decisionsIn(rows).filter(({ field }) => field === 'start' || field === 'intervalSeconds');
		expect(told.map(({ value, because }) => [value, because])).toEqual([
			['2026-04-13T08:00:00.000Z', 'preamble'],
			['600', 'preamble']
		]);
	});
});

describe('answers', () => {
	const used: Decision = { field: 'zone', value: 'UTC', because: 'answer', detail: null };

	it('are unused where nothing was decided by them', () => {
		expect(unusedAnswers([used], { ...context, answers: { zone: 'UTC', unit: 'kelvin' } })).toEqual(['unit']);
		expect(unusedAnswers([{ ...used, because: 'offset' }], { ...context, answers: { zone: 'UTC' } })).toEqual(
			['zone']
		);
		expect(unusedAnswers([], { ...context, answers: {} })).toEqual([]);
	});
});
