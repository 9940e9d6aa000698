import { rangesText } from '../audit/ranges';
import type { Context } from '../context';
import { AuditPayload } from '../db/models/audit-payload';
import { Shipment } from '../db/models/shipment';
import { StoredFile } from '../db/models/stored-file';
import { inTransaction, type Writing } from '../db/transaction';
import { fileStore } from '../storage/store';
import type { RetentionPeriods } from '../../schemas/retention';
import { dueChains, dueDockets, dueEntries, dueFiles, type DueChain, type DueFile } from './due';
import { removeOldMail } from './old-mail';
import { getPeriods } from './periods';
import { countPersonal, emptyPersonal } from './personal-rows';
import { countReferences } from './references';

/** Locks the docket, so that a claim opened or a hold put at the same moment is seen or waits. */
async function lockShipment(shipmentId: string, { transaction }: Writing): Promise<void> {
	await Shipment.findByPk(shipmentId, { transaction, lock: transaction.LOCK.UPDATE });
}

/** One file may serve several dockets, or something else altogether: it goes when every use of it lets it go. */
function isReleased(uses: readonly DueFile[], references: number): boolean {
	return uses.length > 0 && uses.length === references && uses.every(({ isHeld }) => !isHeld);
}

function byFile(files: readonly DueFile[]): Map<string, DueFile[]> {
	const groups = new Map<string, DueFile[]>();
	for (const file of files) groups.set(file.fileId, [...(groups.get(file.fileId) ?? []), file]);
	return groups;
}

/** @param uses every use of one file that has fallen due */
async function deleteFile(
	ctx: Context,
	uses: readonly DueFile[],
	periods: RetentionPeriods
): Promise<boolean> {
	const [{ fileId, sha256 } = { fileId: '', sha256: '' }] = uses;
	const isGone = await inTransaction(ctx, async (w) => {
		const { transaction } = w;
		for (const shipmentId of [...new Set(uses.map((use) => use.shipmentId))].sort())
			await lockShipment(shipmentId, w);
		const due = await dueFiles({ periods, now: ctx.now, before: ctx.now, fileId }, transaction);
		if (!isReleased(due, await countReferences(fileId, transaction))) return false;
		for (const { what, bytes, rule, shipmentId } of due)
			w.record(
				'retention.deleted',
				{ scope: 'shipment', id: shipmentId },
				{ what, fileSha256: sha256, bytes, rule, periodMonths: periods[rule] }
			);
		await StoredFile.update({ deletedAt: ctx.now }, { where: { id: fileId }, transaction });
		return true;
	});
	// After the commit: a crash in between leaves bytes that nothing names, never a name without an entry.
	if (isGone) await (await fileStore()).remove(sha256);
	return isGone;
}

async function blankChain(ctx: Context, due: DueChain, periods: RetentionPeriods): Promise<number> {
	return inTransaction(ctx, async (w) => {
		if (due.scope === 'shipment') await lockShipment(due.chainId, w);
		const entries = await dueEntries(due.chainId, { periods, now: ctx.now, before: ctx.now }, w.transaction);
		if (entries.length === 0) return 0;
		const ids = entries.map(({ id }) => id);
		await AuditPayload.update({ text: null }, { where: { entryId: ids }, transaction: w.transaction });
		w.record(
			'retention.blanked',
			{ scope: due.scope, id: due.chainId },
			{
				entries: rangesText(entries.map(({ seq }) => seq)),
				kinds: [...new Set(entries.map(({ type }) => type))],
				rule: 'people',
				periodMonths: periods.people
			}
		);
		return entries.length;
	});
}

/** Empties what a docket's own rows say of people; its trail says how many rows of each kind. */
async function emptyDocket(ctx: Context, shipmentId: string, periods: RetentionPeriods): Promise<number> {
	return inTransaction(ctx, async (w) => {
		await lockShipment(shipmentId, w);
		const due = await dueDockets({ periods, now: ctx.now, before: ctx.now }, w.transaction);
		if (!due.some((one) => one.shipmentId === shipmentId && !one.isHeld)) return 0;
		const rows = await countPersonal(shipmentId, w.transaction);
		if (Object.keys(rows).length === 0) return 0;
		await emptyPersonal(shipmentId, w.transaction);
		const chain = { scope: 'shipment', id: shipmentId } as const;
		w.record('retention.emptied', chain, { rows, rule: 'people', periodMonths: periods.people });
		return Object.values(rows).reduce((sum, total) => sum + total, 0);
	});
}

export interface Retained {
	files: number;
	entries: number;
	/** Rows of dockets that were emptied of what they said of people. */
	rows: number;
	mails: number;
	jobs: number;
}

/**
 * Takes away what has outlived its period and is not held: bytes of files, what entries and rows say of people, mails
 * and the orders that sent them. Signed records stay as they were signed.
 */
export async function runRetention(ctx: Context): Promise<Retained> {
	const periods = await getPeriods();
	const until = { periods, now: ctx.now, before: ctx.now };
	let files = 0;
	for (const uses of byFile(await dueFiles(until)).values())
		if (await deleteFile(ctx, uses, periods)) files++;
	let entries = 0;
	for (const chain of await dueChains(until))
		if (!chain.isHeld) entries += await blankChain(ctx, chain, periods);
	let rows = 0;
	for (const { shipmentId, isHeld } of await dueDockets(until))
		if (!isHeld && Object.keys(await countPersonal(shipmentId)).length > 0)
			rows += await emptyDocket(ctx, shipmentId, periods);
	return { files, entries, rows, ...(await removeOldMail(ctx.now, periods)) };
}
