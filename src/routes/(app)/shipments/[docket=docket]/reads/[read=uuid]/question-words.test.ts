// @vitest-environment node
import { describe, expect, it } from 'vitest';
import type { Choice, Question } from '$lib/domain/ingest/ingestion';
import { answerNote, outsideJourney, rememberLabel, useWords } from './question-words';

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

	it('say the day once where all is on one day, and the zone once', () => {
		expect(answerNote(choice(), zone)).toBe('Fits this journey. Fri 3 Apr 02:40 to 08:10 CEST');
		expect(answerNote(choice({ lastMs: at('2026-04-04T06:10:00Z') }), zone)).toBe(
			'Fits this journey. Fri 3 Apr 02:40 to Sat 4 Apr 08:10 CEST'
		);
		expect(answerNote(choice({ firstMs: null, lastMs: null }), zone)).toBe('Fits this journey');
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
