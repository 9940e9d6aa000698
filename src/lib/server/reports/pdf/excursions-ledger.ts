import type { Content } from 'pdfmake/interfaces';
import type { Excursion, StopHit } from '../../../domain/receiving/assessment';
import { attributes, element } from './chart/svg';
import { hatch } from './chart/excursion-bands';
import { legLetter, lineNames, type Chapter, type Draft } from './draft';
import { ledger, noteBelow, sectionTitle } from './ledger';
import { palette, sizePoints } from './palette';
import { decimal, hoursMinutes } from './text';
import { figure, sentence, words } from './type-styles';

/** Excursions and absolute stops of a logger that has its chart. */
export function excursionsSection(draft: Draft, chapter: Chapter): Content[] {
	const { assessment } = chapter;
	const title = `Excursions on ${assessment.logger}`;
	const limits = limitsText(draft, chapter);
	if (assessment.excursions.length === 0) {
		return [
			{ stack: [sectionTitle(title, `none beyond the limits${limits}`)], margin: [0, 14, 0, 0] },
			...stopNotes(draft, chapter)
		];
	}
	const rows = assessment.excursions.map((excursion, i) => excursionRow(draft, excursion, `E${i + 1}`));
	return [
		excursionLedger(draft, title, `${lineNames(chapter.lines)}${limits}`, rows, 18),
		...stopNotes(draft, chapter)
	];
}

/** Excursions of every logger without a chart of its own, in one table. */
export function otherExcursions(draft: Draft, chapters: readonly Chapter[]): Content[] {
	const rows = chapters.flatMap(({ assessment }) =>
		assessment.excursions.map((excursion, i) =>
			excursionRow(draft, excursion, `${assessment.logger} E${i + 1}`)
		)
	);
	const without = chapters.filter(({ assessment }) => assessment.excursions.length === 0);
	const names = without.map(({ assessment }) => assessment.logger).join(', ');
	const none = without.length === 0 ? [] : [noteBelow(`None beyond the limits on ${names}.`)];
	const stops = chapters.flatMap((chapter) => stopNotes(draft, chapter));
	if (rows.length === 0) {
		const title = sectionTitle('Excursions on other loggers', `none beyond the limits on ${names}`);
		return [{ stack: [title], margin: [0, 14, 0, 0] }, ...stops];
	}
	return [excursionLedger(draft, 'Excursions on other loggers', null, rows, 40), ...none, ...stops];
}

function excursionLedger(
	draft: Draft,
	title: string,
	finding: string | null,
	rows: readonly (readonly Content[])[],
	nameWidth: number
): Content {
	const { sign } = draft.thermometer;
	return ledger({
		width: draft.sheet.mainWidth,
		title,
		finding,
		columns: [
			{ head: '', width: nameWidth },
			{ head: 'Too', width: 34 },
			{ head: 'From', width: 71 },
			{ head: 'To', width: 26 },
			{ head: 'Lasted\nh:min', width: 28, align: 'right' },
			{ head: `Extreme\n${sign}`, width: 29, align: 'right' },
			{ head: `Mean\n${sign}`, width: 23, align: 'right' },
			{ head: 'Degree-\nmin', width: 36, align: 'right' },
			{ head: 'Life\nh', width: 24, align: 'right' },
			{ head: 'Leg', width: 17 },
			{ head: 'Severity', width: '*' }
		],
		rows
	});
}

const stopWords = { freezing: 'Freezing stop', ceiling: 'Food-safety ceiling' } as const;

/** A stop is not a matter of minutes or life: it is said by itself, whatever the excursions are. */
function stopNotes({ thermometer, calendar }: Draft, { assessment, lines }: Chapter): Content[] {
	const degrees = (celsius: number) => `${thermometer.reading(celsius)} ${thermometer.sign}`;
	return assessment.stops.map((stop: StopHit) => {
		const doubt = stop.isInDoubt ? ', in doubt within the instrument’s accuracy' : '';
		const when = `${calendar.day(stop.firstAtMs)} ${calendar.time(stop.firstAtMs)}`;
		const text = `${stopWords[stop.kind]} on ${assessment.logger}, ${lineNames(lines)}: ${degrees(stop.extremeCelsius)} against ${degrees(stop.stopCelsius)}, first ${when}, ${hoursMinutes(stop.minutes)} in all${doubt}.`;
		return sentence(text, { size: sizePoints.table, color: palette.hull, bold: true, margin: [0, 4, 0, 0] });
	});
}

function limitsText({ thermometer }: Draft, { assessment }: Chapter): string {
	const limits = [assessment.upperCelsius, assessment.lowerCelsius].filter((celsius) => celsius !== null);
	return limits.length === 0
		? ''
		: `, limits ${limits.map(thermometer.reading).join(' and ')} ${thermometer.sign}`;
}

function excursionRow({ calendar, thermometer }: Draft, excursion: Excursion, name: string): Content[] {
	const isCold = excursion.kind === 'too-cold';
	const sameDay = calendar.day(excursion.fromMs) === calendar.day(excursion.toMs);
	const doubt = excursion.isInDoubt ? ', in doubt' : '';
	return [
		words(name, { bold: true }),
		{
			columns: [
				{ ...swatch(isCold), width: 14, margin: [0, 1.5, 0, 0] },
				{ ...words(isCold ? 'cold' : 'warm'), width: '*' }
			]
		},
		sentence(`${calendar.day(excursion.fromMs)} ${calendar.time(excursion.fromMs)}`, {
			size: sizePoints.table,
			color: palette.ink
		}),
		sameDay
			? figure(calendar.time(excursion.toMs))
			: {
					stack: [
						figure(calendar.time(excursion.toMs)),
						sentence(calendar.at(excursion.toMs).toFormat('d LLL'), { size: 7.8 })
					]
				},
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
