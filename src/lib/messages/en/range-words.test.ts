import { describe, expect, it } from 'vitest';
import { rangeIncludes, rangeSourcesText } from './range-words';

describe('what a range includes', () => {
	it('is said source by source with its days either way, without those of nothing', () => {
		const parts = [
			{ source: 'accuracy', lowerHours: 12, raiseHours: 9.6 },
			{ source: 'gaps', lowerHours: 0, raiseHours: 0 },
			{ source: 'opening', lowerHours: 0, raiseHours: 48 },
			{ source: 'full-life', lowerHours: 0, raiseHours: 0 }
		] as const;
		expect(rangeIncludes(parts, 'en')).toBe(
			'Low to high includes the logger’s ± and the model’s (−0.5 +0.4 d), the opening balance’s ± (+2.0 d).'
		);
	});

	it('is never said to be 0.0 days where it is a little', () => {
		const parts = [{ source: 'accuracy', lowerHours: 1, raiseHours: 1.3 }] as const;
		expect(rangeIncludes(parts, 'en')).toBe(
			'Low to high includes the logger’s ± and the model’s (− under 0.1 +0.1 d).'
		);
	});

	it.each([
		[undefined, null],
		[[], 'Low and high are the figure itself.'],
		[[{ source: 'gaps', lowerHours: 0, raiseHours: 0 }], 'Low and high are the figure itself.'],
		[
			[
				{ source: 'accuracy', lowerHours: 12, raiseHours: 9.6 },
				{ source: 'gaps', lowerHours: 0, raiseHours: 0 },
				{ source: 'opening', lowerHours: 0, raiseHours: 48 },
				{ source: 'full-life', lowerHours: 24, raiseHours: 24 }
			],
			'Low to high: logger and model, opening balance, full life.'
		]
	] as const)('%j is named in a line: %s', (parts, text) => {
		expect(rangeSourcesText(parts)).toBe(text);
	});

	it('is nothing to say in records from before it was kept, and said where there is none', () => {
		expect(rangeIncludes(undefined, 'en')).toBeNull();
		expect(rangeIncludes([], 'en')).toMatch(/^Low and high are the figure itself/);
	});
});
