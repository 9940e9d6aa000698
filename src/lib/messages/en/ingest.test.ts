import { describe, expect, it } from 'vitest';
import type { Choice, Oddity, Question, RefusalCode } from '../../domain/ingest/ingestion';
import { choiceLabel, dayInWords, ordinal } from './ingest-questions';
import { evidenceText, oddityLines, oddityText, questionText, refusalText } from './ingest';

const choice = (label: string, more: Partial<Choice> = {}): Choice => ({
	answer: {},
	firstMs: null,
	lastMs: null,
	firstCelsius: null,
	lastCelsius: null,
	evidence: [],
	evidenceHours: null,
	label,
	...more
});

const question = (more: Partial<Question>): Question => ({
	code: 'date-order',
	subject: '03/04',
	choices: [choice('dmy'), choice('mdy')],
	rows: [],
	rowsBetween: 0,
	why: 'all-one-day',
	...more
});

describe('a question about a file', () => {
	it('asks for the day in words and says why the file cannot tell', () => {
		expect(questionText(question({}))).toEqual({
			title: 'Is 03/04 the 3rd of April or the 4th of March?',
			why: 'Every row is on one day, so the file cannot tell.'
		});
	});

	it('names the choices as the dock speaks of them', () => {
		const asked = question({});
		expect(choiceLabel(asked, choice('mdy'))).toBe('The 4th of March');
		expect(choiceLabel(question({ code: 'unit' }), choice('fahrenheit'))).toBe('°F');
		expect(choiceLabel(question({ code: 'interval' }), choice('10'))).toBe('Every 10 min');
		expect(choiceLabel(question({ code: 'temperature-column' }), choice('Probe A'))).toBe('Probe A');
		expect(choiceLabel(question({ code: 'start' }), choice('journey'))).toBe('When the load was loaded');
	});

	it('asks for the unit on the first figure of the file', () => {
		const asked = question({
			code: 'unit',
			subject: '38.4',
			why: 'no-unit',
			choices: [choice('celsius'), choice('fahrenheit')]
		});
		expect(questionText(asked).title).toBe('Is 38.4 in °C or °F?');
	});

	it('says ordinals as English does', () => {
		expect([1, 2, 3, 4, 11, 12, 13, 21, 22, 23, 31].map(ordinal)).toEqual([
			'1st',
			'2nd',
			'3rd',
			'4th',
			'11th',
			'12th',
			'13th',
			'21st',
			'22nd',
			'23rd',
			'31st'
		]);
		expect(dayInWords('24.03', 'ymd')).toBe('March 2024');
	});

	it('tells what speaks for or against a choice', () => {
		expect(evidenceText(choice('dmy', { evidence: ['fits-journey'] }))).toBe('Fits this journey');
		expect(evidenceText(choice('mdy', { evidence: ['before-journey'], evidenceHours: 720 }))).toBe(
			'Ends 30 d before loading'
		);
	});
});

describe('an oddity', () => {
	const oddity = (more: Partial<Oddity>): Oddity => ({
		code: 'gap',
		count: 1,
		lines: [12],
		detail: '95',
		...more
	});

	it('is one sentence with its count', () => {
		expect(oddityText(oddity({}))).toBe('1 gap of 1 h 35 min.');
		expect(oddityText(oddity({ code: 'missing-value', count: 1200, detail: null }))).toBe(
			'1,200 rows have no temperature.'
		);
		expect(oddityText(oddity({ code: 'interval-changed', detail: '10 > 5' }))).toBe(
			'The interval changes from 10 min to 5 min.'
		);
		expect(oddityText(oddity({ code: 'zone-assumed', detail: 'Europe/Paris' }))).toBe(
			'The file names no time zone; Europe/Paris is assumed.'
		);
	});

	it('names the first lines and how many follow', () => {
		expect(oddityLines(oddity({}))).toBe('line 12');
		expect(oddityLines(oddity({ count: 5, lines: [2, 3] }))).toBe('lines 2, 3 and 3 more');
	});
});

describe('a refusal', () => {
	const codes: readonly RefusalCode[] = [
		'empty',
		'too-large',
		'spreadsheet',
		'pdf',
		'zip',
		'image',
		'html',
		'xml',
		'binary',
		'header-only',
		'no-readings',
		'no-temperature',
		'no-time',
		'one-reading',
		'no-time-progress',
		'two-recordings',
		'broken-json',
		'broken-gzip',
		'truncated',
		'unclosed-quote',
		'too-deep',
		'line-too-long',
		'too-many-columns',
		'too-many-readings'
	];

	it('says what the file is and what to do instead', () => {
		expect(refusalText('spreadsheet', { line: null, found: 'XLSX' })).toBe(
			'This is a spreadsheet. Export it as CSV and upload that.'
		);
		expect(refusalText('truncated', { line: 1042, found: null })).toBe(
			'The file ends in the middle at line 1,042. Download the export again.'
		);
	});

	it.each(codes)('of kind %s is whole sentences', (code) => {
		const text = refusalText(code, { line: 3, found: 'x' });
		expect(text).toMatch(/^[A-Z].*\.$/);
		expect(text).not.toMatch(/undefined|null|!/);
	});
});
