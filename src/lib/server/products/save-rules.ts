import type { ProductRulesForm } from '../../schemas/product';
import { inOrder } from '../assessments/finding-grades';
import { organisationChain } from '../catalogue/organisation-chain';
import { assertUnchanged } from '../catalogue/revision';
import type { Context } from '../context';
import { Product } from '../db/models/product';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { productRules } from './views';

/**
 * Changes what is asked of a product's loads; they count from the next assessment of each open docket on.
 * @throws Refusal `not-allowed`, `not-found`, `changed-meanwhile`
 */
export async function saveProductRules(
	ctx: Context,
	productId: string,
	form: ProductRulesForm
): Promise<void> {
	authorize(ctx, 'catalogue.change');
	const { revision, grades, ...fields } = form;
	await inTransaction(ctx, async ({ transaction, record }) => {
		const product = await Product.findByPk(productId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!product) throw new Refusal('not-found');
		const before = productRules(product);
		assertUnchanged(revision, before);
		await product.update({ ...fields, findingGrades: inOrder(grades) }, { transaction });
		const chain = await organisationChain(transaction);
		record('product.saved', chain, { productId, before, after: productRules(product) });
	});
}
