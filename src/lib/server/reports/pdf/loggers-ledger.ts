import type { Content } from 'pdfmake/interfaces';
import type { DocketLoggerView } from '../../../schemas/docket';
import type { Draft } from './draft';
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
	return [
		ledger({
			title: 'Loggers and raw exports',
			finding: null,
			columns: [
				{ head: '', width: 16 },
				{ head: 'Logger', width: 52 },
				{ head: 'Where', width: '*' },
				{ head: 'Readings', width: 34, align: 'right' },
				{ head: `±${sign}`, width: 20, align: 'right' },
				{ head: `MKT,\n${sign}`, width: 22, align: 'right' },
				{ head: 'Export and its SHA-256', width: 161 }
			],
			rows: docket.loggers.map((logger) => loggerRow(draft, logger))
		})
	];
}

function loggerRow({ thermometer, input }: Draft, logger: DocketLoggerView): Content[] {
	const file = logger.fileSha256;
	const isInside = input.attachments.some((attachment) => attachment.name === logger.fileName);
	return [
		words(logger.label, { bold: true }),
		figure(logger.serial, { size: 8 }),
		words([logger.position ?? '', placements[logger.placement]].filter(Boolean).join(', ')),
		figure(logger.readings === null ? '–' : decimal(logger.readings, 0)),
		figure(logger.accuracyCelsius === null ? '–' : thermometer.difference(logger.accuracyCelsius)),
		figure(logger.mktCelsius === null ? '–' : thermometer.reading(logger.mktCelsius)),
		file === null
			? sentence(statusWords[logger.status])
			: {
					stack: [
						sentence(
							`${logger.fileName ?? 'export'}, ${isInside ? 'attached inside' : 'kept, not attached'}`
						),
						figure(hashLines(file, 4), { size: sizePoints.smallest })
					]
				}
	];
}

const placements = { air: 'air', 'between-cases': 'between cases', 'in-product': 'in product' } as const;
