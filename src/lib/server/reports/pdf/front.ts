import type { Content } from 'pdfmake/interfaces';
import type { DocketLineView } from '../../../schemas/docket';
import type { Draft } from './draft';
import { ledger, noteBelow } from './ledger';
import { outcomeMark, outcomeWord } from './marks';
import { palette, sizePoints } from './palette';
import { days, decimal, span } from './text';
import { figure, label, sentence, words } from './type-styles';

const notKnown = 'not known';

/** From whom to where, what it is, and four form boxes as on a consignment note. */
export function docketHead(draft: Draft): Content[] {
	const { docket } = draft;
	const place = [docket.site.name, docket.dock].filter(Boolean).join(', ');
	const cases = docket.lines.reduce((sum, line) => sum + (line.casesReceived ?? line.casesAdvised), 0);
	const pallets = docket.lines.reduce((sum, line) => sum + line.pallets, 0);
	const order = docket.purchaseOrder === null ? '' : `, order ${docket.purchaseOrder}`;
	const quantity = `${decimal(cases, 0)} cases on ${pallets} ${pallets === 1 ? 'pallet' : 'pallets'}`;
	return [
		{
			text: [
				words(docket.supplier.name, { size: sizePoints.title, bold: true }),
				words(' to ', { size: sizePoints.title, color: palette.ink2 }),
				words(place, { size: sizePoints.title, bold: true })
			]
		},
		sentence(`${docket.title}${order}, ${quantity}`, { size: sizePoints.body, margin: [0, 2, 0, 9] }),
		formBoxes(draft)
	];
}

function formBoxes(draft: Draft): Content {
	const { docket, calendar, thermometer, sheet } = draft;
	const { arrival } = docket;
	const degrees = (celsius: number) => `${thermometer.reading(celsius)} ${thermometer.sign}`;
	const setPoint = arrival?.setPointCelsius ?? null;
	const air = arrival?.returnAirCelsius ?? null;
	const seal = arrival?.sealFound ?? docket.seal;
	const sealState =
		arrival?.isSealIntact === true ? ', intact' : arrival?.isSealIntact === false ? ', broken' : '';
	const boxes = [
		[
			'Carrier at the door',
			docket.carrier?.name ?? notKnown,
			docket.billOfLading === null ? '' : `papers ${docket.billOfLading}`
		],
		[
			'Vehicle, set-point',
			[docket.vehicle ?? notKnown, setPoint === null ? '' : degrees(setPoint)].filter(Boolean).join(', '),
			air === null ? '' : `return air ${degrees(air)}`
		],
		[
			'Seal',
			`${seal ?? 'none'}${sealState}`,
			seal !== null && seal === docket.seal
				? 'as on the papers'
				: docket.seal === null
					? ''
					: `on the papers ${docket.seal}`
		],
		[
			'Arrived',
			arrival === null ? notKnown : `${calendar.day(arrival.arrivedAt)} ${calendar.time(arrival.arrivedAt)}`,
			arrival === null ? '' : `logged by ${arrival.loggedBy}`
		]
	] as const;
	return {
		table: {
			widths: boxes.map(() => (sheet.mainWidth - 41) / 4),
			body: [
				boxes.map(([name, value, note]) => ({
					stack: [
						label(name),
						sentence(value, { size: sizePoints.table, color: palette.ink, bold: true }),
						sentence(note)
					]
				}))
			]
		},
		layout: {
			hLineWidth: (i) => (i === 0 ? 1.1 : 0.8),
			hLineColor: () => palette.ink,
			vLineWidth: (i) => (i === 0 || i === boxes.length ? 0 : 0.6),
			vLineColor: () => palette.rule,
			paddingLeft: (i) => (i === 0 ? 0 : 7),
			paddingRight: () => 5,
			paddingTop: () => 5,
			paddingBottom: () => 5
		}
	};
}

/** Every line with its life against the need and what was decided. */
export function dispositions(draft: Draft): Content[] {
	const { docket } = draft;
	return [
		ledger({
			title: 'Dispositions',
			finding: null,
			width: draft.sheet.mainWidth,
			columns: [
				{ head: '', width: 10 },
				{ head: 'Product and lot', width: '*' },
				{ head: 'First pallet, SSCC; GTIN', width: 101 },
				{ head: 'Cases', width: 28, align: 'right' },
				{ head: 'Life left, d\nlow to high', width: 50, align: 'right' },
				{ head: 'Needed,\nd', width: 32, align: 'right' },
				{ head: 'Disposition', width: 76 }
			],
			rows: docket.lines.map(dispositionRow)
		}),
		...docket.lines.flatMap(decisionNotes)
	];
}

function dispositionRow(line: DocketLineView): Content[] {
	const life = line.remainingHours;
	const range = life === null ? '' : span(days(life.low), days(life.high));
	const pallets = `${line.pallets} ${line.pallets === 1 ? 'pallet' : 'pallets'}`;
	const name = line.variety === null ? line.product : `${line.product}, ${line.variety}`;
	const outcome = line.outcome?.outcome ?? 'hold';
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
		figure(decimal(cases, 0)),
		life === null
			? sentence(notKnown)
			: { stack: [figure(days(life.value), { bold: true }), figure(range, { size: 8 })] },
		figure(days(line.neededHours)),
		{
			columns: [
				{ ...outcomeMark(outcome, 8.5), width: 14, margin: [0, 1.4, 0, 0] },
				{ ...words(outcomeWord(outcome), { bold: true }), width: '*' }
			]
		}
	];
}

/** Extension digit, company prefix and serial, check digit: as printed under the bars of a pallet label. */
function sscc(digits: string): string {
	return /^\d{18}$/u.test(digits)
		? `${digits.slice(0, 1)} ${digits.slice(1, 8)} ${digits.slice(8, 17)} ${digits.slice(17)}`
		: digits;
}

function decisionNotes(line: DocketLineView): Content[] {
	if (line.outcome === null) return [];
	const { condition, reason } = line.outcome;
	return [
		...(condition === null ? [] : [noteBelow(`Condition, line ${line.ordinal}: ${condition}`)]),
		...(reason === null ? [] : [noteBelow(`Reason, line ${line.ordinal}: ${reason}`)])
	];
}
