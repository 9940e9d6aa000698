import type { Context } from '../context';
import { inTransaction } from '../db/transaction';
import type { RefusedAct } from '../request-scope';

/** One request is written down with so many acts at most: a page asks for several things at once. */
const actsAtMost = 5;

/** Writes into the trail what was declined to somebody, in that person's chain. */
export async function recordRefusedActs(
	ctx: Context,
	route: string,
	method: string,
	refused: readonly RefusedAct[]
): Promise<void> {
	const seen = new Map(refused.map((act) => [`${act.act} ${act.why} ${act.shipmentId}`, act]));
	await inTransaction(ctx, async ({ record }) => {
		for (const { act, why, shipmentId } of [...seen.values()].slice(0, actsAtMost))
			record('act.refused', { scope: 'account', id: ctx.actor.id }, { act, why, shipmentId, route, method });
	});
}
