import type { AuditQuery } from '../../../schemas/audit-list';
import { organisationChain } from '../../catalogue/organisation-chain';
import type { Context } from '../../context';
import { inTransaction } from '../../db/transaction';
import { listAuditEntries } from '../list-entries';

/** Writes down that entries were taken out, how many and by what filter. @returns how many @throws Refusal `not-allowed` */
export async function recordExport(
	ctx: Context,
	query: AuditQuery,
	zone: string,
	as: 'csv' | 'pdf'
): Promise<number> {
	const { total } = await listAuditEntries(ctx, query, zone);
	const filter = Object.fromEntries(
		Object.entries(query)
			.filter(([name, value]) => name !== 'page' && value !== '' && value !== 'any')
			.map(([name, value]) => [name, String(value)])
	);
	await inTransaction(ctx, async ({ transaction, record }) =>
		record('record.exported', await organisationChain(transaction), { as, entries: total, filter })
	);
	return total;
}
