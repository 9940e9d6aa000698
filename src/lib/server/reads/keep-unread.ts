import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { StoredFile } from '../db/models/stored-file';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { getReadFor, lockUnsigned } from './find-read';

/**
 * Keeps a file that cannot be read as evidence all the same: its bytes stay on the docket, nothing is assessed by it.
 * Keeping it twice is keeping it once. @throws Refusal `invalid` where it can be read, `already-signed`
 */
export async function keepUnread(ctx: Context, readId: string): Promise<void> {
	const { shipment } = await getReadFor(ctx, readId, 'read.upload');
	await inTransaction(ctx, async ({ transaction, record }) => {
		await lockUnsigned(shipment.id, transaction);
		const read = await LoggerRead.findByPk(readId, { transaction });
		if (read?.state !== 'refused')
			throw new Refusal('invalid', 'Only a file that cannot be read is kept so.');
		if (read.keptAt) return;
		const file = await StoredFile.findByPk(read.fileId, { transaction });
		await read.update({ keptAt: ctx.now }, { transaction });
		record(
			'read.kept-unread',
			{ scope: 'shipment', id: shipment.id },
			{ readId, fileSha256: file?.sha256 ?? '', refusalCode: read.refusalCode }
		);
	});
}
