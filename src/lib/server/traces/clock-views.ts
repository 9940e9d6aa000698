import type { Transaction } from 'sequelize';
import type { ClockCorrectionView } from '../../schemas/clock-correction';
import { ClockCorrection } from '../db/models/clock-correction';
import { User } from '../db/models/user';

/** The corrections of clocks that stand on these reads, the oldest first. */
export async function clockCorrectionsOf(
	readIds: readonly string[],
	transaction?: Transaction
): Promise<ClockCorrectionView[]> {
	const where = { readId: [...readIds], undoneAt: null };
	const rows = await ClockCorrection.findAll({ where, order: ['madeAt'], transaction });
	const people = await User.findAll({
		where: { id: rows.map(({ madeBy }) => madeBy) },
		attributes: ['id', 'name'],
		transaction
	});
	const nameOf = new Map(people.map(({ id, name }) => [id, name]));
	return rows.map((row) => ({
		id: row.id,
		readId: row.readId,
		shiftMs: Number(row.shiftMs),
		reason: row.reason,
		by: nameOf.get(row.madeBy) ?? '',
		at: row.madeAt.toISOString()
	}));
}
