import type { Content } from 'pdfmake/interfaces';
import type { DocketLoggerView } from '../../../schemas/docket';
import type { Draft } from './draft';
import { namesByHash } from './embedded-files';
import { ledger } from './ledger';
import { sizePoints } from './palette';
import { decimal, hashLines } from './text';
import { figure, sentence, words } from './type-styles';

const statusWords = {
	expected: 'expected, not seen',
	found: 'no export',
	'not-found': 'not found',
	dead: 'dead',
	'not-started': 'not started',
	'other-load': 'another load’s'
} as const;

/** Loggers with the whole hash of each export; the exports themselves stand inside the file. */
export function loggers(draft: Draft): Content[] {
	const { docket } = draft;
	if (docket.loggers.length === 0) return [];
	const sign = draft.thermometer.sign;
	const inside = namesByHash(draft.input.attachments);
	return [
		ledger({
			width: draft.sheet.mainWidth,
			title: 'Loggers and raw exports',
			finding: null,
			columns: [
				{ head: '', width: 19 },
				{ head: 'Logger', width: 66 },
				{ head: 'Where', width: '*' },
				{ head: 'Readings', width: 34, align: 'right' },
				{ head: `±${sign}`, width: 20, align: 'right' },
				{ head: `MKT,\n${sign}`, width: 22, align: 'right' },
				{ head: 'Export and its SHA-256', width: 161 }
			],
			rows: docket.loggers.map((logger) => loggerRow(draft, logger, inside))
		})
	];
}

function loggerRow(
	{ thermometer, calendar }: Draft,
	logger: DocketLoggerView,
	inside: ReadonlyMap<string, string>
): Content[] {
	const number = (value: number | null, text: (value: number) => string) =>
		figure(value === null ? '–' : text(value));
	return [
		words(logger.label, { bold: true }),
		{
			stack: [
				figure(logger.serial, { size: 8 }),
				sentence(
					logger.calibrationDueOn === null
						? 'no calibration known'
						: `calibration due ${calendar.date(`${logger.calibrationDueOn}T12:00:00Z`)}`,
					{ size: 7.8 }
				)
			]
		},
		words([logger.position ?? '', placements[logger.placement]].filter(Boolean).join(', ')),
		number(logger.readings, (readings) => decimal(readings, 0)),
		number(logger.accuracyCelsius, thermometer.difference),
		number(logger.mktCelsius, thermometer.reading),
		exportCell(logger, inside)
	];
}

function exportCell(logger: DocketLoggerView, inside: ReadonlyMap<string, string>): Content {
	const sha256 = logger.fileSha256;
	if (sha256 === null) return sentence(statusWords[logger.status]);
	const name = inside.get(sha256);
	const where =
		name === undefined ? `${logger.fileName ?? 'export'}, kept, not attached` : `${name}, attached inside`;
	return { stack: [sentence(where), figure(hashLines(sha256, 4), { size: sizePoints.smallest })] };
}

const placements = { air: 'air', 'between-cases': 'between cases', 'in-product': 'in product' } as const;
