import type { Evidence } from './evidence';
import {
	grades,
	type FindingGrades,
	type Grade,
	type Reason,
	type Recommendation,
	type Recommended
} from './recommendation';
import { rules, type Rule } from './rules';

/**
 * What the engine recommends for one line, and every reason why, the gravest first. The strictest reason decides.
 * Product and lane may set the grade of a finding where the table of rules says so, never of life or of a stop.
 * `accept` is the absence of a reason against, not a statement about safety.
 */
export function recommend(evidence: Evidence): Recommendation {
	const set = evidence.grades ?? {};
	const reasons = rules.flatMap((rule) => rule.find(evidence).map((reason) => graded(rule, reason, set)));
	return { recommended: recommendedBy(reasons), reasons: gravestFirst(reasons) };
}

function graded({ isSettable }: Rule, reason: Reason, set: FindingGrades): Reason {
	const grade = isSettable ? set[reason.code] : undefined;
	return grade === undefined ? reason : { ...reason, grade };
}

function recommendedBy(reasons: readonly Reason[]): Recommended {
	if (reasons.some((reason) => reason.grade === 'reject')) return 'reject';
	return reasons.some((reason) => reason.grade === 'hold') ? 'hold' : 'accept';
}

/** Within a grade the rules' own order stays. */
function gravestFirst(reasons: readonly Reason[]): Reason[] {
	return [...reasons].sort((a, b) => rank(b.grade) - rank(a.grade));
}

function rank(grade: Grade): number {
	return grades.indexOf(grade);
}
