import { compensatedSum } from './sum';

/** Columns nearer to a sum of the others than this say nothing of their own. */
const dependentBelow = 1e-9;

/**
 * Coefficients of the columns whose sum comes nearest to `values` by least squares; null where a column depends on
 * the others. Method: modified Gram–Schmidt on the columns and the values together, then back substitution.
 * Source: Golub & Van Loan, Matrix Computations, 5.2.8 and 5.3.5.
 */
export function leastSquares(
	columns: readonly (readonly number[])[],
	values: readonly number[]
): number[] | null {
	const basis: number[][] = [];
	const upper: number[][] = [];
	let rest = [...values];
	const projected: number[] = [];
	for (const column of columns) {
		let left = [...column];
		const factors: number[] = [];
		for (const direction of basis) {
			const factor = dot(direction, left);
			factors.push(factor);
			left = minus(left, direction, factor);
		}
		const length = Math.sqrt(dot(left, left));
		if (!(length > dependentBelow * Math.sqrt(dot(column, column)))) return null;
		const direction = left.map((entry) => entry / length);
		const onto = dot(direction, rest);
		rest = minus(rest, direction, onto);
		basis.push(direction);
		upper.push([...factors, length]);
		projected.push(onto);
	}
	return substituted(upper, projected);
}

/** Solves the triangle from its last row up; `upper[j]` is column j down to the diagonal. */
function substituted(upper: readonly (readonly number[])[], projected: readonly number[]): number[] {
	const coefficients = new Array<number>(projected.length).fill(0);
	for (let row = projected.length - 1; row >= 0; row--) {
		let value = projected[row] as number;
		for (let j = row + 1; j < projected.length; j++)
			value -= (upper[j]?.[row] as number) * (coefficients[j] as number);
		coefficients[row] = value / (upper[row]?.[row] as number);
	}
	return coefficients;
}

function dot(a: readonly number[], b: readonly number[]): number {
	return compensatedSum(a.map((entry, i) => entry * (b[i] as number)));
}

function minus(from: readonly number[], direction: readonly number[], factor: number): number[] {
	return from.map((entry, i) => entry - factor * (direction[i] as number));
}
