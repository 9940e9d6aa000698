import { Refusal, type RefusalCode } from '../refusals';
import { InvalidFields } from '../shipments/invalid-fields';
import { parseBoundedJson } from './bounded-json';
import { computeLifeOf } from './compute-life';

/** An answer as JSON text, or a refusal in a shape that crosses from one thread to another. */
export type ComputeOutcome =
	| { readonly json: string }
	| { readonly refused: RefusalCode; readonly message: string }
	| { readonly issues: Record<string, string> };

/** Answers the JSON of a question; what is refused comes back as data, a bug is thrown. */
export function answerCompute(body: string): ComputeOutcome {
	try {
		return { json: JSON.stringify(computeLifeOf(parseBoundedJson(body))) };
	} catch (error) {
		if (error instanceof InvalidFields) return { issues: error.issues };
		if (error instanceof Refusal) return { refused: error.code, message: error.message };
		throw error;
	}
}

/** The JSON of an outcome. @throws the refusal it holds */
export function jsonOf(outcome: ComputeOutcome): string {
	if ('json' in outcome) return outcome.json;
	if ('issues' in outcome) throw new InvalidFields(outcome.issues);
	throw new Refusal(outcome.refused, outcome.message);
}
