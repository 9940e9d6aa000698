import { Op, type Transaction } from 'sequelize';
import type { Spec } from '../../domain/shelf-life/spec';
import { SpecVersion } from '../db/models/spec-version';
import { parseSpecFigures } from './stored-spec';

/** A signed version with its figures parsed. */
export interface SignedSpec {
	id: string;
	number: number;
	figuresSha256: string;
	figures: Spec;
}

function signedSpec(row: SpecVersion): SignedSpec {
	const { id, number, figuresSha256 } = row;
	return { id, number, figuresSha256, figures: parseSpecFigures(row.figures) };
}

/** The version a line is judged by at a moment: its variety's, else its product's; null where none was in force. */
export async function findSpecInForce(
	line: { productId: string; varietyId: string | null },
	at: Date,
	transaction?: Transaction
): Promise<SignedSpec | null> {
	const versions = await SpecVersion.findAll({
		where: {
			productId: line.productId,
			varietyId: line.varietyId === null ? null : { [Op.or]: [line.varietyId, null] },
			state: 'signed',
			inForceFrom: { [Op.lte]: at },
			supersededAt: { [Op.or]: [null, { [Op.gt]: at }] }
		},
		order: [
			['inForceFrom', 'DESC'],
			['number', 'DESC']
		],
		transaction
	});
	const own = versions.find((version) => line.varietyId !== null && version.varietyId === line.varietyId);
	const found = own ?? versions.find((version) => version.varietyId === null);
	return found ? signedSpec(found) : null;
}

/** The version an assessment pinned, in force or not. */
export async function findSpecVersion(id: string, transaction?: Transaction): Promise<SignedSpec | null> {
	const row = await SpecVersion.findByPk(id, { transaction });
	return row ? signedSpec(row) : null;
}
