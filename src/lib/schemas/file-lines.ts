import { z } from 'zod';

const instant = z.iso.datetime({
	offset: true,
	error: 'Give an instant with its zone, such as 2026-04-03T05:30:00Z.'
});

/** Which reading of a trace: its moment, as the series has it. */
export const lineQuery = z.object({ at: instant });
export type LineQuery = z.output<typeof lineQuery>;

/** Lines on one page. */
export const linesPerPage = 60;

/** Which line of a file to begin at; a faulty part counts as not given. */
export const linesQuery = z.object({ line: z.coerce.number().int().min(1).max(100_000_000).catch(1) });

/** A reading's line of the file, as it stands there. */
export interface LineView {
	fileName: string;
	line: number;
	text: string;
	isCut: boolean;
}

/** A line of a file with the reading that was made of it. */
export interface FileLine extends Omit<LineView, 'fileName'> {
	atMs: number | null;
	celsius: number | null;
}

/** A page of a file's lines. */
export interface FileLinesView {
	fileName: string;
	docket: { number: string; title: string };
	zone: string;
	/** Of the readings beside the lines; 0 where the clock stands as the file has it. */
	clockShiftMs: number;
	/** Lines of the whole file; null where it is no text. */
	total: number | null;
	lines: FileLine[];
}
