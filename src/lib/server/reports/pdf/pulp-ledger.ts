import type { Content } from 'pdfmake/interfaces';
import type { PulpView } from '../../../schemas/docket';
import type { Draft } from './draft';
import { ledger } from './ledger';
import { palette, sizePoints } from './palette';
import { figure, sentence, words } from './type-styles';

/** A logger speaks for the moment of a pulp reading only so near to it. */
const besideMs = 60 * 60_000;

/** What a logger of the same line read when the pulp was taken. */
interface Beside {
	readonly logger: string;
	readonly where: string;
	readonly celsius: number;
}

/** Pulp readings at the door, each against what the line's own logger read at that moment. */
export function pulpLedger(draft: Draft): Content[] {
	const { docket, thermometer } = draft;
	if (docket.pulp.length === 0) return [];
	const { sign } = thermometer;
	const air = docket.arrival?.returnAirCelsius ?? null;
	return [
		ledger({
			width: draft.sheet.mainWidth,
			title: 'Pulp at the door',
			finding: air === null ? null : `return air of the unit ${thermometer.reading(air)} ${sign}`,
			columns: [
				{ head: 'Line and lot', width: 76 },
				{ head: 'Where, with what', width: '*' },
				{ head: 'When', width: 54 },
				{ head: `Pulp\n${sign}`, width: 28, align: 'right' },
				{ head: `Logger\n${sign}`, width: 34, align: 'right' },
				{ head: `Pulp −\nlogger`, width: 30, align: 'right' },
				{ head: 'Which logger', width: 56 }
			],
			rows: docket.pulp.map((pulp) => pulpRow(draft, pulp))
		})
	];
}

function pulpRow(draft: Draft, pulp: PulpView): Content[] {
	const { docket, thermometer, calendar } = draft;
	const line = docket.lines.find((candidate) => candidate.id === pulp.lineId);
	const lot = pulp.lot ?? line?.lot ?? null;
	const where = [pulp.position, pulp.caseLabel, pulp.instrument].filter(Boolean).join(', ');
	const beside = besidePulp(draft, pulp);
	const small = { size: sizePoints.table, color: palette.ink };
	return [
		words(
			[line === undefined ? '' : `line ${line.ordinal}`, lot === null ? '' : `lot ${lot}`]
				.filter(Boolean)
				.join(', ')
		),
		sentence(`${where}; written “${pulp.text}”`, small),
		sentence(`${calendar.at(pulp.takenAt).toFormat('d LLL')} ${calendar.time(pulp.takenAt)}`, small),
		figure(thermometer.reading(pulp.celsius), { bold: true }),
		figure(beside === null ? '–' : thermometer.reading(beside.celsius)),
		figure(
			beside === null
				? '–'
				: signed(thermometer.difference(pulp.celsius - beside.celsius), pulp.celsius - beside.celsius)
		),
		words(beside === null ? 'none near that moment' : `${beside.logger}, ${beside.where}`)
	];
}

function signed(text: string, value: number): string {
	return value > 0 ? `+${text}` : text;
}

const placements = { air: 'air', 'between-cases': 'between cases', 'in-product': 'in product' } as const;

/** The reading nearest to the moment, of the line's loggers; one in the air before one in the product. */
function besidePulp({ docket, input }: Draft, pulp: PulpView): Beside | null {
	const own =
		docket.lines.find(({ id }) => id === pulp.lineId)?.loggers ?? docket.loggers.map(({ label }) => label);
	const loggers = docket.loggers.filter(({ label }) => own.includes(label));
	loggers.sort((a, b) => Number(b.placement === 'air') - Number(a.placement === 'air'));
	const takenMs = Date.parse(pulp.takenAt);
	for (const { label, traceId, placement } of loggers) {
		const series = input.frozen.series.find((candidate) => candidate.traceId === traceId);
		let nearest: { celsius: number; awayMs: number } | null = null;
		for (const [i, celsius] of (series?.celsius ?? []).entries()) {
			const awayMs = Math.abs((series?.times[i] ?? 0) - takenMs);
			if (celsius !== null && awayMs <= (nearest?.awayMs ?? besideMs)) nearest = { celsius, awayMs };
		}
		if (nearest) return { logger: label, where: placements[placement], celsius: nearest.celsius };
	}
	return null;
}
