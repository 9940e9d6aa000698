import { describe, expect, it } from 'vitest';
import { dayInOrder, orderFromDays, orderNamedIn, type OpenDay } from './date-order';

const day = (a: number, b: number, c: number): OpenDay => ({ a, b, c, rows: 10 });

describe('the order of day and month', () => {
	it('is settled by any day over 12', () => {
		expect(orderFromDays([day(3, 4, 2026), day(13, 4, 2026)])).toEqual({
			possible: ['dmy'],
			by: 'day-over-12'
		});
		expect(orderFromDays([day(4, 13, 2026)])).toEqual({ possible: ['mdy'], by: 'day-over-12' });
	});

	it('is settled by continuity where one order leaps by months', () => {
		expect(orderFromDays([day(3, 4, 2026), day(4, 4, 2026), day(5, 4, 2026)])).toEqual({
			possible: ['dmy'],
			by: 'continuity'
		});
		expect(orderFromDays([day(4, 3, 2026), day(4, 4, 2026)])).toEqual({
			possible: ['mdy'],
			by: 'continuity'
		});
	});

	it('stays open where all rows are on one day', () => {
		expect(orderFromDays([day(3, 4, 2026)])).toEqual({ possible: ['dmy', 'mdy'], by: null });
	});

	it('needs no decision where both orders give the same day', () => {
		expect(orderFromDays([day(5, 5, 2026)])).toMatchObject({ by: 'day-over-12' });
	});

	it('takes two-digit years first or last', () => {
		expect(orderFromDays([day(26, 3, 30), day(26, 3, 31), day(26, 4, 1)]).possible).toEqual(['ymd']);
		expect(orderFromDays([day(30, 3, 26), day(31, 3, 26), day(1, 4, 26)]).possible).toEqual(['dmy']);
	});

	it('outlives a few damaged dates', () => {
		const days = [day(13, 4, 2026), day(14, 4, 2026), day(14, 14, 2026)];
		expect(orderFromDays(days).possible).toEqual(['dmy']);
	});

	it('is read from a spelled-out format', () => {
		expect(
			['Date (DD/MM/YYYY)', 'MM/DD/YY', 'TT.MM.JJJJ', 'yyyy-MM-dd', 'JJ/MM/AAAA', 'Date'].map(orderNamedIn)
		).toEqual(['dmy', 'mdy', 'dmy', 'ymd', 'dmy', null]);
	});

	it('knows leap days', () => {
		expect(dayInOrder(29, 2, 2024, 'dmy')).toBe(Date.UTC(2024, 1, 29) / 86_400_000);
		expect(dayInOrder(29, 2, 2026, 'dmy')).toBeNaN();
	});
});
