import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mostApart, type Measured } from './most-apart';

const minute = 60_000;

function measured(...readings: readonly (readonly [minutes: number, celsius: number])[]): Measured {
	return {
		times: Float64Array.from(readings, ([minutes]) => minutes * minute),
		celsius: Float64Array.from(readings, ([, celsius]) => celsius)
	};
}

const flat = measured([0, 2], [10, 2], [20, 2], [30, 2]);

// Worked by hand, temperature being linear between readings.
describe('the most that two loggers are apart', () => {
	it.each([
		['at a reading of both', flat, measured([0, 2], [10, 5], [20, 3], [30, 2]), 10, 3, (3 + 1) / 4, 4],
		[
			'below as well as above',
			flat,
			measured([0, 2], [10, 1], [20, -2], [30, 3]),
			20,
			-4,
			(1 + 4 + 1) / 4,
			4
		],
		['the first of equals', flat, measured([0, 3], [10, 1], [20, 3], [30, 1]), 0, 1, 1, 4],
		[
			'between the readings of the first, where the second read',
			measured([0, 0], [20, 4]),
			measured([5, 1], [15, 8], [20, 4]),
			15,
			5,
			// At 5, 15 and 20 min the first is at 1, 3 and 4 °C.
			5 / 3,
			3
		],
		[
			'only while both ran',
			measured([0, 9], [10, 2], [20, 2]),
			measured([10, 2.5], [20, 2], [30, 20]),
			10,
			0.5,
			0.25,
			2
		]
	])('%s', (_, first, second, atMinutes, difference, mean, compared) => {
		const found = mostApart(first, second);
		expect(found?.atMs).toBe(atMinutes * minute);
		expect(found?.differenceCelsius).toBeCloseTo(difference, 12);
		expect(found?.meanCelsius).toBeCloseTo(mean, 12);
		expect(found?.compared).toBe(compared);
	});

	it('is nothing where they never ran at once, or one has no readings', () => {
		expect(mostApart(flat, measured([31, 2], [41, 9]))).toBeNull();
		expect(mostApart(flat, measured())).toBeNull();
		expect(mostApart(measured(), flat)).toBeNull();
	});

	it('is not looked for in a gap of either', () => {
		// Every ten minutes, then two hours of silence, over which a line would pass 12 °C.
		const silent = measured([0, 2], [10, 2], [20, 2], [140, 22], [150, 2]);
		const watching = measured([0, 2], [10, 3], [20, 2], [80, 2], [140, 22], [150, 2]);
		expect(mostApart(silent, watching)?.atMs).toBe(10 * minute);
	});

	it('is looked for within the custody window alone, both ends included', () => {
		const second = measured([0, 50], [10, 2], [20, 3], [30, 60]);
		const within = { fromMs: 10 * minute, toMs: 20 * minute };
		expect(mostApart(flat, second, within)).toMatchObject({
			atMs: 20 * minute,
			differenceCelsius: 1,
			compared: 2
		});
	});

	it('changes its sign and nothing else when the two change places', () => {
		const readings = fc.uniqueArray(fc.integer({ min: 0, max: 30 }), { minLength: 2, maxLength: 12 });
		fc.assert(
			fc.property(readings, readings, (a, b) => {
				const of = (minutes: number[], factor: number) =>
					measured(...[...minutes].sort((x, y) => x - y).map((m) => [m, (m * factor) % 7] as const));
				const there = mostApart(of(a, 3), of(b, 5));
				const back = mostApart(of(b, 5), of(a, 3));
				expect(back?.atMs).toBe(there?.atMs);
				expect(back?.differenceCelsius ?? null).toEqual(there && 0 - there.differenceCelsius);
			})
		);
	});
});
