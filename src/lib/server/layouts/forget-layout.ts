import type { Context } from '../context';
import { organisationChain } from '../catalogue/organisation-chain';
import { RememberedLayout } from '../db/models/remembered-layout';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';

/** Lets a remembered answer go: coming files are asked about again, those read by it stay as they are. */
export async function forgetLayout(ctx: Context, layoutId: string, reason: string): Promise<void> {
	authorize(ctx, 'layout.confirm');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const layout = await RememberedLayout.findByPk(layoutId, {
			transaction,
			lock: transaction.LOCK.UPDATE
		});
		if (!layout) throw new Refusal('not-found');
		if (layout.withdrawnAt) throw new Refusal('invalid', 'This layout is forgotten already.');
		const gone = { withdrawnAt: ctx.now, withdrawnBy: ctx.actor.id, withdrawnReason: reason };
		await layout.update(gone, { transaction });
		record('layout.forgotten', await organisationChain(transaction), { layoutId, reason });
	});
}
