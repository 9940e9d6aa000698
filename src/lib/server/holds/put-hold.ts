import { v7 as uuid } from 'uuid';
import type { HoldInput } from '../../schemas/note';
import type { Context } from '../context';
import { Hold } from '../db/models/hold';
import { Site } from '../db/models/site';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { lockDocket, refuseClosed } from '../shipments/lock-docket';
import { siteTime } from '../shipments/site-time';

function untilOf({ until }: HoldInput, zone: string, now: Date): Date | null {
	if (!until) return null;
	const typed = siteTime(until, zone);
	if (!typed.ok) throw new Refusal('invalid', typed.fault);
	if (typed.at <= now) throw new Refusal('invalid', 'The time it is held until has passed already.');
	return typed.at;
}

/** Puts a load that is here on hold until QA lifts it or a disposition ends it. */
export async function putHold(ctx: Context, number: string, input: HoldInput): Promise<{ id: string }> {
	const id = input.id ?? uuid();
	return inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'hold.put', number, transaction);
		refuseClosed(shipment);
		if (!shipment.arrivedAt) throw new Refusal('not-arrived');
		const open = await Hold.findOne({ where: { shipmentId: shipment.id, liftedAt: null }, transaction });
		if (open?.id === id) return { id };
		if (open) throw new Refusal('already-on-hold');
		const site = await Site.findByPk(shipment.siteId, { transaction, rejectOnEmpty: true });
		const { reason, awaited } = input;
		const untilAt = untilOf(input, site.zone, ctx.now);
		await Hold.create(
			{ id, shipmentId: shipment.id, putBy: ctx.actor.id, putAt: ctx.now, reason, awaited, untilAt },
			{ transaction }
		);
		record(
			'hold.put',
			{ scope: 'shipment', id: shipment.id },
			{ reason, ...(awaited ? { awaited } : {}), ...(untilAt ? { untilAt: untilAt.toISOString() } : {}) }
		);
		return { id };
	});
}
