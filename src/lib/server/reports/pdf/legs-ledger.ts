import type { Content } from 'pdfmake/interfaces';
import type { LegUse } from '../../../domain/receiving/assessment';
import { attributes, element, type Node } from './chart/svg';
import { legLetter, lineNames, type Chapter, type Draft } from './draft';
import { ledger, noteBelow } from './ledger';
import { legFigures, tenthsText, totalTenths, type LegFigures } from './leg-figures';
import { palette } from './palette';
import { hoursMinutes } from './text';
import { figure, sentence, words } from './type-styles';

const barWidth = 48;

/** Life used against life allowed, leg by leg; over-use as too warm and too late. */
export function legsLedger(draft: Draft, chapter: Chapter): Content[] {
	const { legs } = chapter.assessment;
	if (legs.length === 0) return [];
	const figures = legFigures(legs);
	const scale = Math.max(
		1,
		...figures.map((leg) => Math.max(leg.tooWarmTenths ?? 0, 0) + Math.max(leg.tooLateTenths ?? 0, 0))
	);
	const reference = chapter.lines[0]?.referenceCelsius;
	const at =
		reference === undefined ? '' : ` at ${draft.thermometer.reading(reference)} ${draft.thermometer.sign}`;
	const head = (text: string, width: number) => ({ head: text, width, align: 'right' as const });
	return [
		ledger({
			width: draft.sheet.mainWidth,
			title: 'Legs',
			finding: `life used against life allowed, h${at}; ${chapter.assessment.logger}, ${lineNames(chapter.lines)}`,
			columns: [
				{ head: '', width: 10 },
				{ head: 'In whose hands', width: '*' },
				{ head: 'From', width: 27 },
				head('Planned\nh:min', 31),
				head('Took\nh:min', 31),
				head('Allowed\nh', 28),
				head('Used\nh', 26),
				head('Over\nh', 22),
				head('Too\nwarm h', 25),
				head('Too\nlate h', 22),
				{ head: 'Over-use', width: barWidth }
			],
			rows: [...legs.map((leg, i) => legRow(draft, leg, figures[i], scale)), totalRow(legs, figures)]
		}),
		noteBelow(
			'Too warm and too late add up to the over-use. Arithmetic on time and temperature: it does not decide liability.'
		)
	];
}

function legRow(
	{ calendar, thermometer }: Draft,
	leg: LegUse,
	figures: LegFigures | undefined,
	scale: number
): Content[] {
	const text = (value: number | null | undefined) => figure(tenthsText(value ?? null));
	const covered =
		leg.coveredFraction < 0.995 ? `, readings cover ${Math.floor(leg.coveredFraction * 100)} %` : '';
	return [
		words(legLetter(leg.ordinal), { bold: true }),
		{
			stack: [
				words(leg.holder),
				sentence(
					`${leg.place}, set ${thermometer.reading(leg.setPointCelsius)} ${thermometer.sign}${covered}`,
					{ size: 7.8 }
				)
			]
		},
		{
			stack: [
				figure(calendar.time(leg.fromMs)),
				sentence(calendar.at(leg.fromMs).toFormat('d LLL'), { size: 7.8 })
			]
		},
		figure(leg.plannedMinutes === null ? '–' : hoursMinutes(leg.plannedMinutes)),
		figure(hoursMinutes(leg.tookMinutes)),
		text(figures?.allowedTenths),
		text(figures?.usedTenths),
		figure(tenthsText(figures?.overTenths ?? null), { bold: true }),
		text(figures?.tooWarmTenths),
		text(figures?.tooLateTenths),
		figures === undefined ? '' : overUseBar(figures, scale)
	];
}

function totalRow(legs: readonly LegUse[], figures: readonly LegFigures[]): Content[] {
	const planned = legs.reduce<number | null>(
		(sum, leg) => (sum === null || leg.plannedMinutes === null ? null : sum + leg.plannedMinutes),
		0
	);
	const took = legs.reduce((sum, leg) => sum + leg.tookMinutes, 0);
	const bold = (text: string) => figure(text, { bold: true });
	const total = (pick: (leg: LegFigures) => number | null) =>
		bold(tenthsText(totalTenths(figures.map(pick))));
	return [
		'',
		words('All legs', { bold: true }),
		'',
		bold(planned === null ? '–' : hoursMinutes(planned)),
		bold(hoursMinutes(took)),
		total((leg) => leg.allowedTenths),
		total((leg) => leg.usedTenths),
		total((leg) => leg.overTenths),
		total((leg) => leg.tooWarmTenths),
		total((leg) => leg.tooLateTenths),
		''
	];
}

/** Solid for too warm, hollow for too late; a leg that came in under its allowance has no bar. */
function overUseBar(figures: LegFigures, scale: number): Content {
	const height = 8;
	const warm = (Math.max(figures.tooWarmTenths ?? 0, 0) / scale) * (barWidth - 2);
	const late = (Math.max(figures.tooLateTenths ?? 0, 0) / scale) * (barWidth - 2);
	const nodes: Node[] = [
		element('path', { d: `M0.5 0V${height}`, stroke: palette.ink, 'stroke-width': 0.9, fill: 'none' })
	];
	if (warm > 0)
		nodes.push(
			element('rect', {
				x: 0.9,
				y: 1,
				width: warm,
				height: height - 2,
				fill: palette.ropeBand,
				stroke: palette.rope,
				'stroke-width': 0.6
			})
		);
	if (late > 0)
		nodes.push(
			element('rect', {
				x: 0.9 + warm,
				y: 1,
				width: late,
				height: height - 2,
				fill: palette.sheet,
				stroke: palette.ink,
				'stroke-width': 0.6
			})
		);
	const view = attributes({ viewBox: `0 0 ${barWidth} ${height}`, width: barWidth, height });
	return { svg: `<svg ${view}>${nodes.join('')}</svg>`, width: barWidth, height, margin: [0, 1.5, 0, 0] };
}
