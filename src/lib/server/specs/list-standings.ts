import { Op } from 'sequelize';
import type { Spec } from '../../domain/shelf-life/spec';
import { SpecVersion } from '../db/models/spec-version';
import { figuresFrom } from './figures';

/** What a product, or one of its varieties, has signed and drafted. */
export interface Standing {
	productId: string;
	varietyId: string | null;
	inForce: { number: number; figures: Spec } | null;
	draftNumber: number | null;
}

/** The version in force at a moment and the open draft of many products at once. */
export async function listStandings(productIds: readonly string[], at: Date): Promise<Standing[]> {
	const versions = await SpecVersion.findAll({
		where: {
			productId: [...productIds],
			[Op.or]: [
				{ state: 'draft' },
				{ inForceFrom: { [Op.lte]: at }, supersededAt: { [Op.or]: [null, { [Op.gt]: at }] } }
			]
		},
		order: [['number', 'asc']]
	});
	const standings = new Map<string, Standing>();
	for (const { productId, varietyId, state, number, figures } of versions) {
		const key = `${productId} ${varietyId ?? ''}`;
		const standing = standings.get(key) ?? { productId, varietyId, inForce: null, draftNumber: null };
		if (state === 'draft') standing.draftNumber = number;
		else standing.inForce = { number, figures: figuresFrom(figures) };
		standings.set(key, standing);
	}
	return [...standings.values()];
}
