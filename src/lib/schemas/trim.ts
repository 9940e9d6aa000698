import { z } from 'zod';
import { neededText } from './field';

const instant = z.iso.datetime({
	offset: true,
	error: 'Give an instant with its zone, such as 2026-04-03T05:30:00Z.'
});

/** A stretch of a trace that was not the journey. */
export const trimForm = z
	.object({
		traceId: z.uuid('Choose a trace.'),
		fromAt: instant,
		toAt: instant,
		reason: neededText(300, 'Say why these readings are not the journey.')
	})
	.refine((form) => Date.parse(form.fromAt) < Date.parse(form.toAt), {
		path: ['toAt'],
		message: 'The end lies before the beginning.'
	});
export type TrimForm = z.output<typeof trimForm>;
