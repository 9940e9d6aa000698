import { z } from 'zod';
import { decimalField, neededText, revisionField, ticked } from './field';
import { gradesField } from './finding-grades';
import { choice, listQuery } from './list';

export const productForm = z.object({
	name: neededText(120, 'Enter the product’s name, as it stands on the papers.'),
	family: neededText(60, 'Enter the family, such as berries or fish.').transform((family) =>
		family.toLowerCase()
	),
	countUnit: neededText(30, 'Enter what is counted, such as case or box.'),
	/** Ticked: the dock accepts by itself what no finding holds. */
	dockMayAccept: z
		.string()
		.optional()
		.transform((value) => value === 'on' || value === 'true'),
	revision: revisionField
});
export type ProductForm = z.output<typeof productForm>;

const longestDays = 3650;
const daysFault = `Enter whole days, from 0 to ${longestDays}, or leave it empty.`;

/** What is asked of a product's loads beyond life: dates, a logger, and how much each finding counts for. */
export const productRulesForm = z.object({
	minimumDatedDays: decimalField(daysFault, { min: 0, max: longestDays }).refine(
		(days) => days === null || Number.isInteger(days),
		daysFault
	),
	isNotOlderThanLast: ticked,
	isLoggerRequired: ticked,
	grades: gradesField,
	revision: revisionField
});
export type ProductRulesForm = z.output<typeof productRulesForm>;

export const varietyForm = z.object({
	variety: neededText(120, 'Enter the variety or pack, such as a trade name or 12 × 125 g.')
});

export const productSorts = ['name', 'family', 'life', 'needed', 'upper', 'version'] as const;

export const productQuery = listQuery(productSorts).extend({
	family: z.string().trim().max(60).catch(''),
	state: choice(['in-use', 'off', 'all'])
});
export type ProductQuery = z.output<typeof productQuery>;
