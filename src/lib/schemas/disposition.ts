import { z } from 'zod';
import { outcomes } from '../domain/receiving/recommendation';

/** What a signature may mean. Source: 21 CFR 11.50(a)(3) names review, approval, responsibility and authorship. */
export const meanings = ['approval', 'review', 'authorship'] as const;

const optionalText = (longest: number) =>
	z
		.string()
		.trim()
		.max(longest, `At most ${longest} characters.`)
		.optional()
		.transform((text) => (text ? text : null));

const line = z
	.object({
		lineId: z.uuid(),
		outcome: z.enum(outcomes, 'Choose accept, accept with conditions or reject.'),
		condition: optionalText(400),
		reason: optionalText(400)
	})
	.superRefine((row, ctx) => {
		if (row.outcome === 'hold')
			ctx.addIssue({
				code: 'custom',
				path: ['outcome'],
				message: 'A hold is put on the docket, not signed. Choose what becomes of the goods.'
			});
		if (row.outcome === 'conditions' && !row.condition)
			ctx.addIssue({
				code: 'custom',
				path: ['condition'],
				message: 'Say the condition: ship first, sort, shorter date.'
			});
		if (row.outcome === 'reject' && !row.reason)
			ctx.addIssue({ code: 'custom', path: ['reason'], message: 'Say why this line is refused.' });
	});

/** A decision ready to be signed: what becomes of each line, why, and who stands behind it. */
export const dispositionSchema = z.object({
	lines: z.array(line).min(1, 'A decision needs at least one line.'),
	reasons: z.string().trim().max(4000, 'At most 4,000 characters.').default(''),
	meaning: z.enum(meanings, 'Say what this signature means.'),
	password: z.string().min(1, 'Enter your password: it is asked at every signature.'),
	/** Of the first signature of a series. */
	email: z.string().trim().max(254).optional(),
	code: z.string().trim().max(12).optional(),
	evidenceSha256: z.string().regex(/^[0-9a-f]{64}$/, 'Open the page again: what you sign was not shown.'),
	amendmentReason: optionalText(1000),
	notify: z
		.string()
		.optional()
		.transform((value) => value === 'on' || value === 'true')
});

export type DispositionInput = z.output<typeof dispositionSchema>;
