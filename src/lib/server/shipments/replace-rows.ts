import {
	ForeignKeyConstraintError,
	literal,
	Op,
	type Model,
	type ModelStatic,
	type Transaction,
	type WhereOptions
} from 'sequelize';
import { Refusal } from '../refusals';

interface OrderedRow {
	id: string;
	ordinal: number;
}

/** Takes out the rows that are not among those wanted. @throws Refusal `in-use` where something rests on one */
export async function removeRows(
	model: ModelStatic<Model>,
	where: Record<string, unknown>,
	wanted: readonly OrderedRow[],
	transaction: Transaction
): Promise<void> {
	const gone = { ...where, id: { [Op.notIn]: wanted.map((row) => row.id) } };
	try {
		await model.destroy({ where: gone, transaction });
	} catch (error) {
		if (error instanceof ForeignKeyConstraintError)
			throw new Refusal(
				'in-use',
				'A row you took out is in use already: a reading or an assessment rests on it. Change it instead.'
			);
		throw error;
	}
}

/** Makes a docket's ordered rows those that are given: known ids change in place, new ones are added. */
export async function replaceRows(
	model: ModelStatic<Model>,
	where: WhereOptions,
	rows: readonly OrderedRow[],
	transaction: Transaction
): Promise<void> {
	// Out of the way, so that rows may change places under the unique ordinal.
	await model.update({ ordinal: literal('-1 - ordinal') }, { where, transaction });
	for (const row of rows) {
		const fields: Record<string, unknown> = { ...row };
		const known = await model.findByPk(row.id, { transaction });
		if (known) await known.update(fields, { transaction });
		else await model.create(fields, { transaction });
	}
}
