import { describe, expect, it } from 'vitest';
import { amountText, clockCorrectionForm } from './clock-correction';

const reason = 'Stopped in my hand at 11:30.';
const hour = 3_600_000;

describe('how far a clock is moved', () => {
	it.each([
		['earlier', '2:00', -2 * hour],
		['later', '0:25', 25 * 60_000],
		['later', ' 26:00 ', 26 * hour],
		['earlier', '0:00:05', -5000]
	])('%s by %s', (way, amount, shiftMs) => {
		expect(clockCorrectionForm.parse({ way, amount, reason })).toEqual({ shiftMs, reason });
	});

	it.each([
		['2', 'Write hours and minutes'],
		['1:75', 'Write hours and minutes'],
		['-2:00', 'Write hours and minutes'],
		['', 'Write hours and minutes'],
		['0:00', 'change nothing'],
		['9000:00', 'At most a year']
	])('refuses %j in words', (amount, words) => {
		const { error } = clockCorrectionForm.safeParse({ way: 'later', amount, reason });
		expect(error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`)).toEqual([
			expect.stringMatching(new RegExp(`^amount: .*${words}`))
		]);
	});

	it('wants a way and a reason', () => {
		const { error } = clockCorrectionForm.safeParse({ amount: '1:00', reason: ' ' });
		expect(error?.issues.map(({ path }) => path.join('.'))).toEqual(['way', 'reason']);
	});

	it.each([-2 * hour, 25 * 60_000, 49 * hour + 5 * 60_000, -5000])('is written as it is typed: %i', (ms) => {
		const way = ms < 0 ? 'earlier' : 'later';
		expect(clockCorrectionForm.parse({ way, amount: amountText(ms), reason }).shiftMs).toBe(ms);
	});
});
