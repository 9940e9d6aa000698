import { describe, expect, it } from 'vitest';
import { gapsIn, isGap, usualIntervalMs } from './interval';
import { beaverTimes } from '../../../../tests/accuracy/beaver';

const minute = 60_000;
const every = (minutes: number, count: number) =>
	Array.from({ length: count }, (_, i) => i * minutes * minute);

describe('usual interval', () => {
	it('is the most frequent step', () => {
		expect(usualIntervalMs(every(10, 20))).toBe(10 * minute);
		expect(usualIntervalMs([0, 5, 15, 25, 90].map((m) => m * minute))).toBe(10 * minute);
	});

	it('is the shorter of two equally frequent steps, so that a gap is not missed', () => {
		expect(usualIntervalMs([0, 30, 50].map((m) => m * minute))).toBe(20 * minute);
		expect(usualIntervalMs([0, 20, 50].map((m) => m * minute))).toBe(20 * minute);
	});

	it('is none where there is no step', () => {
		expect(usualIntervalMs([])).toBe(0);
		expect(usualIntervalMs([7])).toBe(0);
	});

	it('is ten minutes in the beaver telemetry, one reading missing', () => {
		// Source: Reynolds (1994), R datasets::beaver1: every 10 min, 22:20 missing.
		expect(beaverTimes).toHaveLength(114);
		expect(usualIntervalMs(beaverTimes)).toBe(10 * minute);
		expect(gapsIn(beaverTimes)).toEqual([]);
	});
});

describe('gaps', () => {
	it('are longer than three usual intervals and than half an hour, both strictly', () => {
		expect(isGap(30 * minute, 5 * minute)).toBe(false);
		expect(isGap(30 * minute + 1, 5 * minute)).toBe(true);
		expect(isGap(45 * minute, 15 * minute)).toBe(false);
		expect(isGap(45 * minute + 1, 15 * minute)).toBe(true);
		expect(isGap(20 * minute, minute)).toBe(false);
	});

	it('are found where they stand, with both ends', () => {
		const times = [0, 10, 20, 150, 160].map((m) => m * minute);
		expect(gapsIn(times)).toEqual([{ index: 2, fromMs: 20 * minute, toMs: 150 * minute }]);
	});

	it('are none in a regular trace, however long its interval', () => {
		expect(gapsIn(every(60, 50))).toEqual([]);
	});
});
