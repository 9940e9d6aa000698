import { v7 as uuid } from 'uuid';
import type { LayoutScope } from '../../schemas/layout';
import type { StoredIngestion } from '../../schemas/read';
import type { Context } from '../context';
import { organisationChain } from '../catalogue/organisation-chain';
import { LoggerRead } from '../db/models/logger-read';
import { RememberedLayout } from '../db/models/remembered-layout';
import { Shipment } from '../db/models/shipment';
import { inTransaction, type Writing } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import { parseUnderstanding } from '../reads/stored-understanding';
import { lastingAnswers } from './answers';
import { fingerprintColumn } from './fingerprint';

type Understood = Extract<StoredIngestion, { kind: 'ok' }>;

/** The file that an answer was confirmed on. */
export interface LayoutSource {
	readId: string;
	fileName: string;
	/** Null: for files of this layout from anybody. */
	partnerId: string | null;
}

/**
 * Remembers how a file was answered, for coming files of its layout from its sender or from anybody.
 * @throws Refusal `not-found`, `not-allowed`, `invalid` where nothing about it holds for other files
 */
export async function rememberLayout(ctx: Context, readId: string, scope: LayoutScope): Promise<void> {
	const read = await LoggerRead.findByPk(readId);
	const shipment = read ? await Shipment.findByPk(read.shipmentId) : null;
	authorizeShipment(ctx, 'layout.confirm', shipment);
	const understood = parseUnderstanding(read?.understanding ?? null);
	if (!read || understood?.kind !== 'ok' || read.state !== 'ok') throw new Refusal('not-understood');
	const partnerId = scope === 'partner' ? shipment.supplierId : null;
	const source = { readId, fileName: read.fileName, partnerId };
	await inTransaction(ctx, async (w) => {
		const layoutId = await writeLayout(ctx, w, understood, source);
		await LoggerRead.update({ layoutId }, { where: { id: readId }, transaction: w.transaction });
	});
}

/** Writes a layout's next version; versions before it are let go, and none is ever changed. @throws Refusal `invalid` */
export async function writeLayout(
	ctx: Context,
	{ transaction, record }: Writing,
	{ context, layout }: Understood,
	{ readId, fileName, partnerId }: LayoutSource
): Promise<string> {
	const answers = lastingAnswers(context.answers);
	if (Object.keys(answers).length === 0)
		throw new Refusal('invalid', 'Nothing was answered about this file that holds for others.');
	const fingerprint = fingerprintColumn(layout.fingerprint);
	const where = { fingerprint, partnerId };
	const chain = await organisationChain(transaction);
	const before = await RememberedLayout.findAll({ where, transaction, lock: transaction.LOCK.UPDATE });
	for (const earlier of before.filter(({ withdrawnAt }) => withdrawnAt === null)) {
		const withdrawnReason = `Answered anew on ${fileName}`.slice(0, 300);
		await earlier.update(
			{ withdrawnAt: ctx.now, withdrawnBy: ctx.actor.id, withdrawnReason },
			{ transaction }
		);
		record('layout.forgotten', chain, { layoutId: earlier.id, reason: withdrawnReason });
	}
	const version = 1 + Math.max(0, ...before.map((one) => one.version));
	const made = await RememberedLayout.create(
		{
			id: uuid(),
			...where,
			version,
			answers,
			confirmedBy: ctx.actor.id,
			confirmedAt: ctx.now,
			sourceReadId: readId,
			sourceName: fileName.slice(0, 180),
			withdrawnAt: null,
			withdrawnBy: null,
			withdrawnReason: null
		},
		{ transaction }
	);
	record('layout.remembered', chain, {
		layoutId: made.id,
		readId,
		partnerId,
		fingerprint,
		answers: { ...answers }
	});
	return made.id;
}
