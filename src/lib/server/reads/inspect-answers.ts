import type { Answers, QuestionCode } from '../../domain/ingest/ingestion';
import { unitCodes, type AnswerField } from '../../schemas/inspect';

/** The field in which each kind of question is answered. */
export const questionFields: Readonly<Record<QuestionCode, AnswerField>> = {
	'date-order': 'dateOrder',
	zone: 'zone',
	unit: 'unit',
	'temperature-column': 'column',
	start: 'start',
	interval: 'intervalSeconds',
	part: 'part'
};

/** What is sent back in a field to give this answer; null where the answer speaks of something else. */
export function answerValue(field: AnswerField, answer: Answers): string | null {
	const values: Readonly<Record<AnswerField, string | undefined>> = {
		dateOrder: answer.dateOrder?.toUpperCase(),
		zone: answer.zone,
		unit: answer.unit && unitCodes[answer.unit],
		column: answer.temperatureColumn,
		start: answer.startMs === undefined ? undefined : new Date(answer.startMs).toISOString(),
		intervalSeconds: answer.intervalSeconds?.toString(),
		part: answer.part
	};
	return values[field] ?? null;
}
