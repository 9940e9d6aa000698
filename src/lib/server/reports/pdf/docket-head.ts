import type { Content } from 'pdfmake/interfaces';
import type { Draft } from './draft';
import { palette, sizePoints } from './palette';
import { decimal } from './text';
import { label, sentence, words } from './type-styles';

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
