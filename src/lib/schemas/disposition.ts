import { z } from 'zod';
import { conditionKinds, isPlaceAgainst, whereaboutsKinds } from '../domain/receiving/line-groups';
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

/** Left out by whoever decides a line whole; null where the field was left empty. */
const leftOut = (longest: number) => optionalText(longest).optional();

const count = z
	.preprocess(
		(value) => (value === '' || value === null ? undefined : value),
		z.coerce
			.number('Write a whole number.')
			.int('Write a whole number.')
			.min(0, 'Not less than nothing.')
			.max(1_000_000, 'At most 1,000,000.')
			.optional()
	)
	.optional();

const emptyAsNull = <Kind extends string>(kinds: readonly [Kind, ...Kind[]], fault: string) =>
	z.preprocess((value) => (value === '' ? null : value), z.enum(kinds, fault).nullable()).optional();

const groupShape = z.object({
	lineId: z.uuid(),
	outcome: z.enum(outcomes, 'Choose accept, accept with conditions, hold or reject.'),
	condition: optionalText(400),
	reason: optionalText(400),
	/** Several rows of one line are its groups; each then has its counts. */
	name: leftOut(80),
	cases: count,
	pallets: count,
	whereabouts: emptyAsNull(whereaboutsKinds, 'Choose where the goods are.'),
	place: leftOut(80),
	conditionKind: emptyAsNull(conditionKinds, 'Choose the kind of condition.'),
	awaited: leftOut(400),
	/** By the clock of the site, or with its offset. */
	until: leftOut(40)
});
type Group = z.output<typeof groupShape>;

/** A group's faults, by field. */
function groupFaults(row: Group): Partial<Record<keyof Group, string>> {
	if (row.outcome === 'conditions' && !row.condition && !row.conditionKind)
		return { condition: 'Say the condition: ship first, sort, shorter date.' };
	if (row.outcome === 'hold')
		return {
			...(row.awaited ? {} : { awaited: 'Say what is awaited: a result, a second look, an answer.' }),
			...(row.until ? {} : { until: 'Say until when it is held.' }),
			...goneFault(row)
		};
	if (row.outcome !== 'reject') return goneFault(row);
	return {
		...(row.reason ? {} : { reason: 'Say why this line is refused.' }),
		// A form that asks where the goods go is answered; a program that knows no groups leaves the field out.
		...(row.whereabouts === null ? { whereabouts: 'Say where the refused goods go.' } : {}),
		...goneFault(row)
	};
}

function goneFault({ outcome, whereabouts }: Group): { whereabouts?: string } {
	if (!whereabouts || !isPlaceAgainst(outcome, whereabouts)) return {};
	return {
		whereabouts:
			outcome === 'reject'
				? 'Refused goods do not go into the store. Say where they go.'
				: 'Goods that are returned or dumped are refused, not taken or held.'
	};
}

/** What a form sends of answers to another outcome than the one chosen says nothing. */
function ofOutcome(row: Group): Group {
	const isFor = (...wanted: Group['outcome'][]) => wanted.includes(row.outcome);
	return {
		...row,
		condition: isFor('conditions') ? row.condition : null,
		reason: isFor('accept') ? null : row.reason,
		...(row.conditionKind === undefined || isFor('conditions') ? {} : { conditionKind: null }),
		...(row.awaited === undefined || isFor('hold') ? {} : { awaited: null }),
		...(row.until === undefined || isFor('hold') ? {} : { until: null })
	};
}

const line = groupShape
	.superRefine((row, ctx) => {
		for (const [field, message] of Object.entries(groupFaults(row)))
			ctx.addIssue({ code: 'custom', path: [field], message });
	})
	.transform(ofOutcome);

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
