import type { Content } from 'pdfmake/interfaces';
import { decidedGroups } from '../../../domain/receiving/line-groups';
import { conditionWords, groupDetails, placeText } from '../../../messages/en/line-groups';
import type { DocketLineView, LineOutcomeView } from '../../../schemas/docket';
import type { Draft } from './draft';
import { ledger, noteBelow } from './ledger';
import { outcomeMark, outcomeWord } from './marks';
import { days, decimal, span } from './text';
import { figure, sentence, words } from './type-styles';

/** Every line with its life against the need and what was decided. */
export function dispositions(draft: Draft): Content[] {
	const { docket } = draft;
	return [
		ledger({
			width: draft.sheet.mainWidth,
			title: 'Dispositions',
			finding: `${decimal(docket.lines.length, 0)} ${docket.lines.length === 1 ? 'line' : 'lines'}; cases as received, the papers’ count where it differs`,
			columns: [
				{ head: '', width: 15 },
				{ head: 'Product and lot', width: '*' },
				{ head: 'First pallet, SSCC; GTIN', width: 101 },
				{ head: 'Cases', width: 30, align: 'right' },
				{ head: 'Life left, d\nlow to high', width: 50, align: 'right' },
				{ head: 'Needed,\nd', width: 32, align: 'right' },
				{ head: 'Disposition', width: 72 }
			],
			rows: docket.lines.map(dispositionRow)
		}),
		...docket.lines.flatMap((line) => decisionNotes(line, docket.site.zone))
	];
}

function dispositionRow(line: DocketLineView): Content[] {
	const life = line.remainingHours;
	const range = life === null ? '' : span(days(life.low), days(life.high));
	const palletCount = line.outcome?.pallets ?? line.pallets;
	const pallets = `${palletCount} ${palletCount === 1 ? 'pallet' : 'pallets'}`;
	const name = line.variety === null ? line.product : `${line.product}, ${line.variety}`;
	const cases = line.outcome?.cases ?? line.casesReceived ?? line.casesAdvised;
	return [
		figure(String(line.ordinal)),
		{ stack: [words(name), sentence(`lot ${line.lot}`)] },
		{
			stack: [
				figure(line.firstSscc === null ? '–' : sscc(line.firstSscc), { size: 7.5 }),
				sentence([line.gtin, pallets].filter(Boolean).join(', '))
			]
		},
		casesCell(line, cases),
		life === null
			? sentence('not known')
			: { stack: [figure(days(life.value), { bold: true }), figure(range, { size: 8 })] },
		figure(days(line.neededHours)),
		{ stack: outcomesOf(line) }
	];
}

/** The outcome of the whole line, or of each group with its cases. */
function outcomesOf(line: DocketLineView): Content[] {
	return decidedGroups(line).map(({ outcome, cases }): Content => ({
		columns: [
			{ ...outcomeMark(outcome, 8.5), width: 14, margin: [0, 1.4, 0, 0] },
			{
				...words(line.groups ? `${outcomeWord(outcome)}, ${decimal(cases, 0)}` : outcomeWord(outcome), {
					bold: true
				}),
				width: '*'
			}
		]
	}));
}

/** What was decided on, and beside it the papers' count where it differs. */
function casesCell(line: DocketLineView, cases: number): Content {
	const decided = figure(decimal(cases, 0));
	return cases === line.casesAdvised
		? decided
		: { stack: [decided, sentence(`of ${decimal(line.casesAdvised, 0)}`, { size: 7.8 })] };
}

/** Extension digit, company prefix and serial, check digit: as printed under the bars of a pallet label. */
function sscc(digits: string): string {
	return /^\d{18}$/u.test(digits)
		? `${digits.slice(0, 1)} ${digits.slice(1, 8)} ${digits.slice(8, 17)} ${digits.slice(17)}`
		: digits;
}

function decisionNotes(line: DocketLineView, zone: string): Content[] {
	if (line.groups) return line.groups.map((group) => noteBelow(groupNote(line, group, zone)));
	if (line.outcome === null) return [];
	const { condition, conditionKind, reason } = line.outcome;
	const kind = conditionKind ? conditionWords[conditionKind] : null;
	const said = [kind, condition].filter(Boolean).join(': ');
	const where = line.outcome.outcome === 'reject' ? placeText(line.outcome) : '';
	return [
		...(said ? [noteBelow(`Condition, line ${line.ordinal}: ${said}`)] : []),
		...(reason === null ? [] : [noteBelow(`Reason, line ${line.ordinal}: ${reason}`)]),
		...(where ? [noteBelow(`Goods of line ${line.ordinal}: ${where}`)] : [])
	];
}

/** "Line 1, by the doors: 24 cases, 2 pallets, reject; too warm; returned". */
function groupNote(line: DocketLineView, group: LineOutcomeView, zone: string): string {
	const counts = `${decimal(group.cases, 0)} cases, ${decimal(group.pallets, 0)} ${group.pallets === 1 ? 'pallet' : 'pallets'}`;
	const details = groupDetails(group, zone);
	return `Line ${line.ordinal}, ${group.name}: ${counts}, ${outcomeWord(group.outcome).toLowerCase()}${details ? `; ${details}` : ''}`;
}
