import { z } from 'zod';
import { neededText, revisionField } from './field';
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

export const varietyForm = z.object({
	variety: neededText(120, 'Enter the variety or pack, such as a trade name or 12 × 125 g.')
});

export const productSorts = ['name', 'family', 'life', 'needed', 'upper', 'version'] as const;

export const productQuery = listQuery(productSorts).extend({
	family: z.string().trim().max(60).catch(''),
	state: choice(['in-use', 'off', 'all'])
});
export type ProductQuery = z.output<typeof productQuery>;
