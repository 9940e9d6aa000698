import { Op, type WhereOptions } from 'sequelize';
import { rowsPerPage } from '../../schemas/list';

/** Looks for words in some columns; what is a wildcard to the database is a sign like any other to the reader. */
export function searchIn<Row>(columns: readonly (keyof Row & string)[], q: string): WhereOptions<Row> {
	if (!q) return {};
	const like = `%${q.replace(/[\\%_]/g, '\\$&')}%`;
	return { [Op.or]: columns.map((column) => ({ [column]: { [Op.like]: like } })) } as WhereOptions<Row>;
}

/** The part of a list that its page shows. */
export function pageOf({ page }: { page: number }): { limit: number; offset: number } {
	return { limit: rowsPerPage, offset: (page - 1) * rowsPerPage };
}

/** Records in use, switched off, or both. */
export function inState(state: string): WhereOptions {
	if (state === 'all') return {};
	return { switchedOffAt: state === 'off' ? { [Op.ne]: null } : null };
}
