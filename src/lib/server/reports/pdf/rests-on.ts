import type { Content } from 'pdfmake/interfaces';
import type { AssessmentView, DocketLineView } from '../../../schemas/docket';
import { amountText } from '../../../schemas/clock-correction';
import { lineNames, type Draft } from './draft';
import { ledger, noteBelow } from './ledger';
import { palette, sizePoints } from './palette';
import { decimal, hoursMinutes, span } from './text';
import { figure, sentence, words } from './type-styles';

interface Ground {
	readonly name: string;
	readonly figure: string;
	readonly how: string;
}

/** Opening balance, gaps, the model's edges and trims: every assumption with its figure and its source. */
export function restsOn(draft: Draft): Content[] {
	const rows = [...shared(draft), ...clockRows(draft), ...trimRows(draft)];
	if (rows.length === 0) return [];
	const specs = new Set(
		draft.chapters.map(({ assessment }) => `${assessment.specName}, version ${assessment.specVersion}`)
	);
	const engine = `Engine ${draft.input.frozen.engineVersion}.`;
	return [
		ledger({
			width: draft.sheet.mainWidth,
			title: 'What it rests on',
			finding:
				'the range of life includes the instrument’s, the spec’s and the opening balance’s uncertainty',
			columns: [
				{ head: 'Assumption', width: 144 },
				{ head: 'Figure', width: 62, align: 'right' },
				{ head: 'How known', width: '*' }
			],
			rows: rows.map((ground) => [
				words(ground.name),
				figure(ground.figure),
				sentence(ground.how, { size: sizePoints.table, color: palette.ink })
			])
		}),
		noteBelow(specs.size === 0 ? engine : `Spec ${[...specs].join('; ')}. ${engine}`)
	];
}

/** What holds for several lines is said once. */
function shared(draft: Draft): Ground[] {
	const groups = new Map<string, { ground: Ground; lines: DocketLineView[] }>();
	for (const { assessment, lines } of draft.chapters) {
		for (const ground of assumptions(draft, assessment)) {
			const key = JSON.stringify(ground);
			const known = groups.get(key) ?? { ground, lines: [] };
			groups.set(key, { ground, lines: [...known.lines, ...lines] });
		}
	}
	return [...groups.values()].map(({ ground, lines }) => {
		const ordered = lines.toSorted((a, b) => a.ordinal - b.ordinal);
		return { ...ground, name: `${ground.name}, ${lineNames(ordered)}` };
	});
}

const openingWords = {
	declared: 'declared by the supplier',
	computed: 'computed from time and temperature',
	undeclared: 'not declared: the spec’s pessimistic figure'
} as const;

function assumptions({ thermometer }: Draft, assessment: AssessmentView): Ground[] {
	const { openingHours: opening, openingBasis, gaps } = assessment;
	const hours = (value: number) => decimal(value, 1);
	const basis = openingBasis === '' ? '' : `, ${openingBasis}`;
	const bounds = span(hours(opening.low), hours(opening.high));
	const accuracy = `±${thermometer.difference(assessment.accuracyCelsius)} ${thermometer.sign}`;
	const unobserved = `${gaps.length === 1 ? '1 gap' : `${gaps.length} gaps`}, bridged linearly; ${hours(assessment.unobservedUsedHours)} h of life`;
	const stretches = [
		['Below the model', assessment.belowModelHours, 'rate held at the end of the range'],
		['Above the model', assessment.aboveModelHours, 'rate held at the end of the range'],
		['Below the chilling threshold', assessment.chilledHours, 'cold earned no credit'],
		['Trimmed', assessment.trimmedHours, 'readings that were not the journey; they stay visible']
	] as const;
	return [
		{
			name: 'Opening balance',
			figure: `${hours(opening.value)} h`,
			how: `${openingWords[assessment.openingKind]}${basis}; ${bounds} h`
		},
		{ name: 'Instrument’s accuracy', figure: accuracy, how: 'from the register of loggers' },
		...(assessment.unobservedHours > 0
			? [{ name: 'Unobserved', figure: `${hours(assessment.unobservedHours)} h`, how: unobserved }]
			: []),
		...stretches.flatMap(([name, value, how]) =>
			value > 0 ? [{ name, figure: `${hoursMinutes(value * 60)} h`, how }] : []
		)
	];
}

/** Each clock a person put right: the readings stand as exported, the shift beside them. */
function clockRows({ docket }: Draft): Ground[] {
	return docket.clockCorrections.map(({ logger, shiftMs, by, reason }) => ({
		name: `Clock of ${logger}`,
		figure: `${shiftMs < 0 ? '−' : '+'}${amountText(shiftMs)} h`,
		how: `every reading moved, by ${by}: ${reason}`
	}));
}

/** Each stretch a person left out, with who did and why: they stay visible. */
function trimRows({ docket, calendar }: Draft): Ground[] {
	const when = (at: string) => `${calendar.day(at)} ${calendar.time(at)}`;
	return docket.trims.map((trim) => ({
		name: `Left out on ${trim.logger}`,
		figure: `${hoursMinutes((Date.parse(trim.toAt) - Date.parse(trim.fromAt)) / 60_000)} h`,
		how: `${when(trim.fromAt)} to ${when(trim.toAt)}, by ${trim.by}: ${trim.reason}`
	}));
}
