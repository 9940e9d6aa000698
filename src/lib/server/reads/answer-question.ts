import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { inTransaction } from '../db/transaction';
import { writeLayout } from '../layouts/remember-layout';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { getReadFor, lockUnsigned } from './find-read';
import { readAgain } from './read-again';
import { parseUnderstanding } from './stored-understanding';
import { readColumns } from './write-received';

interface Answer {
	/** Position among the choices that were shown. */
	choice: number;
	/** Ask no more for files of this layout from this supplier; only QA and the admin may say so. */
	remember: boolean;
}

/** Reads a file again with the answer to its question; it may then ask the next. @throws Refusal `invalid` */
export async function answerQuestion(ctx: Context, readId: string, answer: Answer): Promise<void> {
	const { read, shipment } = await getReadFor(ctx, readId, 'read.upload');
	if (answer.remember) authorize(ctx, 'layout.confirm');
	const asked = parseUnderstanding(read.understanding);
	if (read.state !== 'question' || asked?.kind !== 'question')
		throw new Refusal('invalid', 'This file asks nothing any more.');
	const chosen = asked.question.choices[answer.choice];
	if (!chosen) throw new Refusal('invalid', 'Choose one of the answers that are shown.');
	const context = { ...asked.context, answers: { ...asked.context.answers, ...chosen.answer } };
	const { summary } = await readAgain(read, context, false);

	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await lockUnsigned(shipment.id, transaction);
		const fresh = await LoggerRead.findByPk(readId, { transaction });
		if (fresh?.understanding !== read.understanding) throw new Refusal('changed-meanwhile');
		const source = { readId, fileName: read.fileName, partnerId: shipment.supplierId };
		const isRemembered = answer.remember && summary.kind === 'ok';
		const layoutId = isRemembered ? await writeLayout(ctx, w, summary, source) : read.layoutId;
		await fresh.update({ ...readColumns(summary), layoutId }, { transaction });
		record(
			'read.answered',
			{ scope: 'shipment', id: shipment.id },
			{ readId, answers: { ...chosen.answer } }
		);
	});
}

/** Leaves a file's question to QA: the dock does not know, and guessing is worse. */
export async function askQa(ctx: Context, readId: string): Promise<void> {
	const { shipment } = await getReadFor(ctx, readId, 'read.upload');
	await inTransaction(ctx, async ({ transaction, record }) => {
		await lockUnsigned(shipment.id, transaction);
		const read = await LoggerRead.findByPk(readId, { transaction });
		if (read?.state !== 'question') throw new Refusal('invalid', 'This file asks nothing any more.');
		if (read.askedQaAt) return;
		await read.update({ askedQaAt: ctx.now }, { transaction });
		record('read.asked-qa', { scope: 'shipment', id: shipment.id }, { readId });
	});
}
