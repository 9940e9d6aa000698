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

/** The same as a form sends it, its ends by the clock of the site. */
export const typedTrim = z.object({
	traceId: z.uuid('Choose a trace.'),
	fromAt: neededText(32, 'Say from when.'),
	toAt: neededText(32, 'Say until when.'),
	reason: neededText(300, 'Say why these readings are not the journey.')
});
export type TypedTrim = z.output<typeof typedTrim>;

/** Takes a trim back. */
export const trimUndoing = z.object({ trimId: z.uuid('Choose a trim.') });
