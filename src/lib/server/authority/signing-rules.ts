import { z } from 'zod';
import type { SecondSignatureRules } from '../../domain/authority/authority';
import { organisationChain } from '../catalogue/organisation-chain';
import type { Context } from '../context';
import { Setting } from '../db/models/setting';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';

const name = 'second-signature';

const stored = z.object({
	fromValue: z.object({ minor: z.number().int().min(1), currency: z.string().length(3) }).nullable(),
	fromSeverity: z.enum(['major', 'critical']).nullable()
});

const none: SecondSignatureRules = { fromValue: null, fromSeverity: null };

/** When a decision needs a second signature; nothing does until an admin says so. */
export async function getSigningRules(): Promise<SecondSignatureRules> {
	const row = await Setting.findByPk(name);
	return row ? stored.parse(JSON.parse(row.value)) : none;
}

/** Sets the rules, for signatures from now on. */
export async function setSigningRules(ctx: Context, rules: SecondSignatureRules): Promise<void> {
	authorize(ctx, 'account.manage');
	await inTransaction(ctx, async ({ transaction, record }) => {
		await Setting.upsert({ name, value: JSON.stringify(stored.parse(rules)) }, { transaction });
		record('settings.changed', await organisationChain(transaction), { name });
	});
}
