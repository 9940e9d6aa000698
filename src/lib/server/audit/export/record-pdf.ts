import type { AuditQuery } from '../../../schemas/audit-list';
import type { Context } from '../../context';
import { Organisation } from '../../db/models/organisation';
import { Refusal } from '../../refusals';
import { eachAuditEntry, type AuditEntryView } from '../list-entries';
import { recordExport } from './record-export';
import { buildRecord } from './run-worker';

/** More would be a book nobody reads; the CSV has no such bound. */
const mostEntries = 3000;

/**
 * The entries the filter leaves, as a PDF to be read by people; that they were taken is itself written down.
 * @throws Refusal `not-allowed`, `invalid` for more than 3,000 entries
 */
export async function recordPdf(
	ctx: Context,
	query: AuditQuery,
	zone: string
): Promise<{ fileName: string; pdf: Uint8Array }> {
	const entries: AuditEntryView[] = [];
	for await (const batch of eachAuditEntry(ctx, query, zone)) {
		entries.push(...batch);
		if (entries.length > mostEntries)
			throw new Refusal(
				'invalid',
				'More than 3,000 entries fit this filter. Narrow it to a docket or fewer days, or take the CSV.'
			);
	}
	await recordExport(ctx, query, zone, 'pdf');
	const organisation = (await Organisation.findOne())?.name ?? 'Wharfinger';
	const madeAt = ctx.now.toISOString();
	const pdf = await buildRecord({ entries, query, zone, organisation, madeAt, madeBy: ctx.actor.name });
	return { fileName: `record-${madeAt.slice(0, 10)}.pdf`, pdf };
}
