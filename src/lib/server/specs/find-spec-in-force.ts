import { Op } from 'sequelize';
import type { Spec } from '../../domain/shelf-life/spec';
import { Product } from '../db/models/product';
import { SpecVersion } from '../db/models/spec-version';
import { figuresFrom } from './figures';

/** A signed version as an assessment uses it. */
export interface SpecInForce {
	id: string;
	number: number;
	productName: string;
	figures: Spec;
}

/**
 * The signed version that holds for a product at a moment: the variety's own where it has one in force,
 * else the product's. Null where nothing has been signed for it by then.
 */
export async function findSpecInForce(
	productId: string,
	varietyId: string | null,
	at: Date
): Promise<SpecInForce | null> {
	const version =
		(varietyId === null ? null : await findVersion(productId, varietyId, at)) ??
		(await findVersion(productId, null, at));
	if (!version) return null;
	const product = await Product.findByPk(productId);
	return {
		id: version.id,
		number: version.number,
		productName: product?.name ?? '',
		figures: figuresFrom(version.figures)
	};
}

function findVersion(productId: string, varietyId: string | null, at: Date): Promise<SpecVersion | null> {
	return SpecVersion.findOne({
		where: {
			productId,
			varietyId,
			state: 'signed',
			inForceFrom: { [Op.lte]: at },
			supersededAt: { [Op.or]: [null, { [Op.gt]: at }] }
		},
		order: [
			['inForceFrom', 'DESC'],
			['number', 'DESC']
		]
	});
}
