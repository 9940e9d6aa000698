import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { ClockCorrectionForm } from '../../schemas/clock-correction';
import { reassess } from '../assessments/reassess';
import { movedText, standingOf } from '../authority/moved-recommendation';
import type { Context } from '../context';
import { ClockCorrection } from '../db/models/clock-correction';
import { TraceRow } from '../db/models/trace-row';
import { TrimRow } from '../db/models/trim-row';
import { inTransaction } from '../db/transaction';
import { getReadFor, lockUnsigned } from '../reads/find-read';
import { Refusal } from '../refusals';

/**
 * Moves every reading of a kept read by the same time, with a reason, and assesses again. The file and its packed
 * readings stay what they are; the shift stands beside them.
 * @returns the correction's id
 * @throws Refusal `invalid` where the read is not kept, is corrected already, or has trims by its uncorrected clock
 */
export async function correctClock(
	ctx: Context,
	readId: string,
	{ shiftMs, reason }: ClockCorrectionForm
): Promise<string> {
	const { shipment } = await getReadFor(ctx, readId, 'clock.correct');
	const id = uuid();
	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await lockUnsigned(shipment.id, transaction);
		await refuseUnfit(readId, transaction);
		if ((await ClockCorrection.count({ where: { readId, undoneAt: null }, transaction })) > 0)
			throw new Refusal('invalid', 'This clock has been corrected already. Undo that correction first.');
		const before = await standingOf(shipment.id, transaction);
		const made = { madeBy: ctx.actor.id, madeAt: ctx.now, undoneBy: null, undoneAt: null };
		await ClockCorrection.create({ id, readId, shiftMs, reason, ...made }, { transaction });
		await TraceRow.update({ clockShiftMs: shiftMs }, { where: { readId }, transaction });
		record('clock.corrected', { scope: 'shipment', id: shipment.id }, { readId, shiftMs, reason });
		await reassess(w, ctx, shipment.id);
		const movedRecommendation = movedText(before, await standingOf(shipment.id, transaction));
		if (movedRecommendation !== null)
			await ClockCorrection.update({ movedRecommendation }, { where: { id }, transaction });
	});
	return id;
}

/** Takes a correction back: the clock counts as the file has it again. Undoing twice changes nothing. */
export async function restoreClock(ctx: Context, readId: string, correctionId: string): Promise<void> {
	const { shipment } = await getReadFor(ctx, readId, 'clock.correct');
	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await lockUnsigned(shipment.id, transaction);
		const standing = await ClockCorrection.findOne({ where: { id: correctionId, readId }, transaction });
		if (!standing) throw new Refusal('not-found');
		if (standing.undoneAt) return;
		await refuseUnfit(readId, transaction);
		await standing.update({ undoneBy: ctx.actor.id, undoneAt: ctx.now }, { transaction });
		await TraceRow.update({ clockShiftMs: 0 }, { where: { readId }, transaction });
		record('clock.restored', { scope: 'shipment', id: shipment.id }, { readId, correctionId });
		await reassess(w, ctx, shipment.id);
	});
}

/** A trim names instants: under another clock it would leave out other readings than those that were meant. */
async function refuseUnfit(readId: string, transaction: Transaction): Promise<void> {
	const traces = await TraceRow.findAll({
		where: { readId, isAssessed: true },
		attributes: ['id'],
		transaction
	});
	if (traces.length === 0)
		throw new Refusal('invalid', 'Only a read that is kept and counts has a clock to correct.');
	const where = { traceId: traces.map(({ id }) => id), undoneAt: null };
	if ((await TrimRow.count({ where, transaction })) > 0)
		throw new Refusal(
			'invalid',
			'Readings of this logger are left out by its present clock. Undo that trim first, and make it again after.'
		);
}
