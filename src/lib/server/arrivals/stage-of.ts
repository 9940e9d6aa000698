import type { Stage } from '../../schemas/docket';

/** What a docket's stage follows from. */
export interface StageFacts {
	arrivedAt: Date | null;
	decidedAt: Date | null;
	isHeld: boolean;
}

/** Where a docket stands; a decision ends a hold. A cancelled one stands nowhere and is not asked about. */
export function stageOf({ arrivedAt, decidedAt, isHeld }: StageFacts): Stage {
	if (decidedAt) return 'done';
	if (isHeld) return 'on-hold';
	return arrivedAt ? 'at-the-door' : 'expected';
}
