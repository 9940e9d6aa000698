import type { Content } from 'pdfmake/interfaces';
import type { AssessmentView, DocketLoggerView } from '../../../schemas/docket';
import { lineNames, type Draft } from './draft';
import { ledger, noteBelow, sectionTitle } from './ledger';
import { palette, sizePoints } from './palette';
import { decimal, hashLines, hoursMinutes } from './text';
import { figure, sentence, words } from './type-styles';

/** The signer's own words first, then what the rules found, line by line. */
export function reasons(draft: Draft): Content[] {
	const { signature, reasonTexts } = draft.input;
	const own = signature.reasons.trim();
	const found = draft.docket.lines.flatMap((line) =>
		(reasonTexts[line.id] ?? []).map((text) => ({ line: line.ordinal, text }))
	);
	if (own === '' && found.length === 0) return [];
	const items = found.map(({ line, text }, i): Content => ({
		columns: [
			{ ...figure(`${i + 1}.`, { color: palette.ink2 }), width: 18 },
			{
				...sentence(draft.docket.lines.length > 1 ? `Line ${line}: ${text}` : text, {
					size: sizePoints.table,
					color: palette.ink
				}),
				width: '*'
			}
		],
		margin: [0, 1.6, 0, 0]
	}));
	return [
		{
			unbreakable: own.length < 600,
			stack: [
				sectionTitle('Reasons', null),
				{
					canvas: [
						{
							type: 'line',
							x1: 0,
							y1: 4,
							x2: draft.sheet.mainWidth,
							y2: 4,
							lineWidth: 1.1,
							lineColor: palette.ink
						}
					]
				},
				...(own === '' ? [] : [quoted(own, signature.signedBy)])
			],
			margin: [0, 16, 0, 4]
		},
		...items
	];
}

function quoted(text: string, by: string): Content {
	const size = 10.2;
	return {
		text: [sentence(`“${text}” `, { size, color: palette.ink }), words(by, { size, color: palette.ink2 })],
		margin: [0, 8, 0, 3]
	};
}

/** Opening balance, gaps, the model's edges, trims and pulp: every assumption with its figure and its source. */
export function restsOn(draft: Draft): Content[] {
	const rows = [
		...draft.chapters.flatMap((chapter) => assumptions(draft, chapter.assessment, lineNames(chapter.lines))),
		...pulpRows(draft)
	];
	if (rows.length === 0) return [];
	return [
		ledger({
			title: 'What it rests on',
			finding: null,
			width: draft.sheet.mainWidth,
			columns: [
				{ head: 'Assumption', width: 124 },
				{ head: 'Figure', width: 96, align: 'right' },
				{ head: 'How known', width: '*' }
			],
			rows: rows.map(([name, value, how]) => [
				words(name),
				figure(value),
				sentence(how, { size: sizePoints.table, color: palette.ink })
			])
		}),
		...specNotes(draft)
	];
}

type Ground = readonly [name: string, value: string, how: string];
const openingWords = {
	declared: 'declared by the supplier',
	computed: 'computed from time and temperature',
	undeclared: 'not declared: the spec’s pessimistic figure'
} as const;

function assumptions({ thermometer }: Draft, assessment: AssessmentView, lines: string): Ground[] {
	const opening = assessment.openingHours;
	const basis = assessment.openingBasis === '' ? '' : `, ${assessment.openingBasis}`;
	const hours = (value: number) => `${decimal(value, 1)} h`;
	const optional: (Ground | null)[] = [
		assessment.unobservedHours > 0
			? [
					`Unobserved, ${lines}`,
					hours(assessment.unobservedHours),
					`${gapsText(assessment)}, bridged linearly; ${hours(assessment.unobservedUsedHours)} of life`
				]
			: null,
		assessment.belowModelHours > 0
			? [
					`Below the model, ${lines}`,
					hoursMinutes(assessment.belowModelHours * 60),
					'rate held at the end of the range'
				]
			: null,
		assessment.aboveModelHours > 0
			? [
					`Above the model, ${lines}`,
					hoursMinutes(assessment.aboveModelHours * 60),
					'rate held at the end of the range'
				]
			: null,
		assessment.chilledHours > 0
			? [
					`Below the chilling threshold, ${lines}`,
					hoursMinutes(assessment.chilledHours * 60),
					'cold earned no credit'
				]
			: null,
		assessment.trimmedHours > 0
			? [
					`Trimmed, ${lines}`,
					hoursMinutes(assessment.trimmedHours * 60),
					'readings that were not the journey; they stay visible'
				]
			: null
	];
	return [
		[
			`Opening balance, ${lines}`,
			`${decimal(opening.value, 1)} ±${decimal((opening.high - opening.low) / 2, 1)} h`,
			`${openingWords[assessment.openingKind]}${basis}`
		],
		[
			`Instrument, ${lines}`,
			`±${thermometer.difference(assessment.accuracyCelsius)} ${thermometer.sign}`,
			`accuracy of ${assessment.logger}; the range of life includes it, the spec’s and the opening balance’s`
		],
		...optional.filter((ground) => ground !== null)
	];
}

function gapsText({ gaps }: AssessmentView): string {
	return gaps.length === 1 ? '1 gap' : `${gaps.length} gaps`;
}

function pulpRows({ docket, thermometer, calendar }: Draft): Ground[] {
	return docket.pulp.map((pulp) => {
		const line = docket.lines.find((candidate) => candidate.id === pulp.lineId);
		const what =
			line === undefined ? (pulp.lot === null ? '' : `, lot ${pulp.lot}`) : `, line ${line.ordinal}`;
		const where = [pulp.position, pulp.caseLabel, pulp.instrument].filter(Boolean).join(', ');
		return [
			`Pulp at the door${what}`,
			`${thermometer.reading(pulp.celsius)} ${thermometer.sign}`,
			`${where}, ${calendar.day(pulp.takenAt)} ${calendar.time(pulp.takenAt)}, written “${pulp.text}”`
		];
	});
}

function specNotes(draft: Draft): Content[] {
	const specs = new Set(
		draft.chapters.map(({ assessment }) => `${assessment.specName} version ${assessment.specVersion}`)
	);
	return specs.size === 0
		? []
		: [noteBelow(`Spec ${[...specs].join('; ')}. Engine ${draft.input.frozen.engineVersion}.`)];
}

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
			width: draft.sheet.mainWidth,
			columns: [
				{ head: '', width: 16 },
				{ head: 'Logger', width: 62 },
				{ head: 'Where', width: '*' },
				{ head: 'Readings', width: 38, align: 'right' },
				{ head: `±${sign}`, width: 20, align: 'right' },
				{ head: `MKT, ${sign}`, width: 32, align: 'right' },
				{ head: 'Export and its SHA-256', width: 152 }
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
