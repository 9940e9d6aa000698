import { z } from 'zod';

/**
 * What is kept, for how long after what, and where the default comes from. Every default is a floor somebody named for
 * somebody's records: local law and contract govern.
 */
export const retentionRules = [
	{
		rule: 'uploads',
		what: 'Uploaded exports, photographs, files of notes and answers, papers of claims',
		after: 'the decision',
		months: 24,
		source: 'PACA, 7 CFR 46.14: 2 years; traceability rule, 21 CFR 1.1455(c): 24 months; from memory'
	},
	{
		rule: 'refused-uploads',
		what: 'Uploads that could not be read, or were withdrawn',
		after: 'they came',
		months: 12,
		source: 'Regulation (EC) 37/2005, art. 2(2): recordings kept at least a year; from memory'
	},
	{
		rule: 'people',
		what: 'What dockets and the trail say of people: notes, drivers and their signatures, answers, mails',
		after: 'the decision, or the entry where it is about no docket',
		months: 60,
		source:
			'EU guidance on Regulation (EC) 178/2002, art. 18: 5 years; EU GDP 2013/C 343/01, ch. 4: 5 years; from memory'
	},
	{
		rule: 'claims',
		what: 'All of a docket under a claim, after the claim has ended',
		after: 'its end',
		months: 12,
		source: '49 CFR 379, appendix A: claims files, 1 year after settlement; from memory'
	}
] as const;
export type RetentionRule = (typeof retentionRules)[number]['rule'];

/** Months by rule. */
export type RetentionPeriods = Record<RetentionRule, number>;

const months = z.coerce
	.number('A number of months.')
	.int('A whole number of months.')
	.min(6, 'At least 6 months.')
	.max(1200, 'At most 1200 months.');

/** The periods as a form sends them. */
export const retentionForm = z.object({
	uploads: months,
	'refused-uploads': months,
	people: months,
	claims: months
});

/** The periods as they are kept; what is missing or broken is the default. */
export function periodsOf(kept: unknown): RetentionPeriods {
	const given = typeof kept === 'object' && kept !== null ? (kept as Record<string, unknown>) : {};
	return Object.fromEntries(
		retentionRules.map(({ rule, months: fallback }) => [
			rule,
			months.catch(fallback).parse(given[rule] ?? fallback)
		])
	) as RetentionPeriods;
}

/** A hold by hand, and its end. */
export const retentionHoldForm = z.object({
	docket: z.string().trim().toUpperCase().min(1, 'Which docket?').max(24),
	reason: z.string().trim().min(3, 'Say why, for whoever asks later.').max(1000, 'At most 1,000 characters.')
});
export const retentionReleaseForm = z.object({
	holdId: z.uuid(),
	reason: z.string().trim().min(3, 'Say why, for whoever asks later.').max(1000, 'At most 1,000 characters.')
});
