import { Readable } from 'node:stream';
import { auditDetails, auditText } from '../../../messages/en/audit-events';
import type { AuditQuery } from '../../../schemas/audit-list';
import type { Context } from '../../context';
import { csvText } from '../../traces/readings-csv';
import { eachAuditEntry, type AuditEntryView } from '../list-entries';
import { recordExport } from './record-export';

const heads =
	'occurred_at_utc,who,kind_of_actor,came_from,what,event,about,entry_in_chain,facts,payload,sha256';

function rowOf(entry: AuditEntryView): string {
	const facts = auditDetails(entry.payload)
		.map(({ label, value }) => `${label}: ${value}`)
		.join('; ');
	const texts = [
		entry.actorName ?? '',
		entry.actorKind,
		entry.address,
		auditText(entry.type, entry.payload),
		entry.type,
		entry.about ?? ''
	].map(csvText);
	const rest = [String(entry.seq), csvText(facts), csvText(entry.payload ?? ''), entry.sha256];
	return [entry.occurredAt, ...texts, ...rest].join(',');
}

async function* csvBytes(ctx: Context, query: AuditQuery, zone: string): AsyncGenerator<Buffer> {
	yield Buffer.from(`${heads}\r\n`, 'utf8');
	for await (const entries of eachAuditEntry(ctx, query, zone))
		yield Buffer.from(entries.map((entry) => `${rowOf(entry)}\r\n`).join(''), 'utf8');
}

/** The entries the filter leaves, as RFC 4180 has them, streamed; that they were taken is itself written down. */
export async function recordCsv(
	ctx: Context,
	query: AuditQuery,
	zone: string
): Promise<{ fileName: string; open: () => Readable }> {
	await recordExport(ctx, query, zone, 'csv');
	return {
		fileName: `record-${ctx.now.toISOString().slice(0, 10)}.csv`,
		open: () => Readable.from(csvBytes(ctx, query, zone))
	};
}
