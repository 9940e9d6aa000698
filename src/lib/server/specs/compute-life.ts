import { computeLife, isComputable } from '../../domain/shelf-life/compute-life';
import { computeIssues } from '../../messages/en/compute-faults';
import { computeAnswer, readComputeRequest, type ComputeAnswer } from '../../schemas/compute';
import type { Context } from '../context';
import { authorize } from '../policies';
import { InvalidFields } from '../shipments/invalid-fields';
import { parseBoundedJson } from './bounded-json';

/** Life used by the readings sent, by the model sent. @throws InvalidFields naming each faulty field */
export function computeLifeOf(input: unknown): ComputeAnswer {
	const request = readComputeRequest(input);
	if (!('question' in request)) throw new InvalidFields(computeIssues(request));
	const computed = computeLife(request.question);
	if (!isComputable(computed))
		throw new InvalidFields(computeIssues([{ field: 'model', code: 'beyond-numbers' }]));
	return computeAnswer(request, computed);
}

/** The same for a caller of the API; nothing is looked up and nothing is kept. */
export function computeForCaller(ctx: Context, body: string): ComputeAnswer {
	authorize(ctx, 'life.compute');
	return computeLifeOf(parseBoundedJson(body));
}
