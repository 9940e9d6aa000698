import type { Evidence } from './evidence';
import { grades, type Grade, type Reason, type Recommendation, type Recommended } from './recommendation';
import { rules } from './rules';

/**
 * What the engine recommends for one line, and every reason why, the gravest first. The strictest reason decides.
 * `accept` is the absence of a reason against, not a statement about safety.
 */
export function recommend(evidence: Evidence): Recommendation {
	const reasons = rules.flatMap((rule) => rule.find(evidence));
	return { recommended: recommendedBy(reasons), reasons: gravestFirst(reasons) };
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
