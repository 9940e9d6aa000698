import { z } from 'zod';
import { minorUnitDigits } from '../format';
import type { Verdict } from './docket';
import { optionalText } from './field';
import { choice, listQuery } from './list';

export const claimStatuses = ['open', 'noticed', 'filed', 'settled', 'declined', 'closed'] as const;
export type ClaimStatus = (typeof claimStatuses)[number];

export const claimStatusWords: Record<ClaimStatus, string> = {
	open: 'Open',
	noticed: 'Notice given',
	filed: 'Filed',
	settled: 'Settled',
	declined: 'Declined',
	closed: 'Closed'
};

/** An amount as people type it: `9,769.00`, `9769`, `9.769,00`. */
export function minorUnitsOf(text: string, currency: string): number | null {
	const digits = minorUnitDigits(currency);
	const cleaned = text.trim().replace(/[\s' ]/g, '');
	// Three decimals look like a group of thousands; in a currency that has three they are decimals.
	if (digits === 3 && /^\d+[.,]\d{3}$/.test(cleaned)) return Number(cleaned.replace(/[.,]/, ''));
	const match = /^(\d{1,3}(?:[.,]\d{3})+|\d+)(?:[.,](\d{1,3}))?$/.exec(cleaned);
	if (!match?.[1]) return null;
	const fraction = match[2] ?? '';
	if (fraction.length > digits) return null;
	return Number(match[1].replace(/[.,]/g, '')) * 10 ** digits + Number(fraction.padEnd(digits, '0') || 0);
}

const money = {
	amount: z.string().trim().max(30).default(''),
	currency: z
		.string()
		.trim()
		.toUpperCase()
		.regex(/^[A-Z]{3}$/, 'A currency has three letters, such as EUR.')
};

function amountOf<Fields extends { amount: string; currency: string }>(fields: Fields, ctx: z.RefinementCtx) {
	const amountMinor = fields.amount === '' ? null : minorUnitsOf(fields.amount, fields.currency);
	if (fields.amount !== '' && amountMinor === null)
		ctx.addIssue({
			code: 'custom',
			path: ['amount'],
			message: `Write the amount with ${minorUnitDigits(fields.currency)} decimals at most, such as 9,769.00.`
		});
	return { ...fields, amountMinor };
}

const againstId = z
	.union([z.literal(''), z.uuid('Choose a carrier from the list.')])
	.default('')
	.transform((id) => id || null);

/** Opens a claim on a docket. */
export const claimOpening = z
	.object({
		docket: z.string().trim().min(1, 'Say on which docket.'),
		againstId,
		...money,
		basis: optionalText(4000)
	})
	.transform(amountOf);
export type ClaimOpening = z.output<typeof claimOpening>;

/** Changes a claim; `version` is the one on screen. */
export const claimChange = z
	.object({
		againstId,
		...money,
		basis: optionalText(4000),
		status: z.enum(claimStatuses, 'Choose a status.'),
		version: z.coerce.number().int()
	})
	.transform(amountOf);
export type ClaimChange = z.output<typeof claimChange>;

export const claimListQuery = listQuery(['opened', 'docket', 'amount']).extend({
	show: choice(['all', 'unclaimed', 'running', 'ended'])
});
export type ClaimListQuery = z.output<typeof claimListQuery>;

/** A docket that money may be asked for, with its claim where one was opened. */
export interface ClaimRow {
	docketNumber: string;
	shipmentId: string;
	title: string;
	supplier: string;
	carrier: string | null;
	siteName: string;
	zone: string;
	decidedAt: string | null;
	verdict: Verdict | null;
	casesRefused: number;
	casesShort: number;
	valueMinor: number | null;
	currency: string;
	claim: {
		id: string;
		number: string;
		status: ClaimStatus;
		amountMinor: number | null;
		currency: string;
	} | null;
}

export interface ClaimView {
	id: string;
	number: string;
	status: ClaimStatus;
	version: number;
	againstId: string | null;
	against: string | null;
	amountMinor: number | null;
	currency: string;
	basis: string;
	openedBy: string;
	openedAt: string;
	files: {
		id: string;
		what: string;
		fileName: string;
		bytes: number;
		sha256: string;
		at: string;
		by: string;
	}[];
	/** What the evidence bundle holds. */
	evidence: { what: string; fileName: string; bytes: number; sha256: string }[];
	carriers: { id: string; name: string }[];
}
