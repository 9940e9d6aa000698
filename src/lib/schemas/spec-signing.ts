import { z } from 'zod';
import { neededText, optionalDay } from './field';

const sha256 = z.string().regex(/^[0-9a-f]{64}$/, 'Open the page again: this is not a version of it.');
const noneOr = <Schema extends z.ZodType>(schema: Schema) => z.union([z.literal(''), schema]).default('');

/** What the editor's form says beside the figures: whose spec it is, and which draft it was drawn from. */
export const draftRef = z.object({
	varietyId: noneOr(z.uuid()).transform((id) => id || null),
	seenSha256: noneOr(sha256),
	/** Key of the starting spec the figures came from. */
	copiedFrom: z
		.string()
		.max(80)
		.default('')
		.transform((key) => key || null)
});

export const specSignForm = z.object({
	specVersionId: z.uuid(),
	figuresSha256: sha256,
	reason: neededText(500, 'Say why: it stands in the ledger of versions and in the record.'),
	password: z.string({ error: 'Enter your password.' }).min(1, 'Enter your password.').max(200),
	email: z.string().trim().max(254).default(''),
	code: z.string().trim().max(12).default(''),
	inForceOn: optionalDay
});
export type SpecSignForm = z.output<typeof specSignForm>;

export const specDiscardForm = z.object({ specVersionId: z.uuid() });

/** Which of a product's specs, and which version of it, an address asks for. */
export const specSheetQuery = z.object({
	variety: z.uuid().nullable().catch(null).default(null),
	/** A starting spec to draw the editor from. */
	from: z.string().trim().max(80).nullable().catch(null).default(null),
	version: z.coerce.number().int().min(1).nullable().catch(null).default(null)
});
