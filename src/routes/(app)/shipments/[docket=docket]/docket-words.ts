import type { MarkKind } from '$lib/components/ui/mark';
import type { DocketView, Verdict } from '$lib/schemas/docket';
import { partQuantities } from '$lib/domain/receiving/quantities';
import type { Outcome } from '$lib/domain/receiving/recommendation';
import { count, lifeHours } from '$lib/format';

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
export function quantitiesOf(docket: Pick<DocketView, 'lines'>, locale = 'en'): string {
	const { unit, taken, refused } = partQuantities(docket.lines);
	return `${count(taken, locale)} ${unit} in, ${count(refused, locale)} refused`;
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
