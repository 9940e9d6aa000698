import { describe, expect, it } from 'vitest';
import type { SeriesView } from '../../schemas/docket';
import { pointsOf } from './points';
import { readoutAt } from './readings';
import { spanOf, wholeOf, worstIndex } from './trace-view';

const first = Date.parse('2026-04-02T07:20:00Z');
const series: SeriesView = {
	traceId: 't3',
	label: 'L3',
	isGoverning: true,
	fromAt: '2026-04-02T07:20:00Z',
	toAt: '2026-04-02T07:30:00Z',
	times: [first, first + 600_000],
	celsius: [10.4, null],
	remainingHours: [290.4, null],
	remainingLowHours: [280.8, null],
	remainingHighHours: [295.2, null],
	totalReadings: 2
};
const points = pointsOf(series);
const reader = {
	label: 'L3',
	assessment: null,
	zone: 'Europe/Berlin',
	unit: 'celsius',
	locale: 'en'
} as const;

describe('the line above the chart', () => {
	it('gives instant with its zone, reading and life with its range', () => {
		expect(readoutAt({ ...reader, point: points.at(0) })).toEqual([
			{ label: 'At the line', value: 'Thu 2 Apr 09:20 CEST' },
			{ label: 'L3', value: '10.4 °C' },
			{ label: 'Life left then', value: '12.1 d', aside: '11.7–12.3' }
		]);
	});

	it('follows the reader’s unit', () => {
		expect(readoutAt({ ...reader, unit: 'fahrenheit', point: points.at(0) })[1]?.value).toBe('50.7 °F');
	});

	it('says that there is no reading in a gap', () => {
		expect(readoutAt({ ...reader, point: points.at(1) }).map((one) => one.value)).toEqual([
			'Thu 2 Apr 09:30 CEST',
			'no reading'
		]);
	});
});

describe('where the crosshair begins', () => {
	it('is the last reading where nothing went wrong', () => {
		expect(worstIndex(series.times, null)).toBe(1);
		expect(wholeOf([series], null)).toEqual({ fromMs: first, toMs: first + 600_000 });
	});

	it('keeps the whole trip when finer readings of a part come in', () => {
		expect(spanOf({ fromMs: 0, toMs: 100 }, { fromMs: 40, toMs: 60 })).toEqual({ fromMs: 0, toMs: 100 });
		expect(spanOf(undefined, { fromMs: 40, toMs: 60 })).toEqual({ fromMs: 40, toMs: 60 });
	});
});
