import { col, fn } from 'sequelize';
import type { Context } from '../context';
import { AssessmentRow } from '../db/models/assessment-row';
import { SpecVersion } from '../db/models/spec-version';
import { User } from '../db/models/user';
import { getProduct } from '../products/get-product';
import type { ProductView } from '../products/views';
import { Refusal } from '../refusals';
import { specVersionView, type SpecVersionView } from './views';

/** All versions of a product's spec, or of one variety's. */
export interface SpecSheet {
	product: ProductView;
	varietyId: string | null;
	/** Newest first. */
	versions: SpecVersionView[];
	draft: SpecVersionView | null;
	inForce: SpecVersionView | null;
}

/** The spec of a product with every version of it. @throws Refusal `not-found`, `not-allowed` */
export async function getSpecSheet(
	ctx: Context,
	productId: string,
	varietyId: string | null
): Promise<SpecSheet> {
	const product = await getProduct(ctx, productId);
	if (varietyId !== null && !product.varieties.some((variety) => variety.id === varietyId))
		throw new Refusal('not-found');
	const rows = await SpecVersion.findAll({
		where: { productId, varietyId },
		order: [
			['number', 'desc'],
			['id', 'desc']
		]
	});
	const names = await userNames(rows);
	const dockets = await docketCounts(rows.map((row) => row.id));
	const versions = rows.map((row) =>
		specVersionView(row, ctx.now, (id) => (id && names.get(id)) || null, dockets.get(row.id) ?? 0)
	);
	return {
		product,
		varietyId,
		versions,
		draft: versions.find((version) => version.standing === 'draft') ?? null,
		inForce: versions.find((version) => version.standing === 'in-force') ?? null
	};
}

async function userNames(rows: readonly SpecVersion[]): Promise<Map<string, string>> {
	const ids = rows.flatMap((row) => [row.createdBy, row.signedBy]).filter((id) => id !== null);
	const users = await User.findAll({ attributes: ['id', 'name'], where: { id: [...new Set(ids)] } });
	return new Map(users.map((user) => [user.id, user.name]));
}

async function docketCounts(specVersionIds: string[]): Promise<Map<string, number>> {
	const rows = await AssessmentRow.findAll({
		attributes: ['specVersionId', [fn('COUNT', fn('DISTINCT', col('shipment_id'))), 'dockets']],
		where: { specVersionId: specVersionIds, isCurrent: true },
		group: ['specVersionId']
	});
	return new Map(rows.map((row) => [row.specVersionId, Number(row.get('dockets'))]));
}
