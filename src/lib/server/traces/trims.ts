import { Op } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { TrimForm } from '../../schemas/trim';
import { reassess } from '../assessments/reassess';
import { movedText, standingOf } from '../authority/moved-recommendation';
import type { Context } from '../context';
import { TrimRow } from '../db/models/trim-row';
import { inTransaction } from '../db/transaction';
import { lockUnsigned } from '../reads/find-read';
import { Refusal } from '../refusals';
import { getTraceFor } from './find-trace';

/** Leaves a stretch out of a trace, with a reason, and assesses again; the readings stay visible. @returns the trim's id */
export async function makeTrim(ctx: Context, form: TrimForm): Promise<string> {
	const { trace, shipment } = await getTraceFor(ctx, form.traceId, 'trim.make');
	const [fromAt, toAt] = [new Date(form.fromAt), new Date(form.toAt)];
	const shiftMs = Number(trace.clockShiftMs);
	if (
		toAt.getTime() < trace.firstAt.getTime() + shiftMs ||
		fromAt.getTime() > trace.lastAt.getTime() + shiftMs
	)
		throw new Refusal('invalid', 'The trace has no readings in that time.');
	const id = uuid();
	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await lockUnsigned(shipment.id, transaction);
		await refuseOverlap(form.traceId, fromAt, toAt, w.transaction);
		const before = await standingOf(shipment.id, transaction);
		const made = { madeBy: ctx.actor.id, madeAt: ctx.now, undoneBy: null, undoneAt: null };
		const { traceId, reason } = form;
		await TrimRow.create({ id, traceId, fromAt, toAt, reason, ...made }, { transaction });
		const instants = { fromAt: fromAt.toISOString(), toAt: toAt.toISOString() };
		record('trim.made', { scope: 'shipment', id: shipment.id }, { traceId, ...instants, reason });
		await reassess(w, ctx, shipment.id);
		const movedRecommendation = movedText(before, await standingOf(shipment.id, transaction));
		if (movedRecommendation !== null)
			await TrimRow.update({ movedRecommendation }, { where: { id }, transaction });
	});
	return id;
}

/** Takes a trim back, and assesses again. */
export async function undoTrim(ctx: Context, trimId: string): Promise<void> {
	const trim = await TrimRow.findByPk(trimId);
	if (!trim) throw new Refusal('not-found');
	const { shipment } = await getTraceFor(ctx, trim.traceId, 'trim.make');
	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await lockUnsigned(shipment.id, transaction);
		const fresh = await TrimRow.findByPk(trimId, { transaction });
		if (!fresh || fresh.undoneAt) return;
		await fresh.update({ undoneBy: ctx.actor.id, undoneAt: ctx.now }, { transaction });
		record('trim.undone', { scope: 'shipment', id: shipment.id }, { trimId });
		await reassess(w, ctx, shipment.id);
	});
}

/** A trim over another would count its hours twice. */
async function refuseOverlap(
	traceId: string,
	fromAt: Date,
	toAt: Date,
	transaction: Parameters<typeof lockUnsigned>[1]
): Promise<void> {
	const where = { traceId, undoneAt: null, fromAt: { [Op.lt]: toAt }, toAt: { [Op.gt]: fromAt } };
	if ((await TrimRow.count({ where, transaction })) > 0)
		throw new Refusal('invalid', 'Part of that time has been trimmed already. Undo that trim first.');
}
