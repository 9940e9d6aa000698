import { Op } from 'sequelize';
import { questionText, refusalText } from '../../messages/en/ingest';
import type { ReadRowView, ReadState, StoredIngestion } from '../../schemas/read';
import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { Shipment } from '../db/models/shipment';
import { StoredFile } from '../db/models/stored-file';
import { User } from '../db/models/user';
import { isWithinSight } from '../policies';
import { parseUnderstanding } from './stored-understanding';

/** Where a read stands, from its row. */
export function stateOf(read: Pick<LoggerRead, 'state' | 'keptAt'>): ReadState {
	if (read.state === 'ok') return read.keptAt ? 'kept' : 'understood';
	return read.state;
}

/** One line of a docket's list of reads. */
export async function readRowView(read: LoggerRead): Promise<ReadRowView> {
	const file = await StoredFile.findByPk(read.fileId);
	const uploader = await User.findByPk(read.uploadedBy);
	const found = parseUnderstanding(read.understanding);
	const isOk = found?.kind === 'ok';
	return {
		id: read.id,
		fileName: read.fileName,
		fileBytes: Number(file?.bytes ?? 0),
		fileSha256: file?.sha256 ?? '',
		state: stateOf(read),
		uploadedAt: read.uploadedAt.toISOString(),
		uploadedBy: uploader?.name ?? '',
		keptAt: read.keptAt?.toISOString() ?? null,
		askedQaAt: read.askedQaAt?.toISOString() ?? null,
		readings: isOk ? found.readings : null,
		serial: isOk ? found.declared.serial : null,
		firstAt: isOk ? new Date(found.firstMs).toISOString() : null,
		lastAt: isOk ? new Date(found.lastMs).toISOString() : null,
		sentence: sentenceOf(found)
	};
}

function sentenceOf(found: StoredIngestion | null): string | null {
	if (found?.kind === 'refused') return refusalText(found.code, found);
	return found?.kind === 'question' ? questionText(found.question).title : null;
}

/** Numbers of other dockets the caller sees that hold the same bytes. */
export async function alsoOnDockets(ctx: Context, read: LoggerRead): Promise<string[]> {
	const others = await LoggerRead.findAll({
		where: {
			fileId: read.fileId,
			shipmentId: { [Op.ne]: read.shipmentId },
			state: { [Op.ne]: 'withdrawn' }
		},
		attributes: ['shipmentId']
	});
	const ids = others.map(({ shipmentId }) => shipmentId);
	const shipments = await Shipment.findAll({ where: { id: ids }, order: ['number'] });
	return shipments.filter((shipment) => isWithinSight(ctx.actor, shipment)).map(({ number }) => number);
}
