import { computeLife, isComputable } from '../../domain/shelf-life/compute-life';
import { computeIssues } from '../../messages/en/compute-faults';
import { computeAnswer, readComputeRequest, type ComputeAnswer } from '../../schemas/compute';
import { InvalidFields } from '../shipments/invalid-fields';

/** Life used by the readings sent, by the model sent. @throws InvalidFields naming each faulty field */
export function computeLifeOf(input: unknown): ComputeAnswer {
	const request = readComputeRequest(input);
	if (!('question' in request)) throw new InvalidFields(computeIssues(request));
	const computed = computeLife(request.question);
	if (!isComputable(computed))
		throw new InvalidFields(computeIssues([{ field: 'model', code: 'beyond-numbers' }]));
	return computeAnswer(request, computed);
}
