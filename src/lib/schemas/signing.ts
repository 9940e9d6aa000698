import { z } from 'zod';
import type { Correction, SecondSignatureRules } from '../domain/authority/authority';
import { optionalNumber } from './shipment-parts';

type Standing = Record<string, { recommended: string; lowHours: number | null }>;

/** A correction that moved the recommendation, with both figures. */
export interface CorrectionView {
	kind: Correction['kind'];
	madeById: string;
	madeBy: string;
	before: Standing;
	after: Standing;
}

export interface ReviewView {
	id: string;
	by: string;
	byId: string;
	title: string;
	at: string;
	zone: string;
	reasons: string;
	decisionSha256: string;
	/** The outcomes as they were reviewed, as JSON text. */
	decision: string;
	/** Whether it was of the evidence as it stands now. */
	isOfThis: boolean;
}

export interface DeterminationView {
	id: string;
	text: string;
	by: string;
	title: string;
	at: string;
	zone: string;
	isOfThis: boolean;
}

/** What the authority table asks on this docket, and what of it is there already. */
export interface SigningStanding {
	corrections: CorrectionView[];
	rules: SecondSignatureRules;
	/** Why two signatures are needed; null: one suffices. */
	secondSignature: 'value' | 'severity' | null;
	isOverStop: boolean;
	isQualifiedPerson: boolean;
	reviews: ReviewView[];
	determinations: DeterminationView[];
}

export const determinationForm = z.object({
	text: z
		.string()
		.trim()
		.min(20, 'Write what you determined, on what, and why: at least a sentence.')
		.max(4000, 'At most 4,000 characters.'),
	evidenceSha256: z.string().regex(/^[0-9a-f]{64}$/, 'Open the page again: what you sign was not shown.'),
	password: z.string().min(1, 'Enter your password: it is asked at every signature.'),
	email: z.string().trim().max(254).optional(),
	code: z.string().trim().max(12).optional()
});
export type DeterminationForm = z.output<typeof determinationForm>;

/** The house's rules for a second signature, as an admin's form sends them. */
export const signingRulesForm = z
	.object({
		value: optionalNumber(0.01, 1_000_000_000),
		currency: z
			.string()
			.trim()
			.toUpperCase()
			.regex(/^[A-Z]{3}$/, 'Three letters, such as EUR.')
			.or(z.literal(''))
			.default(''),
		severity: z.enum(['', 'major', 'critical']).default('')
	})
	.refine(({ value, currency }) => value === null || currency !== '', {
		path: ['currency'],
		message: 'Say in which currency.'
	});
