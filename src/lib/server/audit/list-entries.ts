import { QueryTypes } from 'sequelize';
import type { AuditQuery } from '../../schemas/audit-list';
import { rowsPerPage } from '../../schemas/list';
import { instantOfDay } from './day-bounds';
import type { Context } from '../context';
import { database } from '../db/sequelize';
import { authorize } from '../policies';

export interface AuditEntryView {
	id: string;
	seq: number;
	type: string;
	occurredAt: string;
	/** Null for the program itself. */
	actorName: string | null;
	actorKind: 'user' | 'link' | 'system';
	scope: 'shipment' | 'site' | 'account' | 'organisation';
	/** The docket's number, the site's or the person's name. */
	about: string | null;
	/** The stored text; null once retention has blanked it. */
	payload: string | null;
	sha256: string;
	address: string;
}

interface Row extends Omit<AuditEntryView, 'occurredAt'> {
	occurredAt: Date | string;
}

const columns = `
	SELECT e.id, e.seq, e.type, e.occurred_at AS occurredAt, COALESCE(u.name, k.name) AS actorName,
		e.actor_kind AS actorKind, c.scope, COALESCE(s.number, w.name, a.name) AS about, p.text AS payload,
		e.sha256, e.address`;

function entryView(row: Row): AuditEntryView {
	return { ...row, occurredAt: new Date(row.occurredAt).toISOString() };
}

const from = `
	FROM audit_entries e
	JOIN audit_chains c ON c.id = e.chain_id
	LEFT JOIN shipments s ON c.scope = 'shipment' AND s.id = c.id
	LEFT JOIN sites w ON c.scope = 'site' AND w.id = c.id
	LEFT JOIN users a ON c.scope = 'account' AND a.id = c.id
	LEFT JOIN users u ON e.actor_kind = 'user' AND u.id = e.actor_id
	LEFT JOIN contacts k ON e.actor_kind = 'link' AND k.id = e.actor_id
	LEFT JOIN audit_payloads p ON p.entry_id = e.id`;

/** What the reader may see: dockets and sites of their own, and accounts for those who manage them. */
function sight({ actor }: Context): { sql: string; values: Record<string, unknown> } {
	const isAdmin = actor.roles.includes('admin');
	const siteIds = actor.siteIds.length > 0 ? [...actor.siteIds] : ['00000000-0000-0000-0000-000000000000'];
	const accounts = isAdmin
		? "c.scope = 'account' OR c.scope = 'organisation'"
		: "c.scope = 'organisation' AND e.type NOT LIKE 'session.%'";
	return {
		sql: `((c.scope = 'shipment' AND s.site_id IN (:siteIds)) OR (c.scope = 'site' AND c.id IN (:siteIds)) OR (${accounts}))`,
		values: { siteIds }
	};
}

function conditions(
	ctx: Context,
	query: AuditQuery,
	zone: string
): { sql: string; values: Record<string, unknown> } {
	const { sql, values } = sight(ctx);
	const parts = [sql];
	if (query.about !== 'any') parts.push('e.type LIKE :about');
	if (query.by === 'system') parts.push("e.actor_kind = 'system'");
	else if (query.by) parts.push('e.actor_id = :by');
	if (query.from) parts.push('e.occurred_at >= :fromAt');
	if (query.to) parts.push('e.occurred_at < :toAt');
	if (query.docket) parts.push('s.number = :docket');
	return {
		sql: parts.join(' AND '),
		values: {
			...values,
			about: `${query.about}.%`,
			by: query.by,
			docket: query.docket,
			fromAt: query.from ? instantOfDay(query.from, zone, 0) : null,
			toAt: query.to ? instantOfDay(query.to, zone, 1) : null
		}
	};
}

/** The audit trail, newest first; days are those of `zone`. @throws Refusal `not-allowed` */
export async function listAuditEntries(
	ctx: Context,
	query: AuditQuery,
	zone: string
): Promise<{ items: AuditEntryView[]; total: number }> {
	authorize(ctx, 'audit.view');
	const { sql, values } = conditions(ctx, query, zone);
	const [counted] = await database().query<{ total: number | bigint }>(
		`SELECT COUNT(*) AS total ${from} WHERE ${sql}`,
		{ replacements: values, type: QueryTypes.SELECT }
	);
	const rows = await database().query<Row>(
		`${columns} ${from} WHERE ${sql} ORDER BY e.occurred_at DESC, e.id DESC LIMIT :limit OFFSET :offset`,
		{
			replacements: { ...values, limit: rowsPerPage, offset: (query.page - 1) * rowsPerPage },
			type: QueryTypes.SELECT
		}
	);
	return { items: rows.map(entryView), total: Number(counted?.total ?? 0) };
}

/** Entries fetched at once for an export. */
const exportedAtOnce = 500;

/**
 * The same entries a batch at a time, newest first, up to those of `ctx.now`: what is written meanwhile does not shift
 * them. @throws Refusal `not-allowed`
 */
export async function* eachAuditEntry(
	ctx: Context,
	query: AuditQuery,
	zone: string
): AsyncGenerator<AuditEntryView[]> {
	authorize(ctx, 'audit.view');
	const { sql, values } = conditions(ctx, query, zone);
	let last: { occurredAt: Date | string; id: string } | null = null;
	for (;;) {
		const rows: Row[] = await database().query<Row>(
			`${columns} ${from} WHERE ${sql} AND e.occurred_at <= :now
				${last === null ? '' : 'AND (e.occurred_at, e.id) < (:lastAt, :lastId)'}
				ORDER BY e.occurred_at DESC, e.id DESC LIMIT :limit`,
			{
				replacements: {
					...values,
					now: ctx.now,
					lastAt: last?.occurredAt ?? null,
					lastId: last?.id ?? null,
					limit: exportedAtOnce
				},
				type: QueryTypes.SELECT
			}
		);
		if (rows.length > 0) yield rows.map(entryView);
		last = rows.at(-1) ?? null;
		if (rows.length < exportedAtOnce) return;
	}
}

/** Everybody who has written into the trail, for its filter. @throws Refusal `not-allowed` */
export async function listAuditActors(ctx: Context): Promise<{ id: string; name: string }[]> {
	authorize(ctx, 'audit.view');
	return database().query<{ id: string; name: string }>(
		`SELECT id, name FROM users WHERE id IN (SELECT actor_id FROM audit_entries WHERE actor_kind = 'user') ORDER BY name`,
		{ type: QueryTypes.SELECT }
	);
}
