import { describe, expect, it } from 'vitest';
import type { Choice, Question } from '../../domain/ingest/ingestion';
import { rememberedChoice } from './apply-layout';

const choice = (answer: Choice['answer'], ...evidence: string[]): Choice => ({
	answer,
	evidence,
	firstMs: null,
	lastMs: null,
	firstCelsius: null,
	lastCelsius: null,
	evidenceHours: null,
	label: ''
});

const question = (...choices: Choice[]): Question => ({
	code: 'unit',
	subject: '',
	choices,
	rows: [],
	rowsBetween: 0,
	why: 'no-unit'
});

describe('the choice that was taken before', () => {
	const celsius = choice({ unit: 'celsius' }, 'plausible');
	const fahrenheit = choice({ unit: 'fahrenheit' }, 'plausible');

	it.each<[string, Question, Record<string, unknown>, Choice | null]>([
		['is taken where it is offered', question(celsius, fahrenheit), { unit: 'fahrenheit' }, fahrenheit],
		['is not made up where it is not offered', question(celsius), { unit: 'fahrenheit' }, null],
		['is none where another thing was answered', question(celsius), { dateOrder: 'dmy' }, null],
		[
			'is asked about where the figures make it implausible',
			question(choice({ unit: 'celsius' }, 'implausible'), fahrenheit),
			{ unit: 'celsius' },
			null
		],
		[
			'is asked about where it would lie ahead of the upload',
			question(choice({ dateOrder: 'dmy' }, 'after-upload'), choice({ dateOrder: 'mdy' })),
			{ dateOrder: 'dmy' },
			null
		],
		[
			'is asked about where only another fits this journey',
			question(choice({ dateOrder: 'dmy' }, 'before-journey'), choice({ dateOrder: 'mdy' }, 'fits-journey')),
			{ dateOrder: 'dmy' },
			null
		]
	])('%s', (_, asked, remembered, expected) => {
		expect(rememberedChoice(asked, remembered)).toBe(expected);
	});
});
