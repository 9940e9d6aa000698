import type { Context } from '../context';
import { authorize } from '../policies';
import { runCompute } from '../reads/run-reader';
import { answerCompute, jsonOf } from './answer-compute';

/** Above this a question holds up other requests and is answered in a thread of its own: some 3,000 readings. */
const longestInPlace = 100_000;

/** Answers a caller of the API, as JSON text; nothing is looked up and nothing is kept. */
export async function computeForCaller(ctx: Context, body: string): Promise<string> {
	authorize(ctx, 'life.compute');
	return jsonOf(body.length > longestInPlace ? await runCompute(body) : answerCompute(body));
}
