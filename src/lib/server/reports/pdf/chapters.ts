import type { Content } from 'pdfmake/interfaces';
import type { Excursion } from '../../../domain/receiving/assessment';
import { traceChart } from './chart/trace-chart';
import { attributes, element } from './chart/svg';
import { hatch } from './chart/excursion-bands';
import { namedOthers } from './chart/traces';
import { legLetter, lineNames, type Chapter, type Draft } from './draft';
import { ledger, sectionTitle } from './ledger';
import { legsLedger } from './legs-ledger';
import { palette, sizePoints } from './palette';
import { decimal, hoursMinutes } from './text';
import { figure, sentence, words } from './type-styles';

/** One logger's account of the lines it governs: chart, excursions, legs. */
export function chapterContent(draft: Draft, chapter: Chapter): Content[] {
	return [
		...(chapter.hasChart ? [chartSection(draft, chapter)] : []),
		...excursionsSection(draft, chapter),
		...legsLedger(draft, chapter)
	];
}

const placementWords = {
	air: 'in the air of the load space',
	'between-cases': 'between cases',
	'in-product': 'in the product'
} as const;

function chartSection(draft: Draft, chapter: Chapter): Content {
	const { assessment, others } = chapter;
	const placement = draft.docket.loggers.find((logger) => logger.label === assessment.logger)?.placement;
	const where = placement === undefined ? '' : ` ${placementWords[placement]}`;
	const named =
		others.length > namedOthers ? `${others.length} others` : others.map((other) => other.label).join(', ');
	const behind = others.length === 0 ? '' : `, ${named} behind it`;
	const finding = `${draft.thermometer.sign}${where}, ${assessment.logger} in ink${behind}; ${lineNames(chapter.lines)}`;
	return {
		unbreakable: true,
		stack: [sectionTitle('Trace', finding), traceChart(draft, chapter)],
		margin: [0, 13, 0, 0]
	};
}

function excursionsSection(draft: Draft, chapter: Chapter): Content[] {
	const { assessment } = chapter;
	const title = `Excursions on ${assessment.logger}`;
	if (assessment.excursions.length === 0) {
		return [
			{
				stack: [sectionTitle(title, `none beyond the limits${limitsText(draft, chapter)}`)],
				margin: [0, 14, 0, 0]
			}
		];
	}
	const sign = draft.thermometer.sign;
	return [
		ledger({
			width: draft.sheet.mainWidth,
			title,
			finding: `${lineNames(chapter.lines)}${limitsText(draft, chapter)}`,
			columns: [
				{ head: '', width: 18 },
				{ head: 'What', width: 50 },
				{ head: 'From', width: 71 },
				{ head: 'To', width: 30 },
				{ head: 'Lasted\nh:min', width: 28, align: 'right' },
				{ head: `Extreme\n${sign}`, width: 29, align: 'right' },
				{ head: `Mean\n${sign}`, width: 23, align: 'right' },
				{ head: 'Degree-\nmin', width: 28, align: 'right' },
				{ head: 'Life\nh', width: 24, align: 'right' },
				{ head: 'Leg', width: 18 },
				{ head: 'Severity', width: '*' }
			],
			rows: assessment.excursions.map((excursion, i) => excursionRow(draft, excursion, i + 1))
		})
	];
}

function limitsText({ thermometer }: Draft, { assessment }: Chapter): string {
	const limits = [assessment.upperCelsius, assessment.lowerCelsius].filter((celsius) => celsius !== null);
	return limits.length === 0
		? ''
		: `, limits ${limits.map(thermometer.reading).join(' and ')} ${thermometer.sign}`;
}

function excursionRow({ calendar, thermometer }: Draft, excursion: Excursion, ordinal: number): Content[] {
	const isCold = excursion.kind === 'too-cold';
	const sameDay = calendar.day(excursion.fromMs) === calendar.day(excursion.toMs);
	const doubt = excursion.isInDoubt ? ', in doubt' : '';
	return [
		words(`E${ordinal}`, { bold: true }),
		{
			columns: [
				{ ...swatch(isCold), width: 16, margin: [0, 1.5, 0, 0] },
				{ ...words(isCold ? 'too cold' : 'too warm'), width: '*' }
			]
		},
		sentence(`${calendar.day(excursion.fromMs)} ${calendar.time(excursion.fromMs)}`, {
			size: sizePoints.table,
			color: palette.ink
		}),
		figure(
			`${sameDay ? '' : `${calendar.at(excursion.toMs).toFormat('d LLL')}\n`}${calendar.time(excursion.toMs)}`
		),
		figure(hoursMinutes(excursion.minutes)),
		figure(thermometer.reading(excursion.extremeCelsius)),
		figure(thermometer.reading(excursion.meanCelsius)),
		figure(thermometer.degreeMinutes(excursion.degreeMinutes)),
		figure(decimal(excursion.costHours, 1), { bold: true }),
		words(legsTouched(excursion.legs)),
		words(`${excursion.severity}${doubt}${excursion.isOpen ? ', still open' : ''}`)
	];
}

function legsTouched(legs: readonly number[]): string {
	const [first] = legs;
	const last = legs.at(-1);
	if (first === undefined || last === undefined) return '–';
	return first === last ? legLetter(first) : `${legLetter(first)}–${legLetter(last)}`;
}

function swatch(isCold: boolean): { svg: string; width: number; height: number } {
	const [width, height] = [11, 7];
	const box = {
		x: 0.4,
		y: 0.4,
		width: width - 0.8,
		height: height - 0.8,
		stroke: isCold ? palette.deep : palette.rope,
		'stroke-width': 0.7
	};
	const drawn = [
		element('rect', { ...box, fill: isCold ? palette.deepWash : palette.ropeBand }),
		...(isCold ? [hatch(0.4, 0.4, width - 0.8, height - 0.8)] : [])
	];
	return {
		svg: `<svg ${attributes({ viewBox: `0 0 ${width} ${height}`, width, height })}>${drawn.join('')}</svg>`,
		width,
		height
	};
}
