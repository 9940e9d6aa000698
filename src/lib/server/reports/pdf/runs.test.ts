import { describe, expect, it } from 'vitest';
import { runsOf, sentenceRuns } from './runs';

describe('runs of text', () => {
	it('stay one run in the family that has the letters', () => {
		expect(runsOf('Őrség, Łódź ≤ 4 °C', 'Barlow')).toEqual([{ text: 'Őrség, Łódź ≤ 4 °C', font: 'Barlow' }]);
	});

	it('take other letters from a face that has them', () => {
		const runs = runsOf('to Москва now', 'Barlow');
		expect(runs.map((run) => run.text)).toEqual(['to ', 'Москва', ' now']);
		expect(runs[1]?.font).toBe('Mono');
	});

	it('show a mark for letters that no face has', () => {
		const text = runsOf('\u{10ffff}a', 'Barlow')
			.map((run) => run.text)
			.join('');
		expect(text).toMatch(/^[\u{fffd}?]a$/u);
	});

	it('drop controls and marks that turn the reading direction', () => {
		expect(runsOf('a\u0000b\u202ec\u200bd\u2066e', 'Barlow')).toEqual([{ text: 'abcde', font: 'Barlow' }]);
	});

	it('keep line breaks, and bring composed letters together', () => {
		expect(runsOf('a\r\nb', 'Barlow')[0]?.text).toBe('a\nb');
		expect(runsOf('e\u0301', 'Barlow')[0]?.text).toBe('é');
	});

	it('set the figures of a sentence in mono, with their minus', () => {
		expect(sentenceRuns('at −1.1 °C for 10 h', 'Barlow')).toEqual([
			{ text: 'at ', font: 'Barlow' },
			{ text: '−1.1', font: 'Mono' },
			{ text: ' °C for ', font: 'Barlow' },
			{ text: '10', font: 'Mono' },
			{ text: ' h', font: 'Barlow' }
		]);
	});

	it('are none for no text', () => {
		expect(runsOf('', 'Barlow')).toEqual([]);
	});
});
