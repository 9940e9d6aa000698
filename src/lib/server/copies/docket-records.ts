import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '../db/sequelize';
import { sha256Hex } from '../storage/sha256';

export type Cell = string | number | boolean | null | object;
export type Row = Record<string, Cell>;

/** Secrets and machinery: nothing an inspector reads. The trail is written out by itself. */
const leftOut = new Set([
	'tokens',
	'link_sessions',
	'jobs',
	'audit_chains',
	'audit_entries',
	'audit_payloads'
]);

/** What a docket's rows point at: named in full once, people by name and duty only. */
const pointedAt: Record<string, string> = {
	organisations: '*',
	sites: '*',
	partners: '*',
	contacts: '*',
	products: '*',
	varieties: '*',
	spec_versions: '*',
	loggers: '*',
	visits: '*',
	compartments: '*',
	lanes: '*',
	layouts: '*',
	certificates: '*',
	files: '*',
	users: 'id, name, title'
};

interface Edge {
	table: string;
	column: string;
	target: string;
}

/** Which column of which table points where, as the schema itself says: a table added later is in the copy too. */
async function edges(transaction: Transaction): Promise<Edge[]> {
	return database().query<Edge>(
		`SELECT table_name AS \`table\`, column_name AS \`column\`, referenced_table_name AS target
		FROM information_schema.key_column_usage
		WHERE table_schema = DATABASE() AND referenced_table_name IS NOT NULL ORDER BY 1, 2`,
		{ type: QueryTypes.SELECT, transaction }
	);
}

/** Bytes as their hash: readings stand in files of their own. */
function plain(row: Row): Row {
	return Object.fromEntries(
		Object.entries(row).map(([name, value]) => [
			name,
			Buffer.isBuffer(value) ? `${value.length} bytes, SHA-256 ${sha256Hex(value)}` : value
		])
	);
}

async function rowsWhere(
	table: string,
	column: string,
	values: readonly Cell[],
	transaction: Transaction
): Promise<Row[]> {
	if (values.length === 0) return [];
	const rows = await database().query<Row>(
		`SELECT ${pointedAt[table] ?? '*'} FROM \`${table}\` WHERE \`${column}\` IN (:values) ORDER BY 1`,
		{ replacements: { values }, type: QueryTypes.SELECT, transaction }
	);
	return rows.map(plain);
}

/** Adds rows that are not there yet. @returns whether there were any */
function add(found: Map<string, Row[]>, table: string, rows: readonly Row[]): boolean {
	const kept = found.get(table) ?? [];
	const known = new Set(kept.map((row) => JSON.stringify(row)));
	const fresh = rows.filter((row) => !known.has(JSON.stringify(row)));
	if (fresh.length > 0) found.set(table, [...kept, ...fresh]);
	return fresh.length > 0;
}

/** Every row that hangs on a docket, however many tables down, then what those rows point at. */
export async function docketRecords(
	shipmentId: string,
	transaction: Transaction
): Promise<Map<string, Row[]>> {
	const all = await edges(transaction);
	const found = new Map<string, Row[]>();
	add(found, 'shipments', await rowsWhere('shipments', 'id', [shipmentId], transaction));
	for (let queue = ['shipments']; queue.length > 0;) {
		const [target = ''] = queue.splice(0, 1);
		const ids = (found.get(target) ?? []).map(({ id }) => id ?? null);
		for (const { table, column } of all.filter((edge) => edge.target === target)) {
			if (leftOut.has(table) || table in pointedAt) continue;
			if (add(found, table, await rowsWhere(table, column, ids, transaction)) && !queue.includes(table))
				queue.push(table);
		}
	}
	for (const { table, column, target } of all) {
		if (!(target in pointedAt) || target === table) continue;
		const ids = (found.get(table) ?? []).map((row) => row[column] ?? null).filter((id) => id !== null);
		add(found, target, await rowsWhere(target, 'id', ids, transaction));
	}
	return found;
}
