import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { z } from 'zod';
import { temperatureUnits } from '../../domain/units';
import { parts, type Answers } from '../../domain/ingest/ingestion';
import type { StoredIngestion } from '../../schemas/read';
import type { Context } from '../context';
import { RememberedLayout } from '../db/models/remembered-layout';
import { sha256Hex } from '../storage/sha256';
import type { ReadResult } from './read-bytes';

/** Answers as they stand in a JSON column. */
export const answersSchema = z.object({
	dateOrder: z.enum(['dmy', 'mdy', 'ymd']).optional(),
	unit: z.enum(temperatureUnits).optional(),
	zone: z.string().max(64).optional(),
	temperatureColumn: z.string().max(200).optional(),
	intervalSeconds: z.number().positive().optional(),
	startMs: z.number().optional(),
	part: z.enum(parts).optional()
});

/** Answers that hold for every file of a make; a start or an interval is one file's own. */
function lasting({ dateOrder, unit, zone, temperatureColumn }: Answers): Answers {
	return answersSchema.parse(
		JSON.parse(JSON.stringify({ dateOrder, unit, zone, temperatureColumn }))
	) as Answers;
}

/** The same for files of one make, whatever length the reader's own name for it has. */
function fingerprintColumn(fingerprint: string): string {
	return /^[0-9a-f]{64}$/.test(fingerprint) ? fingerprint : sha256Hex(fingerprint);
}

/**
 * A question that was answered before for files of this make and supplier, read again with that answer.
 * The make shows only in a reading, so the first choice is tried, for its fingerprint alone.
 */
export async function rememberedReading(
	summary: StoredIngestion,
	partnerId: string,
	readWith: (answers: Answers) => Promise<ReadResult>
): Promise<{ summary: StoredIngestion; layoutId: string } | null> {
	if (summary.kind !== 'question') return null;
	const tried = await readWith(summary.question.choices[0]?.answer ?? {});
	if (tried.summary.kind !== 'ok') return null;
	const layout = await RememberedLayout.findOne({
		where: {
			fingerprint: fingerprintColumn(tried.summary.layout.fingerprint),
			partnerId,
			withdrawnAt: null
		},
		order: [['version', 'DESC']]
	});
	if (!layout) return null;
	const again = await readWith(answersSchema.parse(layout.answers) as Answers);
	// A remembered answer that no longer settles the question must not hide it.
	return again.summary.kind === 'ok' ? { summary: again.summary, layoutId: layout.id } : null;
}

/** Remembers an answer for files of this make from this supplier; a new answer is a new version. */
export async function rememberLayout(
	ctx: Context,
	summary: Extract<StoredIngestion, { kind: 'ok' }>,
	partnerId: string,
	transaction: Transaction
): Promise<string> {
	const fingerprint = fingerprintColumn(summary.layout.fingerprint);
	const where = { fingerprint, partnerId };
	const version = 1 + (await RememberedLayout.count({ where, transaction }));
	const made = await RememberedLayout.create(
		{
			id: uuid(),
			...where,
			version,
			answers: lasting(summary.context.answers),
			confirmedBy: ctx.actor.id,
			confirmedAt: ctx.now,
			withdrawnAt: null
		},
		{ transaction }
	);
	return made.id;
}
