import type { InspectAnswer } from '../../src/lib/schemas/inspect';
import type { Layout } from './random-layout';

/** The right answer to a question about a written layout; null where there should be no such question. */
function rightAnswer(field: string, { form, unit }: Layout): string | null {
	if (field === 'dateOrder' && (form === 'dmy' || form === 'mdy' || form === 'ymd'))
		return form.toUpperCase();
	return field === 'unit' ? unit : null;
}

/** Answers each question rightly until none is left; throws where the right answer is not among the choices. */
export function settled(
	read: (given: Record<string, string>) => InspectAnswer,
	layout: Layout
): InspectAnswer {
	const given: Record<string, string> = {};
	for (;;) {
		const answer = read(given);
		const [question] = answer.questions;
		if (!question) return answer;
		const right = rightAnswer(question.field, layout);
		const isOffered = question.choices.some(({ value }) => value === right);
		if (right === null || !isOffered || question.field in given)
			throw new Error(`Asked for ${question.field}: ${JSON.stringify(question.choices)}`);
		given[question.field] = right;
	}
}
