import {
	settableGrades,
	type FindingGrades,
	type SettableGrade
} from '../../domain/receiving/recommendation';

function isSettable(grade: unknown): grade is SettableGrade {
	return settableGrades.some((one) => one === grade);
}

/** The grades a JSON column holds by code; what is no grade says nothing. */
export function storedGrades(stored: unknown): FindingGrades {
	const parsed: unknown = typeof stored === 'string' ? JSON.parse(stored) : stored;
	if (typeof parsed !== 'object' || parsed === null) return {};
	return Object.fromEntries(Object.entries(parsed).filter(([, grade]) => isSettable(grade)));
}

/** What a line's findings are graded by: its product's grades, and before them its lane's. */
export function gradesOf(
	product: { findingGrades: unknown } | null,
	lane: { findingGrades: unknown } | null
): FindingGrades {
	return { ...storedGrades(product?.findingGrades), ...storedGrades(lane?.findingGrades) };
}
