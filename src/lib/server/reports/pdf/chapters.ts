import type { Content } from 'pdfmake/interfaces';
import { traceChart } from './chart/trace-chart';
import { namedOthers } from './chart/traces';
import { lineNames, type Chapter, type Draft } from './draft';
import { excursionsSection } from './excursions-ledger';
import { sectionTitle } from './ledger';
import { legsLedger } from './legs-ledger';

/** The account of a logger that has its chart: trace, excursions, legs. The others' stands in one table each. */
export function chapterContent(draft: Draft, chapter: Chapter): Content[] {
	return [chartSection(draft, chapter), ...excursionsSection(draft, chapter), ...legsLedger(draft, chapter)];
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
