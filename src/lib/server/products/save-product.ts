import { v7 as uuid } from 'uuid';
import type { ProductForm } from '../../schemas/product';
import { orDuplicate } from '../catalogue/duplicate';
import { organisationChain } from '../catalogue/organisation-chain';
import { assertUnchanged } from '../catalogue/revision';
import type { Context } from '../context';
import { Product } from '../db/models/product';
import { Variety } from '../db/models/variety';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { productFields } from './views';

const taken = 'There is a product of that name already. Open that one, or tell the two apart by their names.';

/**
 * Adds a product (`productId` null) or changes one. @returns its id.
 * @throws Refusal `not-allowed`, `not-found`, `duplicate`, `changed-meanwhile`
 */
export async function saveProduct(
	ctx: Context,
	productId: string | null,
	form: ProductForm
): Promise<string> {
	authorize(ctx, 'catalogue.change');
	const { revision, ...fields } = form;
	const id = productId ?? uuid();
	const writing = inTransaction(ctx, async ({ transaction, record }) => {
		const chain = await organisationChain(transaction);
		if (productId === null) {
			const made = await Product.create({ id, ...fields, createdAt: ctx.now }, { transaction });
			return record('product.saved', chain, { productId: id, before: null, after: productFields(made) });
		}
		const product = await Product.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
		if (!product) throw new Refusal('not-found');
		const before = productFields(product);
		assertUnchanged(revision, before);
		await product.update(fields, { transaction });
		record('product.saved', chain, { productId: id, before, after: productFields(product) });
	});
	await orDuplicate(writing, taken);
	return id;
}

/** Names a variety or pack that may have a spec of its own. @throws Refusal `not-allowed`, `not-found`, `duplicate` */
export async function addVariety(ctx: Context, productId: string, name: string): Promise<string> {
	authorize(ctx, 'catalogue.change');
	const id = uuid();
	const writing = inTransaction(ctx, async ({ transaction, record }) => {
		const product = await Product.findByPk(productId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!product) throw new Refusal('not-found');
		await Variety.create({ id, productId, name }, { transaction });
		const after = { ...productFields(product), variety: name };
		const chain = await organisationChain(transaction);
		record('product.saved', chain, { productId, before: productFields(product), after });
	});
	await orDuplicate(writing, 'This product has a variety of that name already.');
	return id;
}

/** Takes a product out of the choices, or back in; its dockets and specs stay. @throws Refusal `not-allowed`, `not-found` */
export async function switchProduct(ctx: Context, productId: string, isOn: boolean): Promise<void> {
	authorize(ctx, 'catalogue.change');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const product = await Product.findByPk(productId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!product) throw new Refusal('not-found');
		if ((product.switchedOffAt === null) === isOn) return;
		await product.update({ switchedOffAt: isOn ? null : ctx.now }, { transaction });
		record('product.saved', await organisationChain(transaction), {
			productId,
			before: { isInUse: !isOn },
			after: { isInUse: isOn }
		});
	});
}
