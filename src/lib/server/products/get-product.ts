import type { Context } from '../context';
import { Product } from '../db/models/product';
import { Variety } from '../db/models/variety';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { productView, type ProductView } from './views';

/** One product with its varieties. @throws Refusal `not-found`, `not-allowed` */
export async function getProduct(ctx: Context, productId: string): Promise<ProductView> {
	authorize(ctx, 'catalogue.view');
	const product = await Product.findByPk(productId);
	if (!product) throw new Refusal('not-found');
	const varieties = await Variety.findAll({ where: { productId }, order: [['name', 'asc']] });
	return productView(product, varieties);
}
