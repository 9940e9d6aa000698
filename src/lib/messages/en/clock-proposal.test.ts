import { describe, expect, it } from 'vitest';
import { clockMovedText, clockProposalText } from './clock-proposal';

describe('a proposed correction of the clock', () => {
	it('names the whole hours of another zone, and says that nothing was changed', () => {
		const text = clockProposalText({
			kind: 'zone',
			hours: -2,
			shiftMs: -7_200_000,
			evidence: 'after-upload'
		});
		expect(text).toMatch(
			/^The last reading lies 2 h after the upload\. .*2 h ahead\. Nothing has been changed\.$/
		);
	});

	it('names a drift by its length and side', () => {
		const text = clockProposalText({
			kind: 'drift',
			hours: null,
			shiftMs: 1_380_000,
			evidence: 'before-arrival'
		});
		expect(text).toMatch(/^The last reading lies 23 min before the arrival\. .* 23 min behind\./);
	});
});

describe('a correction that was made', () => {
	it.each([
		[-7_200_000, 'Every reading moved 2 h earlier'],
		[1_500_000, 'Every reading moved 25 min later']
	])('says how far and which way: %i', (shiftMs, text) => {
		expect(clockMovedText(shiftMs)).toBe(text);
	});
});
