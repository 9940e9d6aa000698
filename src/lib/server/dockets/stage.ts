import type { Stage, Verdict } from '../../schemas/docket';
import type { Outcome } from '../../domain/receiving/recommendation';

interface Facts {
	arrivedAt: Date | null;
	decidedAt: Date | null;
	isHeld: boolean;
}

/** Where a docket stands follows from what happened to it. */
export function stageOf({ arrivedAt, decidedAt, isHeld }: Facts): Stage {
	if (decidedAt) return 'done';
	if (!arrivedAt) return 'expected';
	return isHeld ? 'on-hold' : 'at-the-door';
}

/** How a signed docket ended: goods that go in part, or wait in part, make a `part`, whatever the conditions on the rest. */
export function verdictOf(outcomes: readonly Outcome[]): Verdict {
	const refused = outcomes.filter((outcome) => outcome === 'reject').length;
	if (refused === outcomes.length) return 'rejected';
	if (refused > 0 || outcomes.includes('hold')) return 'part';
	return outcomes.every((outcome) => outcome === 'accept') ? 'accepted' : 'conditions';
}
