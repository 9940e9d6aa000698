import type { MarkKind } from '$lib/components/ui/mark';
import type { AssessmentView, DocketView, Verdict } from '$lib/schemas/docket';
import { partQuantities } from '$lib/domain/receiving/quantities';
import type { Outcome } from '$lib/domain/receiving/recommendation';
import { addUp, lifeHours } from '$lib/format';
import { partText } from '$lib/messages/en/line-groups';

/** Each outcome with its mark and word. */
export const outcomeWords: Record<Outcome, { mark: MarkKind; word: string }> = {
	accept: { mark: 'accept', word: 'Accept' },
	conditions: { mark: 'conditions', word: 'Accept with conditions' },
	hold: { mark: 'hold', word: 'Hold' },
	reject: { mark: 'reject', word: 'Reject' }
};

const stageVerdicts: Record<Exclude<DocketView['stage'], 'done'>, { mark: MarkKind; word: string }> = {
	expected: { mark: 'expected', word: 'Expected' },
	'at-the-door': { mark: 'at-the-door', word: 'At the door' },
	'on-hold': { mark: 'hold', word: 'On hold' }
};

const doneVerdicts: Record<Verdict, { mark: MarkKind | null; word: string }> = {
	accepted: { mark: 'accept', word: 'Accepted' },
	conditions: { mark: 'conditions', word: 'Accepted with conditions' },
	// No tick over a part: the quantities say it.
	part: { mark: null, word: 'Accepted in part' },
	rejected: { mark: 'reject', word: 'Rejected' }
};

/** "12 pallets in, 4 refused": what a partly taken load comes to, in its own units. */
export function quantitiesOf(docket: Pick<DocketView, 'lines'>): string {
	return partText(partQuantities(docket.lines));
}

export function verdictOf(docket: DocketView): { mark: MarkKind | null; word: string } {
	if (docket.stage !== 'done') return stageVerdicts[docket.stage];
	const verdict = docket.verdict ?? 'accepted';
	return verdict === 'part' ? { mark: null, word: quantitiesOf(docket) } : doneVerdicts[verdict];
}

/** The line whose low is lowest: it decides. */
export function shortestLine(docket: DocketView): DocketView['lines'][number] | null {
	const known = docket.lines.filter((line) => line.remainingHours !== null);
	return known.reduce<DocketView['lines'][number] | null>(
		(least, line) =>
			least?.remainingHours && line.remainingHours && least.remainingHours.low <= line.remainingHours.low
				? least
				: line,
		null
	);
}

/** The assessment the page's chart and tables speak of: of the shortest line's governing logger. */
export function leadingAssessment(docket: DocketView): DocketView['assessments'][number] | null {
	const line = shortestLine(docket);
	return (
		docket.assessments.find((assessment) => assessment.isGoverning && assessment.lineId === line?.id) ??
		docket.assessments[0] ??
		null
	);
}

/** Leg letters: A, B … Z, then AA. */
export function legLetter(ordinal: number): string {
	const index = ordinal - 1;
	return index < 26
		? String.fromCharCode(65 + index)
		: `${legLetter(Math.floor(index / 26))}${legLetter((index % 26) + 1)}`;
}

export function lifeUnit(referenceCelsius: number): string {
	return `h at ${lifeHours(referenceCelsius, 'en').replace(/\.0$/, '')} °C`;
}

/** The over-use of all legs as the table prints it, so that index, table and counterfoil never disagree. */
export function printedOverUse(legs: AssessmentView['legs']): {
	warm: number[];
	late: number[];
	over: number[];
	totalOver: number;
	totalWarm: number;
	totalLate: number;
} {
	const warm = addUp(
		legs.map((leg) => leg.tooWarmHours ?? 0),
		1
	);
	const late = addUp(
		legs.map((leg) => leg.tooLateHours ?? 0),
		1
	);
	const over = legs.map((_, index) => (warm[index] ?? 0) + (late[index] ?? 0));
	const total = (values: number[]) => values.reduce((sum, value) => sum + value, 0);
	return { warm, late, over, totalOver: total(over), totalWarm: total(warm), totalLate: total(late) };
}

/** Why a line has no life figure, in a few words; null where it has one. */
export function lifeNotKnown(docket: DocketView, line: DocketView['lines'][number]): string | null {
	if (line.remainingHours) return null;
	// A full life of nothing is what a line without a spec in force has.
	if (line.fullLifeHours === 0) return 'no spec was in force';
	return docket.loggers.some((logger) => logger.traceId !== null) ? 'no reading in custody' : 'no read yet';
}

/** What the range of a line's life is made of, by the assessment that governs it. */
export function rangePartsOf({ assessments }: DocketView, lineId: string): AssessmentView['rangeParts'] {
	return assessments.find((one) => one.lineId === lineId && one.isGoverning)?.rangeParts;
}
