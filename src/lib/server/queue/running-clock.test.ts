import { describe, expect, it } from 'vitest';
import { runningClock } from './running-clock';

const at = (text: string) => new Date(`2026-04-03T${text}:00Z`);
const refuse = {
	name: 'Reject the goods',
	basis: 'Terms of sale, from arrival',
	noticeId: null,
	startsAt: at('04:00'),
	deadlineAt: at('12:00')
};
const life = { hours: 250, lowHours: 243, highHours: 252, neededHours: 240, fullHours: 336 };

describe('the clock of a waiting docket', () => {
	it('is the one that runs out first', () => {
		const notice = { ...refuse, noticeId: 'n', deadlineAt: at('10:00') };
		expect(runningClock([refuse, notice], null, at('04:00'))).toMatchObject({
			kind: 'notice',
			deadlineAt: '2026-04-03T10:00:00.000Z'
		});
	});

	it('is the life where the low falls under the need before any other runs out', () => {
		expect(runningClock([refuse], life, at('04:00'))).toMatchObject({
			kind: 'life',
			startsAt: '2026-04-03T04:00:00.000Z',
			deadlineAt: '2026-04-03T07:00:00.000Z'
		});
	});

	it('is not the life where the low is short already: nothing is left to run down', () => {
		expect(runningClock([refuse], { ...life, lowHours: 239 }, at('04:00'))?.kind).toBe('reject');
	});

	it('is none where nothing runs', () => {
		expect(runningClock([], null, at('04:00'))).toBeNull();
		expect(runningClock([], life, null)).toBeNull();
	});

	it('is the hold where what is awaited is due before any other runs out', () => {
		const hold = { putAt: at('05:00'), untilAt: at('08:00'), awaited: 'a count' };
		expect(runningClock([refuse], null, at('04:00'), [hold])).toMatchObject({
			kind: 'hold',
			startsAt: '2026-04-03T05:00:00.000Z',
			deadlineAt: '2026-04-03T08:00:00.000Z',
			basis: 'awaits a count'
		});
		const open = { ...hold, untilAt: null };
		expect(runningClock([refuse], null, at('04:00'), [open])?.kind).toBe('reject');
	});
});
