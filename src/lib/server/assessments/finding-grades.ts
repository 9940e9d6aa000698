import {
	settableGrades,
	type FindingGrades,
	type SettableGrade
} from '../../domain/receiving/recommendation';
import { settableFindings } from '../../domain/receiving/settable-findings';

function isSettable(grade: unknown): grade is SettableGrade {
	return settableGrades.some((one) => one === grade);
}

/** The grades a JSON column holds by code; what is no grade says nothing. */
export function storedGrades(stored: unknown): FindingGrades {
	const parsed: unknown = typeof stored === 'string' ? JSON.parse(stored) : stored;
	if (typeof parsed !== 'object' || parsed === null) return {};
	return Object.fromEntries(Object.entries(parsed).filter(([, grade]) => isSettable(grade)));
}

/** The same grades in the order of the rules: a database gives the keys of JSON back in an order of its own. */
export function inOrder(grades: FindingGrades): FindingGrades {
	return Object.fromEntries(
		settableFindings.flatMap(({ code }) => (grades[code] === undefined ? [] : [[code, grades[code]]]))
	);
}

/** What a line's findings are graded by: its product's grades, and before them its lane's. */
export function gradesOf(
	product: { findingGrades: unknown } | null,
	lane: { findingGrades: unknown } | null
): FindingGrades {
	return { ...storedGrades(product?.findingGrades), ...storedGrades(lane?.findingGrades) };
}
