import type { Context } from '../context';
import { Partner } from '../db/models/partner';
import { Product } from '../db/models/product';
import { authorize } from '../policies';

/** Parties and products to narrow the list of dockets by; those switched off too, since old dockets name them. */
export async function getListChoices(ctx: Context) {
	authorize(ctx, 'shipment.list');
	const [partners, products] = await Promise.all([
		Partner.findAll({ order: ['name'] }),
		Product.findAll({ order: ['name'] })
	]);
	const named = (rows: readonly { id: string; name: string }[]) => rows.map(({ id, name }) => ({ id, name }));
	return {
		suppliers: named(partners.filter((partner) => partner.isSupplier)),
		carriers: named(partners.filter((partner) => partner.isCarrier)),
		products: named(products)
	};
}
