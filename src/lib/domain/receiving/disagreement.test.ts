import { describe, expect, it } from 'vitest';
import { buildTrace, minuteMs, startMs } from '../../../../tests/accuracy/build';
import { disagreementOf } from './disagreement';

const logger = (serial: string, celsius: readonly number[], everyMinutes = 10, fromMs = startMs) => ({
	serial,
	trace: buildTrace(celsius, everyMinutes, fromMs),
	accuracyCelsius: 0.5
});

describe('two loggers of one load', () => {
	it('are as far apart as their readings are on average', () => {
		const found = disagreementOf(logger('a', [1, 2, 3]), logger('b', [2, 3, 5]));
		expect(found?.differenceCelsius).toBeCloseTo(4 / 3, 12);
		expect(found?.allowedCelsius).toBe(1);
		expect(found?.serials).toEqual(['a', 'b']);
	});

	it('are compared on the line between readings where their clocks do not tick together', () => {
		const found = disagreementOf(
			logger('a', [1, 1, 1], 10, startMs + 5 * minuteMs),
			logger('b', [0, 2, 4, 6])
		);
		// At 5, 15, 25 min the other stands at 1, 3, 5.
		expect(found?.differenceCelsius).toBeCloseTo(2, 12);
	});

	it('are compared only while both ran', () => {
		const found = disagreementOf(logger('a', [1, 1, 9, 9]), logger('b', [1, 1]));
		expect(found?.differenceCelsius).toBe(0);
	});

	it('do not disagree by differences that come and go', () => {
		expect(disagreementOf(logger('a', [1, 3, 1, 3]), logger('b', [3, 1, 3, 1]))?.differenceCelsius).toBe(0);
	});

	it('say nothing where they never ran at once', () => {
		expect(
			disagreementOf(logger('a', [1, 1]), logger('b', [1, 1], 10, startMs + 1000 * minuteMs))
		).toBeNull();
		expect(disagreementOf(logger('a', []), logger('b', [1]))).toBeNull();
	});
});
