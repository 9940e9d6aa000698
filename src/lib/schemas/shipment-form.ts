import { z } from 'zod';
import { gtin14Of } from '../domain/gs1/check-digit';
import { ssccOf } from '../domain/gs1/sscc';
import {
	optionalCount,
	optionalDay,
	optionalId,
	optionalNumber,
	optionalText,
	rowsOf,
	text,
	wallTime
} from './shipment-parts';

export const modes = ['road', 'sea', 'air', 'rail'] as const;
export const openingKinds = ['undeclared', 'declared', 'computed'] as const;
export const placements = ['air', 'between-cases', 'in-product'] as const;

/** A GTIN of any length, kept as fourteen digits. */
const gtin = optionalText(20).transform((typed, ctx) => {
	if (typed === null) return null;
	const digits = typed.replace(/[\s-]/g, '');
	const whole = gtin14Of(digits);
	if (whole !== null) return whole;
	const isRightLength = /^(\d{8}|\d{12,14})$/.test(digits);
	ctx.addIssue(
		isRightLength
			? 'The check digit does not fit. One digit is wrong, or two have changed places.'
			: 'A GTIN has 8, 12, 13 or 14 digits.'
	);
	return z.NEVER;
});

/** SSCCs as scanned or typed, apart by spaces, commas or lines. */
const ssccs = z
	.union([z.string(), z.array(z.string())], { error: 'Pallet labels, one a line.' })
	.nullish()
	.transform((typed, ctx) => {
		const list = Array.isArray(typed) ? typed : (typed ?? '').split(/[\n,;]+/);
		const wanted = list.map((item) => item.trim()).filter((item) => item !== '');
		const found = wanted.map((item) => ssccOf(item));
		const bad = wanted.find((_, at) => found[at] === null);
		if (bad !== undefined)
			ctx.addIssue(`${bad} is not an SSCC: 18 digits, the last of which is the check digit.`);
		const whole = found.filter((item) => item !== null);
		const twice = whole.find((item, at) => whole.indexOf(item) !== at);
		if (twice !== undefined) ctx.addIssue(`${twice} stands there twice.`);
		return whole;
	});

const line = z
	.object({
		id: optionalId,
		productId: z.uuid({ error: 'Choose a product.' }),
		description: optionalText(160),
		lot: text(60, 'Write the lot as it stands on the cases.'),
		gtin,
		ssccs,
		cases: optionalCount(1_000_000),
		pallets: optionalCount(10_000),
		value: optionalNumber(0, 1e12),
		currency: optionalText(3).refine(
			(code) => code === null || /^[A-Z]{3}$/.test(code),
			'Three letters, such as EUR.'
		),
		bestBeforeOn: optionalDay,
		neededDays: optionalNumber(0, 3650, 'days'),
		/** Equal names are one chamber of the load; none is the load's own. */
		compartment: optionalText(40),
		openingKind: z
			.enum(openingKinds, { error: 'Declared, worked out, or not declared.' })
			.default('undeclared'),
		openingHours: optionalNumber(0, 100_000, 'hours'),
		openingPlusMinusHours: optionalNumber(0, 100_000, 'hours'),
		openingSince: wallTime,
		openingCelsius: optionalNumber(-60, 60, '°C'),
		openingPlusMinusCelsius: optionalNumber(0, 30, '°C'),
		openingBasis: optionalText(200)
	})
	.superRefine((row, ctx) => {
		if (row.cases === null)
			ctx.addIssue({ code: 'custom', path: ['cases'], message: 'How many cases are advised?' });
		if (row.openingKind === 'declared' && row.openingHours === null)
			ctx.addIssue({
				code: 'custom',
				path: ['openingHours'],
				message: 'How many hours of life had been used before the first reading?'
			});
		if (row.openingKind === 'computed' && (row.openingSince === null || row.openingCelsius === null))
			ctx.addIssue({
				code: 'custom',
				path: [row.openingSince === null ? 'openingSince' : 'openingCelsius'],
				message: 'To work it out, since when and at how many °C?'
			});
	});

const handover = z.object({
	id: optionalId,
	partnerId: optionalId,
	holder: optionalText(120),
	place: optionalText(160),
	planned: wallTime,
	actual: wallTime,
	plusMinusMinutes: optionalCount(10_000),
	source: optionalText(120),
	setPointCelsius: optionalNumber(-60, 60, '°C'),
	allowedHours: optionalNumber(0, 100_000, 'hours')
});

const expectedLogger = z.object({
	id: optionalId,
	serial: text(60, 'The serial as it stands on the logger.'),
	/** The line it rides with, counted from 1 as on the papers. */
	line: optionalCount(200),
	/** The chamber whose lines it speaks for, where it rides with no line. */
	compartment: optionalText(40),
	position: optionalText(120),
	placement: z.enum(placements, { error: 'Where does it ride?' }).default('air')
});

/** What the papers say of one load. Local times are by the site's clock. */
export const shipmentInput = z.object({
	/** Made by the client, so that sending twice makes one docket. */
	id: optionalId,
	title: optionalText(200),
	supplierId: z.uuid({ error: 'Choose the supplier.' }),
	carrierId: optionalId,
	laneId: optionalId,
	purchaseOrder: optionalText(60),
	billOfLading: optionalText(60),
	mode: z.enum(modes, { error: 'Road, sea, air or rail.' }).default('road'),
	vehicle: optionalText(60),
	seal: optionalText(60),
	dock: optionalText(40),
	termsOfSale: optionalText(120),
	rejectWithinHours: optionalNumber(0.25, 2_000, 'hours'),
	rejectBasis: optionalText(120),
	due: wallTime.refine((value) => value !== null, 'When is it due?'),
	lines: rowsOf(line, { most: 200, ignore: ['currency', 'openingKind'] }).refine(
		(rows) => rows.length > 0,
		'Add at least one line: what is on the load?'
	),
	handovers: rowsOf(handover, { most: 20, ignore: ['plusMinusMinutes'] }),
	loggers: rowsOf(expectedLogger, { most: 60, ignore: ['placement'] })
});
export type ShipmentInput = z.output<typeof shipmentInput>;
export type LineInput = ShipmentInput['lines'][number];
export type HandoverInput = ShipmentInput['handovers'][number];
export type LoggerInput = ShipmentInput['loggers'][number];

/** A change before signing: the whole papers again, the version they were read at, and why. */
export const shipmentChange = shipmentInput.extend({
	version: z.coerce.number().int().min(0),
	reason: optionalText(300)
});
export type ShipmentChange = z.output<typeof shipmentChange>;

export const cancelInput = z.object({ reason: text(300, 'Why is it cancelled?') });
