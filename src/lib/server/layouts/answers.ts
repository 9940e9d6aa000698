import { z } from 'zod';
import { parts, type Answers } from '../../domain/ingest/ingestion';
import { temperatureUnits } from '../../domain/units';

/** Answers as they stand in a JSON column. */
const answersSchema = z.object({
	dateOrder: z.enum(['dmy', 'mdy', 'ymd']).optional(),
	unit: z.enum(temperatureUnits).optional(),
	zone: z.string().max(64).optional(),
	temperatureColumn: z.string().max(200).optional(),
	intervalSeconds: z.number().positive().optional(),
	startMs: z.number().optional(),
	part: z.enum(parts).optional()
});

/** Answers from a row of the database. */
export function parseAnswers(stored: unknown): Answers {
	const given = Object.entries(answersSchema.parse(stored)).filter(([, value]) => value !== undefined);
	return Object.fromEntries(given) as Answers;
}

/** Answers that hold for every file of a make; a start, an interval or a section is one file's own. */
export function lastingAnswers({ dateOrder, unit, zone, temperatureColumn }: Answers): Answers {
	return parseAnswers({ dateOrder, unit, zone, temperatureColumn });
}
