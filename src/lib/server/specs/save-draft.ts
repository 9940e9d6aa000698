import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { Spec } from '../../domain/shelf-life/spec';
import { validateSpec } from '../../domain/shelf-life/validate';
import { findStartingSpec } from '../../domain/starting-specs/list-starting-specs';
import { copiedFromText } from '../../schemas/spec-form-starting';
import { organisationChain } from '../catalogue/organisation-chain';
import type { Context } from '../context';
import { Product } from '../db/models/product';
import { SpecVersion } from '../db/models/spec-version';
import { Variety } from '../db/models/variety';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { storedFigures, type StoredFigures } from './figures';

export interface DraftInput {
	productId: string;
	varietyId: string | null;
	figures: Spec;
	/** Hash of the draft the form was drawn from; empty where there was none. */
	seenSha256: string;
	/** Key of the starting spec the figures were copied from. */
	copiedFrom?: string | null | undefined;
}

/** The product's row is what writers of its specs queue at. @throws Refusal `not-found` */
export async function lockProduct(productId: string, transaction: Transaction): Promise<Product> {
	const product = await Product.findByPk(productId, { transaction, lock: transaction.LOCK.UPDATE });
	if (!product) throw new Refusal('not-found');
	return product;
}

export const savedMeanwhile =
	'Somebody saved other figures while this page was open. Open it again and look.';

/**
 * Keeps figures as the product's draft, made from whatever version they were edited from. The signed ones stay as they
 * are: a draft has the next number. A changed draft is a new row, since figures are never updated in place.
 * @returns the draft's id and number. @throws Refusal `not-allowed`, `not-found`, `invalid`, `changed-meanwhile`
 */
export async function saveDraft(ctx: Context, input: DraftInput): Promise<{ id: string; number: number }> {
	authorize(ctx, 'catalogue.change');
	if (validateSpec(input.figures).length > 0) throw new Refusal('invalid');
	const { productId, varietyId, copiedFrom = null } = input;
	const starting = copiedFrom === null ? null : findStartingSpec(copiedFrom);
	if (copiedFrom !== null && !starting) throw new Refusal('not-found');
	const stored = storedFigures(input.figures);
	const id = uuid();
	return inTransaction(ctx, async ({ transaction, record }) => {
		await lockProduct(productId, transaction);
		if (varietyId && !(await Variety.findOne({ where: { id: varietyId, productId }, transaction })))
			throw new Refusal('not-found');
		const draft = await SpecVersion.findOne({
			where: { productId, varietyId, state: 'draft' },
			transaction
		});
		if ((draft?.figuresSha256 ?? '') !== input.seenSha256)
			throw new Refusal('changed-meanwhile', savedMeanwhile);
		const reason = starting ? copiedFromText(starting) : (draft?.reason ?? '');
		if (draft && draft.figuresSha256 === stored.sha256 && draft.reason === reason)
			return { id: draft.id, number: draft.number };
		const number = draft?.number ?? (await nextNumber(productId, varietyId, transaction));
		await draft?.destroy({ transaction });
		await createDraft(ctx, { id, productId, varietyId, number, reason }, stored, transaction);
		record('spec.drafted', await organisationChain(transaction), {
			specVersionId: id,
			productId,
			number,
			figuresSha256: stored.sha256
		});
		return { id, number };
	});
}

function createDraft(
	ctx: Context,
	row: Pick<SpecVersion, 'id' | 'productId' | 'varietyId' | 'number' | 'reason'>,
	stored: StoredFigures,
	transaction: Transaction
): Promise<SpecVersion> {
	return SpecVersion.create(
		{
			...row,
			state: 'draft',
			figures: stored.text,
			figuresSha256: stored.sha256,
			createdBy: ctx.actor.id,
			createdAt: ctx.now
		},
		{ transaction }
	);
}

/** Numbers run per product and variety, and are not used twice once signed. */
async function nextNumber(
	productId: string,
	varietyId: string | null,
	transaction: Transaction
): Promise<number> {
	const highest = await SpecVersion.max<number | null, SpecVersion>('number', {
		where: { productId, varietyId },
		transaction
	});
	return (highest ?? 0) + 1;
}
