import { describe, expect, it } from 'vitest';
import { figuresIn } from './figures';

/** The sentence with its figures in brackets. */
function marked(sentence: string): string {
	return figuresIn(sentence)
		.map((run) => (run.isFigure ? `[${run.text}]` : run.text))
		.join('')
		.replaceAll('\u00a0', ' ');
}

describe('figures in a sentence', () => {
	it.each([
		['since 06:31 CEST, D. Marsh, Dock 1', 'since [06:31] CEST, D. Marsh, Dock 1'],
		['Line 3 has 10.1 d left, 9.7 d on the low.', 'Line 3 has [10.1] d left, [9.7] d on the low.'],
		['E3 reached −1.1 ±0.5 °C', 'E3 reached [−1.1] [±0.5] °C'],
		['10 h 3 min above 4.0 °C', '[10] h [3] min above [4.0] °C'],
		['Packhouse 2, GLN 0614141000210', 'Packhouse 2, GLN [0614141000210]'],
		['3 lots, 16 pallets', '3 lots, 16 pallets'],
		['set at 3 °C, up to 50 MB', 'set at [3] °C, up to [50] MB'],
		['Docket PS-26-1184, trailer AR-4471', 'Docket [PS-26-1184], trailer [AR-4471]'],
		['low 9.7 to high 10.5', 'low [9.7] to high [10.5]'],
		['9.7–10.5', '[9.7]–[10.5]'],
		['E2 critical, 11.3 °C', 'E2 critical, [11.3] °C'],
		['Reading trip-0077.csv', 'Reading [trip-0077.csv]'],
		['It ends inside a row: 03/04/2026;08:1. Stop.', 'It ends inside a row: [03/04/2026;08:1]. Stop.'],
		['', '']
	])('%s', (sentence, expected) => {
		expect(marked(sentence)).toBe(expected);
	});

	it('keeps a figure and its unit on one line', () => {
		expect(figuresIn('at 3 °C for 2 h, then off').map((run) => run.text)).toEqual([
			'at ',
			'3',
			'\u00a0°C for ',
			'2',
			'\u00a0h, then off'
		]);
	});

	it('loses nothing of the sentence', () => {
		const sentence = 'It ends inside a row: 03/04/2026;08:1. The 803 readings before it are whole.';
		expect(
			figuresIn(sentence)
				.map((run) => run.text)
				.join('')
		).toBe(sentence);
	});
});
