import type { Assessment, Range } from '$lib/domain/receiving/assessment';
import type { Stretch } from './trim-ends';
import { assessWhole, type WholeTrace } from './whole-trace';

/** What a trim would make of one line, before it is sent. */
export interface Foretold {
	line: number;
	lot: string;
	now: LifeFigures;
	/** Null where too few readings would be left to assess. */
	then: LifeFigures | null;
	neededHours: number;
	/** The low is carried over the need or under it: the recommendation may move, and then a second person decides. */
	isNeedCrossed: boolean;
}

export interface LifeFigures {
	usedHours: number;
	remainingHours: Range;
	excursions: number;
}

/** For each line that the trace was assessed for, by the engine that will store it. */
export function foretell(whole: WholeTrace, stretch: Stretch): Foretold[] {
	return whole.assessed.flatMap((basis) => {
		const now = assessWhole(whole, basis);
		if (typeof now === 'string') return [];
		const then = assessWhole(whole, basis, [...basis.trims, stretch]);
		const next = typeof then === 'string' ? null : figuresOf(then);
		const { neededHours } = now;
		const isMet = (figures: LifeFigures) => figures.remainingHours.low >= neededHours;
		return {
			line: basis.line,
			lot: basis.lot,
			now: figuresOf(now),
			then: next,
			neededHours,
			isNeedCrossed: next !== null && isMet(next) !== isMet(figuresOf(now))
		};
	});
}

function figuresOf({ usedHours, remainingHours, excursions }: Assessment): LifeFigures {
	return { usedHours: usedHours.value, remainingHours, excursions: excursions.length };
}

/** Whether part of the stretch is left out already: the server would not count those hours twice. */
export function overlapsTrim(whole: WholeTrace, stretch: Stretch): boolean {
	return whole.assessed.some(({ trims }) =>
		trims.some(({ fromMs, toMs }) => fromMs < stretch.toMs && toMs > stretch.fromMs)
	);
}
