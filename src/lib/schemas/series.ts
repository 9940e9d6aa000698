import { z } from 'zod';

const instant = z.iso.datetime({
	offset: true,
	error: 'Give an instant with its zone, such as 2026-04-03T05:30:00Z.'
});

/** Most points one answer draws: a wide screen has no more columns than this, and each has a low and a high. */
export const mostSeriesPoints = 8000;

/** What of a trace to draw: nothing given is all of it at a screen's width. */
export const seriesQuery = z
	.object({
		from: instant.optional(),
		to: instant.optional(),
		points: z.coerce.number().int().min(50).max(mostSeriesPoints).default(2000)
	})
	.refine(({ from, to }) => !from || !to || Date.parse(from) < Date.parse(to), {
		path: ['to'],
		message: 'lies before from'
	});
export type SeriesQuery = z.output<typeof seriesQuery>;
