import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '../db/sequelize';

/** Columns that name a file, as the schema itself says: one added later counts from its first day. */
async function columns(transaction: Transaction): Promise<{ table: string; column: string }[]> {
	return database().query<{ table: string; column: string }>(
		`SELECT table_name AS \`table\`, column_name AS \`column\` FROM information_schema.key_column_usage
		WHERE table_schema = DATABASE() AND referenced_table_name = 'files' ORDER BY 1, 2`,
		{ type: QueryTypes.SELECT, transaction }
	);
}

/** How often anything names a file: reads and photographs, but reports, claims and certificates too. */
export async function countReferences(fileId: string, transaction: Transaction): Promise<number> {
	const counts = (await columns(transaction)).map(
		({ table, column }) => `(SELECT COUNT(*) FROM \`${table}\` WHERE \`${column}\` = :fileId)`
	);
	const [row] = await database().query<{ total: number }>(`SELECT ${counts.join(' + ')} AS total`, {
		replacements: { fileId },
		type: QueryTypes.SELECT,
		transaction
	});
	return Number(row?.total ?? 0);
}
