import type { SeriesView } from './schemas/docket';
import type { LineView } from './schemas/file-lines';
import type { TraceBasis, TraceLinesView } from './schemas/trace-basis';

/** An answer of our own API that is not the data asked for: its sentence is fit to be shown. */
export class ApiRefusal extends Error {
	constructor(
		readonly code: string,
		message: string,
		readonly status: number
	) {
		super(message);
	}
}

async function answerOf<Data>(response: Response): Promise<Data> {
	if (response.ok) return response.json();
	const body: unknown = await response.json().catch(() => null);
	const isKnown = typeof body === 'object' && body !== null && 'message' in body && 'code' in body;
	throw new ApiRefusal(
		isKnown ? String(body.code) : 'unreachable',
		isKnown ? String(body.message) : 'The server did not answer as expected. Try again.',
		response.status
	);
}

/** The series of a trace between two instants, thinned to what the width resolves. */
export async function fetchSeries(
	traceId: string,
	view: { fromMs: number; toMs: number } | null,
	points: number
): Promise<SeriesView> {
	const query = new URLSearchParams({ points: String(points) });
	if (view) {
		query.set('from', new Date(view.fromMs).toISOString());
		query.set('to', new Date(view.toMs).toISOString());
	}
	return answerOf(await fetch(`/api/v1/traces/${traceId}/series?${query}`));
}

/** The line of the export that one reading of a trace was made of, as it stands there. */
export async function fetchReadingLine(traceId: string, atMs: number): Promise<LineView> {
	const query = new URLSearchParams({ at: new Date(atMs).toISOString() });
	return answerOf(await fetch(`/api/v1/traces/${traceId}/line?${query}`));
}

/** A trace with every reading, and what it was assessed from. */
export async function fetchTraceBasis(traceId: string): Promise<TraceBasis> {
	return answerOf(await fetch(`/api/v1/traces/${traceId}/basis`));
}

/** The line of the export that each reading of a trace was made of. */
export async function fetchTraceLines(traceId: string): Promise<TraceLinesView> {
	return answerOf(await fetch(`/api/v1/traces/${traceId}/lines`));
}
