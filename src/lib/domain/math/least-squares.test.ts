import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { leastSquares } from './least-squares';

const ones = [1, 1, 1, 1];

describe('least squares', () => {
	it('finds the line of a worked example', () => {
		// Source: the normal equations by hand: x 0 1 2 3, y 1 3 2 5 give slope 11/10 and level 11/10.
		const [level, slope] = leastSquares([ones, [0, 1, 2, 3]], [1, 3, 2, 5]) ?? [];
		expect(level).toBeCloseTo(1.1, 13);
		expect(slope).toBeCloseTo(1.1, 13);
	});

	it('meets every value where there are as many columns', () => {
		const columns = [ones.slice(0, 3), [0, 1, 2], [0, 1, 4]];
		const found = leastSquares(columns, [2, 3, 8]) ?? [];
		[2, -1, 2].forEach((value, i) => expect(found[i]).toBeCloseTo(value, 12));
	});

	it.each([
		['a column twice', [ones, ones]],
		['a column of nothing', [ones, [0, 0, 0, 0]]],
		['a sum of the others', [ones, [0, 1, 2, 3], [1, 2, 3, 4]]],
		['more columns than values', [[1], [2]]]
	])('says nothing of %s', (_, columns) => {
		expect(leastSquares(columns, [1, 2, 3, 4].slice(0, columns[0]?.length))).toBeNull();
	});

	it('leaves a rest at right angles to every column', () => {
		const entry = fc.double({ min: -100, max: 100, noNaN: true });
		const five = fc.array(entry, { minLength: 5, maxLength: 5 });
		fc.assert(
			fc.property(five, five, (column, values) => {
				const columns = [[1, 1, 1, 1, 1], column];
				const found = leastSquares(columns, values);
				if (!found) return;
				const rest = values.map(
					(value, i) => value - (found[0] ?? NaN) - (found[1] ?? NaN) * (column[i] ?? NaN)
				);
				for (const one of columns) {
					const along = rest.reduce((sum, value, i) => sum + value * (one[i] ?? NaN), 0);
					expect(Math.abs(along)).toBeLessThan(1e-7);
				}
			})
		);
	});
});
