// @vitest-environment node
import { describe, expect, it } from 'vitest';
import type { Choice, Question } from '$lib/domain/ingest/ingestion';
import { answersText } from '$lib/messages/en/ingest-decisions';
import { answerNote, lastingOf, outsideJourney, rememberLabel, useWords } from './question-words';

const zone = 'Europe/Amsterdam';
const at = (text: string) => Date.parse(text);
const choice = (overrides: Partial<Choice> = {}): Choice => ({
	answer: { dateOrder: 'dmy' },
	label: 'dmy',
	firstMs: at('2026-04-03T00:40:00Z'),
	lastMs: at('2026-04-03T06:10:00Z'),
	firstCelsius: 1.4,
	lastCelsius: 1.6,
	evidence: ['fits-journey'],
	evidenceHours: null,
	...overrides
});
const question: Question = {
	code: 'date-order',
	subject: '03/04',
	choices: [choice()],
	rows: [],
	rowsBetween: 0,
	why: 'all-one-day'
};
const context = {
	uploadedMs: at('2026-04-03T07:35:00Z'),
	siteZone: zone,
	journeyFromMs: at('2026-03-30T06:10:00Z'),
	journeyToMs: at('2026-04-03T03:30:00Z'),
	answers: {}
};

describe('the words of a question', () => {
	it('name the choice on the button and what would be remembered', () => {
		expect(useWords(question, choice())).toBe('Use the 3rd of April');
		expect(useWords(question, undefined)).toBe('Use this answer');
		expect(rememberLabel(question, choice())).toBe('Day first for files like this from now on');
		expect(rememberLabel({ ...question, code: 'start' }, choice())).toBeNull();
	});

	it('show the first and last row as the choice would read them, with what speaks for it', () => {
		expect(answerNote(choice(), zone, 'celsius')).toBe(
			'Fits this journey. First row Fri 3 Apr 2026 02:40 CEST, 1.4 °C; last row Fri 3 Apr 2026 08:10 CEST, 1.6 °C'
		);
		expect(answerNote(choice({ evidence: [] }), zone, 'fahrenheit')).toContain('34.5 °F; last row');
		const seconds = choice({ firstMs: at('2026-01-03T00:40:20Z'), firstCelsius: null });
		expect(answerNote(seconds, zone, 'celsius')).toContain('First row Sat 3 Jan 2026 01:40:20 CET; last');
		const timeless = { firstMs: null, lastMs: null };
		expect(answerNote(choice(timeless), zone, 'celsius')).toBe(
			'Fits this journey. First row 1.4 °C; last row 1.6 °C'
		);
		const nothing = { ...timeless, firstCelsius: null, lastCelsius: null };
		expect(answerNote(choice(nothing), zone, 'celsius')).toBe('Fits this journey');
	});

	it('keep for other files only what holds for them', () => {
		const answers = { dateOrder: 'dmy', startMs: 1, part: 'first', intervalSeconds: 60 } as const;
		expect(answersText(lastingOf(answers))).toBe('day first');
	});
});

describe('a file that has nothing to do with the journey', () => {
	it.each([
		['2026-03-28T06:10:00Z', '2026-03-29T06:10:00Z', 'the last is 24 h before loading'],
		['2026-04-03T05:30:00Z', '2026-04-03T06:10:00Z', 'the first is 2 h after it ended']
	])('is said to lie outside: %s to %s', (first, last, said) => {
		expect(outsideJourney({ firstMs: at(first), lastMs: at(last), context })).toContain(said);
	});

	it('is not, where it overlaps or the journey is not known', () => {
		const firstMs = at('2026-03-20T00:00:00Z');
		expect(outsideJourney({ firstMs, lastMs: at('2026-03-30T06:10:00Z'), context })).toBeNull();
		const unknown = { ...context, journeyFromMs: null, journeyToMs: null };
		expect(outsideJourney({ firstMs, lastMs: firstMs, context: unknown })).toBeNull();
	});
});
