import { describe, expect, it } from 'vitest';
import { intervalBetween, stepsOf } from './row-interval';

const context = { uploadedMs: 0, siteZone: 'UTC', journeyFromMs: null, journeyToMs: null, answers: {} };
const silent = { intervalMinutes: null, intervalsNamed: [] };
const rows = (count: number) => ({ count, size: 1, isCount: false });
const minutes = (n: number): number => n * 60_000;

describe('steps of running numbers', () => {
	it.each([
		[[0, 10, 20, 30], 3, 10],
		[[30, 20, 10, 0], 3, 10],
		[[0, 600, 1200, 2400], 4, 600],
		[[5], 0, 1]
	])('%j are %d of %d', (counts, count, size) => {
		expect(stepsOf(Float64Array.from(counts))).toEqual({ count, size, isCount: true });
	});
});

describe('the interval of rows', () => {
	it('is the answer before all else', () => {
		const answers = { intervalSeconds: 300 };
		const stated = { intervalMinutes: 10, intervalsNamed: [10] };
		expect(intervalBetween(rows(9), stated, minutes(90), { ...context, answers })).toEqual({
			seconds: 300,
			because: 'answer'
		});
	});

	it('is what the file states before what start and end give', () => {
		const stated = { intervalMinutes: 10, intervalsNamed: [10] };
		expect(intervalBetween(rows(9), stated, minutes(45), context)).toEqual({
			seconds: 600,
			because: 'preamble'
		});
	});

	it.each([
		['start and last reading', 39, 390, 600],
		['start and a stop some minutes after the last reading', 39, 396, 600],
		['a start and an end without their seconds', 39, 389.5, 600],
		['an hour each', 24, 24 * 60, 3600]
	])('lies between %s', (_, count, spanMinutes, seconds) => {
		expect(intervalBetween(rows(count), silent, minutes(spanMinutes), context)).toEqual({
			seconds,
			because: 'declared'
		});
	});

	it('is asked about where start and end give none, or two', () => {
		expect(intervalBetween(rows(39), silent, minutes(500), context)).toEqual({ offered: [300, 600, 900] });
		expect(intervalBetween(rows(1), silent, minutes(10), context)).toMatchObject({
			offered: expect.arrayContaining([300, 600]) as number[]
		});
		expect(intervalBetween(rows(39), silent, null, context)).toEqual({ offered: [300, 600, 900] });
	});

	it('is asked about between those the file names', () => {
		const stated = { intervalMinutes: null, intervalsNamed: [10, 30] };
		expect(intervalBetween(rows(39), stated, null, context)).toEqual({ offered: [600, 1800] });
	});

	it('of counts is a step of seconds, minutes, hours, as start and end say', () => {
		const steps = { count: 19, size: 10, isCount: true };
		expect(intervalBetween(steps, silent, minutes(190), context)).toEqual({
			seconds: 600,
			because: 'declared'
		});
		expect(intervalBetween(steps, silent, 190_000, context)).toEqual({ seconds: 10, because: 'declared' });
		expect(intervalBetween(steps, silent, null, context)).toEqual({ offered: [10, 600, 36_000, 864_000] });
	});
});
