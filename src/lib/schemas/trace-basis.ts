import type { LineRun } from '../domain/ingest/line-runs';
import type { AssessInput } from '../domain/receiving/assessment';

/** What one line was assessed from by this trace, but for the readings. */
export interface AssessedBasis extends Omit<AssessInput, 'trace'> {
	assessmentId: string;
	lineId: string;
	/** As on the docket: 1, 2 … */
	line: number;
	lot: string;
	isGoverning: boolean;
}

/** All that a browser needs to show every reading of a trace and to assess it anew. Answer of traces/{id}/basis. */
export interface TraceBasis {
	traceId: string;
	/** The packed trace, Base64; its clock as the file has it. */
	packed: string;
	clockShiftMs: number;
	/** One a line that this trace was assessed for, the governing ones first. */
	assessed: AssessedBasis[];
}

/** The line of the file that each reading of a trace was made of. Answer of traces/{id}/lines. */
export interface TraceLinesView {
	fileName: string;
	/** None where the file is not read as it was: then single lines can still be asked for. */
	runs: LineRun[];
}
