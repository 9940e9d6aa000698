import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { getReadFor, lockUnsigned } from './find-read';
import { readAgain } from './read-again';
import { parseUnderstanding } from './stored-understanding';
import { readColumns } from './write-received';

/**
 * Takes back what was answered about a file, at the dock or by a remembered layout, and asks as at first.
 * @throws Refusal `invalid` where nothing was answered, `in-use` once the read is kept, `already-signed`
 */
export async function askAgain(ctx: Context, readId: string): Promise<void> {
	const { read, shipment } = await getReadFor(ctx, readId, 'read.upload');
	const known = parseUnderstanding(read.understanding);
	if (read.keptAt) throw new Refusal('in-use', 'This read is kept. QA can withdraw it first.');
	const answers = known?.context.answers ?? {};
	if (!known || read.state === 'withdrawn' || Object.keys(answers).length === 0)
		throw new Refusal('invalid', 'Nothing was answered about this file.');
	const { summary } = await readAgain(read, { ...known.context, answers: {} }, false);

	await inTransaction(ctx, async ({ transaction, record }) => {
		await lockUnsigned(shipment.id, transaction);
		const fresh = await LoggerRead.findByPk(readId, { transaction });
		if (fresh?.keptAt || fresh?.understanding !== read.understanding) throw new Refusal('changed-meanwhile');
		await fresh.update({ ...readColumns(summary), layoutId: null, askedQaAt: null }, { transaction });
		record(
			'read.asked-again',
			{ scope: 'shipment', id: shipment.id },
			{ readId, layoutId: read.layoutId, answers: { ...answers } }
		);
	});
}
