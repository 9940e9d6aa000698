import type { Content } from 'pdfmake/interfaces';
import { decidedGroups } from '../../../domain/receiving/line-groups';
import type { DocketLineView } from '../../../schemas/docket';
import { counterfoilTop, hairline, linesShown, pair } from './counterfoil-parts';
import type { Draft } from './draft';
import { lifeEnds } from './life-ends';
import { lifeRule } from './life-rule';
import { outcomeMark, outcomeWord, verdictOf } from './marks';
import { palette, sizePoints } from './palette';
import { days } from './text';
import { figure, label, sentence, words } from './type-styles';

/** Page one's counterfoil: verdict, outcome by line, life left against the need, when it ends. */
export function firstCounterfoil(draft: Draft): Content[] {
	const { docket, sheet } = draft;
	const verdict = verdictOf(docket);
	return [
		...counterfoilTop(draft),
		...(verdict.mark ? [outcomeMark(verdict.mark, 19)] : []),
		words(verdict.word, { size: sizePoints.verdict, bold: true, margin: [0, 8, 0, 0], lineHeight: 0.95 }),
		hairline(sheet.stubWidth, 9),
		...outcomes(docket.lines),
		hairline(sheet.stubWidth, 6),
		...(draft.leadLine === null
			? [label('Life left'), words('Not known', { size: 12, bold: true })]
			: lifeLeft(draft.leadLine, sheet.stubWidth)),
		...lifeEnds(draft)
	];
}

function outcomes(lines: readonly DocketLineView[]): Content[] {
	const groups = lines.flatMap((line) =>
		decidedGroups(line).map(({ outcome, cases }) => ({ line, outcome, cases }))
	);
	const rows = groups.slice(0, linesShown).map(({ line, outcome, cases }): Content => {
		const word = outcome === 'conditions' ? 'With conditions' : outcomeWord(outcome);
		return {
			columns: [
				{ ...sentence(String(line.ordinal), { size: sizePoints.table }), width: 11 },
				{ ...outcomeMark(outcome, 8), width: 14, margin: [0, 1.6, 0, 0] },
				{ ...words(line.groups ? `${word}, ${cases}` : word, { size: sizePoints.table }), width: '*' }
			],
			margin: [0, 0.8, 0, 0.8]
		};
	});
	const more = groups.length - linesShown;
	return more > 0 ? [...rows, sentence(`and ${more} more, see Dispositions`)] : rows;
}

function lifeLeft(line: DocketLineView, widthPoints: number): Content[] {
	const life = line.remainingHours;
	if (life === null) return [];
	const shortHours = line.neededHours - life.low;
	const rule = lifeRule(line, widthPoints);
	const inDays = (hours: number): Content => ({
		text: [figure(days(hours)), label(' d', { color: palette.ink })]
	});
	return [
		label(`Life left, line ${line.ordinal}`),
		{
			text: [
				figure(days(life.value), { size: sizePoints.life }),
				label(' d', { size: 12, color: palette.ink })
			],
			characterSpacing: -1.1,
			margin: [0, -2, 0, -2]
		},
		sentence(`low ${days(life.low)} to high ${days(life.high)}`, { margin: [0, 0, 0, 7] }),
		...(rule === null ? [] : [rule]),
		{ text: '', margin: [0, 2, 0, 0] },
		pair('Needed', inDays(line.neededHours), widthPoints * 0.8),
		shortHours > 0
			? pair('Short, on the low', inDays(shortHours), widthPoints * 0.6)
			: pair('To spare, on the low', inDays(-shortHours), widthPoints * 0.6)
	];
}
