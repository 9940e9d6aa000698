import { z } from 'zod';
import { neededText, revisionField, ticked } from './field';
import { gradesField } from './finding-grades';
import { choice, listQuery } from './list';

/** A way that loads come: from one supplier or any to one site, and how much each finding counts for on it. */
export const laneForm = z.object({
	name: neededText(120, 'Enter the lane’s name, such as where it begins and how it comes.'),
	siteId: z.uuid('Choose the site it leads to.'),
	supplierId: z
		.union([z.literal(''), z.uuid('Choose a supplier from the list.')])
		.default('')
		.transform((id) => id || null),
	isLoggerRequired: ticked,
	grades: gradesField,
	revision: revisionField
});
export type LaneForm = z.output<typeof laneForm>;

export const laneQuery = listQuery(['name', 'since']).extend({
	state: choice(['in-use', 'off', 'all'])
});
export type LaneQuery = z.output<typeof laneQuery>;
