import type { Answers, Ingestion } from '../../domain/ingest/ingestion';
import { choiceLabel } from '../../messages/en/ingest-questions';
import { answerValue, questionFields } from './inspect-answers';

/** What is wrong with the answers given: one that the file does not offer, or under which it cannot be read. */
export function answerFaults(
	answers: Answers,
	ingestion: Ingestion,
	readWith: (answers: Answers) => Ingestion
): Record<string, string> {
	if (ingestion.kind === 'question') {
		const { question } = ingestion;
		const field = questionFields[question.code];
		if (answerValue(field, answers) === null) return {};
		const offered = question.choices.map(
			(choice) => answerValue(field, choice.answer) ?? choiceLabel(question, choice)
		);
		return { [field]: `${field} names nothing that this file offers. It offers: ${offered.join(', ')}.` };
	}
	if (ingestion.kind === 'refused') {
		const { unit, ...others } = answers;
		const isUnitAtFault =
			unit !== undefined && ingestion.code === 'no-readings' && readWith(others).kind !== 'refused';
		return isUnitAtFault ? { unit: `In ${unit} none of the file’s temperatures is possible.` } : {};
	}
	const { decisions, channels } = ingestion.understanding;
	const isUsed = (field: string): boolean =>
		decisions.some((decision) => decision.field === field && decision.because === 'answer');
	const faults: Record<string, string> = {};
	if (answers.temperatureColumn !== undefined && !isUsed('column'))
		faults.column = `column names no column of this file. Its columns are: ${channels.map(({ name }) => name).join(', ')}.`;
	if (answers.part !== undefined && answers.part !== 'first' && !isUsed('part'))
		faults.part = 'part names none of this file’s recordings: it has only one.';
	return faults;
}
