import type { Content } from 'pdfmake/interfaces';
import { legLetter, lineNames, type Chapter, type Draft } from './draft';
import { ledger } from './ledger';
import { legFigures, tenthsText, totalTenths, type LegFigures } from './leg-figures';
import { sizePoints } from './palette';
import { hoursMinutes } from './text';
import { figure, words } from './type-styles';

const figureColumns = [
	'allowedTenths',
	'usedTenths',
	'overTenths',
	'tooWarmTenths',
	'tooLateTenths'
] as const;

/** Used against allowed of every logger without a chart of its own: one line a leg, all in one table. */
export function otherLegs(draft: Draft, chapters: readonly Chapter[]): Content[] {
	const rows = chapters.flatMap((chapter) => legRows(draft, chapter));
	if (rows.length === 0) return [];
	const head = (text: string, width: number) => ({ head: text, width, align: 'right' as const });
	return [
		ledger({
			width: draft.sheet.mainWidth,
			title: 'Legs, other loggers',
			finding: 'life used against life allowed, h',
			columns: [
				{ head: '', width: 24 },
				{ head: '', width: 12 },
				{ head: 'In whose hands', width: '*' },
				{ head: 'From', width: 62 },
				head('Took\nh:min', 31),
				head('Allowed\nh', 30),
				head('Used\nh', 29),
				head('Over\nh', 26),
				head('Too\nwarm h', 26),
				head('Too\nlate h', 24)
			],
			rows
		})
	];
}

function legRows({ calendar }: Draft, { assessment, lines }: Chapter): Content[][] {
	const { legs, logger } = assessment;
	if (legs.length === 0) return [];
	const figures = legFigures(legs);
	const size = sizePoints.second;
	const cells = (row: LegFigures | undefined, bold: boolean) =>
		figureColumns.map((column) =>
			figure(tenthsText(row?.[column] ?? null), { size, bold: bold || column === 'overTenths' })
		);
	const took = legs.reduce((sum, leg) => sum + leg.tookMinutes, 0);
	const totals = figureColumns.map((column) =>
		figure(tenthsText(totalTenths(figures.map((leg) => leg[column]))), { size, bold: true })
	);
	return [
		...legs.map((leg, i) => [
			words(logger, { size, bold: true }),
			words(legLetter(leg.ordinal), { size }),
			words(leg.holder, { size }),
			figure(`${calendar.at(leg.fromMs).toFormat('d LLL')} ${calendar.time(leg.fromMs)}`, { size }),
			figure(hoursMinutes(leg.tookMinutes), { size }),
			...cells(figures[i], false)
		]),
		[
			words(logger, { size, bold: true }),
			'',
			words(`All legs, ${lineNames(lines)}`, { size, bold: true }),
			'',
			figure(hoursMinutes(took), { size, bold: true }),
			...totals
		]
	];
}
