import type { TraceLinesView } from '../../schemas/trace-basis';
import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { getTraceFor } from '../traces/find-trace';
import { readAgain } from './read-again';
import { parseUnderstanding } from './stored-understanding';

/**
 * The line of the file that each reading of a trace was made of; the file is read once more for it.
 * @throws Refusal `not-found`, `not-allowed`
 */
export async function getTraceLines(ctx: Context, traceId: string): Promise<TraceLinesView> {
	const { trace } = await getTraceFor(ctx, traceId, 'raw-line.view');
	const read = await LoggerRead.findByPk(trace.readId);
	if (!read) throw new Error(`The read of trace ${traceId} is missing.`);
	const context = parseUnderstanding(read.understanding)?.context;
	const found = context ? await readAgain(read, context, false, { runsOf: trace.ordinal }) : null;
	const runs = found?.lines?.runs ?? [];
	const count = runs.reduce((sum, run) => sum + run.count, 0);
	// A reader that has since learnt to read the file otherwise would put the wrong line beside a reading.
	return { fileName: read.fileName, runs: count === trace.readings ? [...runs] : [] };
}
