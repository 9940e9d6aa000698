import { describe, expect, it } from 'vitest';
import { celsiusNear } from './air-at-pulp';

const minute = 60_000;
const trace = {
	...{ unit: 'celsius' as const, decimals: 1 },
	times: Float64Array.from([0, 10, 20, 120], (at) => at * minute),
	scaled: Int32Array.from([10, 20, 30, 90])
};

describe('the air when a probe was in', () => {
	it.each([
		['the nearest reading', 14, 2],
		['the one at that moment', 20, 3],
		['the last before a gap, up to half an hour', 50, 3],
		['none where the nearest is older', 70, null],
		['the first, shortly before the trace', -5, 1],
		['none long after', 151, null]
	])('is %s', (_what, at, celsius) => {
		expect(celsiusNear(trace, at * minute)).toBe(celsius);
	});
});
