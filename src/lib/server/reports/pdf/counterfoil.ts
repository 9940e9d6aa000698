import type { Content } from 'pdfmake/interfaces';
import { hoursPerDay, msPerHour } from '../../../domain/units';
import type { DocketLineView } from '../../../schemas/docket';
import type { Draft } from './draft';
import { lifeRule } from './life-rule';
import { outcomeMark, outcomeWord, verdictOf } from './marks';
import { palette, sizePoints } from './palette';
import { days, span } from './text';
import { figure, label, sentence, words } from './type-styles';

/** More than this many lines are left to the table; the counterfoil is one page high. */
const linesShown = 8;

/** Page one's counterfoil: verdict, outcome by line, life left against the need, when it ends. */
export function firstCounterfoil(draft: Draft): Content[] {
	const { docket, sheet } = draft;
	const verdict = verdictOf(docket.verdict);
	return [
		...counterfoilTop(draft),
		outcomeMark(verdict.mark, 19),
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

/** Number and rule, at the head of every counterfoil. */
export function counterfoilTop(draft: Draft): Content[] {
	return [
		label('Counterfoil'),
		figure(draft.docket.number, { size: sizePoints.number, margin: [0, 1, 0, 0] }),
		hairline(draft.sheet.stubWidth, 9)
	];
}

export function hairline(widthPoints: number, above: number): Content {
	return {
		canvas: [{ type: 'line', x1: 0, y1: 0, x2: widthPoints, y2: 0, lineWidth: 0.6, lineColor: palette.rule }],
		margin: [0, above, 0, 8]
	};
}

/** A word on the left, a figure on the right. */
export function pair(name: string, value: Content, widthPoints: number): Content {
	return {
		columns: [
			{ ...sentence(name), width: '*' },
			{ stack: [value], alignment: 'right', width: widthPoints * 0.52 }
		],
		margin: [0, 1.5, 0, 1.5]
	};
}

function outcomes(lines: readonly DocketLineView[]): Content[] {
	const rows = lines.slice(0, linesShown).map((line): Content => {
		const outcome = line.outcome?.outcome ?? 'hold';
		const word = outcome === 'conditions' ? 'With conditions' : outcomeWord(outcome);
		return {
			columns: [
				{ ...sentence(String(line.ordinal), { size: sizePoints.table }), width: 11 },
				{ ...outcomeMark(outcome, 8), width: 14, margin: [0, 1.6, 0, 0] },
				{ ...words(word, { size: sizePoints.table }), width: '*' }
			],
			margin: [0, 0.8, 0, 0.8]
		};
	});
	const more = lines.length - linesShown;
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

/** Life ends about, low to high, for what was taken in: kept at the spec's reference temperature from the last reading. */
function lifeEnds(draft: Draft): Content[] {
	const { docket, calendar, thermometer, sheet } = draft;
	const taken = docket.lines.filter((line) => line.outcome !== null && line.outcome.outcome !== 'reject');
	const rows = taken.flatMap((line): Content[] => {
		const assessment = docket.assessments.find((one) => one.lineId === line.id && one.isGoverning);
		if (assessment === undefined || line.remainingHours === null) return [];
		const endsAt = (hours: number) => Date.parse(assessment.windowToAt) + Math.max(hours, 0) * msPerHour;
		const low = calendar.at(endsAt(line.remainingHours.low)).toFormat('d LLL');
		const high = calendar.at(endsAt(line.remainingHours.high)).toFormat('d LLL');
		const isLong = line.remainingHours.value > 200 * hoursPerDay;
		const range = low === high ? low : span(low, high);
		const text = isLong ? calendar.at(endsAt(line.remainingHours.low)).toFormat('LLL yyyy') : range;
		return [pair(`Line ${line.ordinal}`, sentence(text, { color: palette.ink }), sheet.stubWidth * 1.3)];
	});
	if (rows.length === 0) return [];
	const temperatures = [...new Set(taken.map((line) => thermometer.reading(line.referenceCelsius)))];
	const kept =
		temperatures.length === 1
			? `kept at ${temperatures[0]} ${thermometer.sign}`
			: 'kept at its spec’s temperature';
	return [
		hairline(sheet.stubWidth, 6),
		label('Life ends about'),
		label(kept, { margin: [0, 0, 0, 2] }),
		...rows.slice(0, linesShown)
	];
}
