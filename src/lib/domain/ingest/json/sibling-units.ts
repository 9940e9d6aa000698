import { wholeUnitOf } from '../cells/unit-words';

/** A column that holds only a unit names it for its neighbours under the same parent. */
export function siblingUnits(
	header: readonly string[],
	count: number,
	cells: (row: number) => string[]
): string[] {
	const units = header.map(() => '');
	const first = count > 0 ? cells(0) : [];
	const last = count > 0 ? cells(count - 1) : [];
	const parentOf = (path: string): string => path.split('.').slice(0, -1).join('.');
	first.forEach((cell, i) => {
		if (wholeUnitOf(cell) === null || /^[\d.-]/.test(cell) || last[i] !== cell) return;
		const parent = parentOf(header[i] ?? '');
		header.forEach((path, k) => {
			if (k !== i && parentOf(path) === parent) units[k] = cell;
		});
	});
	return units;
}
