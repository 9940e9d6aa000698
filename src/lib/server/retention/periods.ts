import { periodsOf, type RetentionPeriods } from '../../schemas/retention';
import { organisationChain } from '../catalogue/organisation-chain';
import type { Context } from '../context';
import { Setting } from '../db/models/setting';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';

const name = 'retention';

/** The periods in force; defaults where nobody has set any. */
export async function getPeriods(): Promise<RetentionPeriods> {
	const row = await Setting.findByPk(name);
	return periodsOf(row ? JSON.parse(row.value) : null);
}

/** Sets how long things are kept. A shorter period takes things away at the next run, so both stand in the trail. */
export async function savePeriods(ctx: Context, after: RetentionPeriods): Promise<void> {
	authorize(ctx, 'retention.manage');
	const before = await getPeriods();
	await inTransaction(ctx, async ({ transaction, record }) => {
		await Setting.upsert({ name, value: JSON.stringify(after) }, { transaction });
		record('settings.changed', await organisationChain(transaction), { name, before, after });
	});
}
