import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildProduct,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testSpec
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { productForm, productQuery, productRulesForm } from '../../schemas/product';
import type { Context, Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { SpecVersion } from '../db/models/spec-version';
import { storedFigures } from '../specs/figures';
import { getProduct } from './get-product';
import { listFamilies, listProducts } from './list-products';
import { addVariety, saveProduct, switchProduct } from './save-product';
import { saveProductRules } from './save-rules';

useTestDatabase();

async function as(role: Role): Promise<Context> {
	if (role === 'supplier')
		return contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
	return contextFor(await buildUser([role], { sites: [await buildSite()] }));
}

const form = (name: string, more: Record<string, unknown> = {}) =>
	productForm.parse({ name, family: 'Berries', countUnit: 'case', ...more });
const query = (more: Record<string, unknown> = {}) => productQuery.parse(more);
const refusal = (code: string) => expect.objectContaining({ code });

describe('the register of products', () => {
	it('is read by all staff, changed by admins only, and closed to suppliers', async () => {
		const { product } = await buildProduct();
		for (const role of ['dock', 'qa', 'claims', 'supplier'] as const) {
			const ctx = await as(role);
			await expect(saveProduct(ctx, null, form('No'))).rejects.toEqual(refusal('not-allowed'));
			await expect(addVariety(ctx, product.id, 'No')).rejects.toEqual(refusal('not-allowed'));
			await expect(switchProduct(ctx, product.id, false)).rejects.toEqual(refusal('not-allowed'));
			if (role === 'supplier') {
				await expect(listProducts(ctx, query())).rejects.toEqual(refusal('not-allowed'));
				await expect(getProduct(ctx, product.id)).rejects.toEqual(refusal('not-allowed'));
			} else expect((await getProduct(ctx, product.id)).name).toBe(product.name);
		}
	});

	it('adds and changes a product, each on the record, and refuses a second one of its name', async () => {
		const ctx = await as('admin');
		const id = await saveProduct(ctx, null, form('Gooseberries'));
		const made = await getProduct(ctx, id);
		expect(made).toMatchObject({ name: 'Gooseberries', family: 'berries', countUnit: 'case', varieties: [] });
		await expect(saveProduct(ctx, null, form('Gooseberries'))).rejects.toEqual(refusal('duplicate'));

		await saveProduct(ctx, id, form('Gooseberries, red', { revision: made.revision }));
		expect((await getProduct(ctx, id)).name).toBe('Gooseberries, red');
		expect(await AuditEntry.count({ where: { type: 'product.saved', actorId: ctx.actor.id } })).toBe(2);
		const stale = form('Gooseberries, green', { revision: made.revision });
		await expect(saveProduct(ctx, id, stale)).rejects.toEqual(refusal('changed-meanwhile'));
		await expect(saveProduct(ctx, uuid(), form('Nothing'))).rejects.toEqual(refusal('not-found'));
	});

	it('names varieties, each once a product', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const id = await addVariety(ctx, product.id, 'Duke');
		expect((await getProduct(ctx, product.id)).varieties).toEqual([{ id, name: 'Duke' }]);
		await expect(addVariety(ctx, product.id, 'Duke')).rejects.toEqual(refusal('duplicate'));
	});

	it('asks in words for what a form leaves out', () => {
		const faults = productForm.safeParse({ name: ' ', family: '', countUnit: '' }).error?.issues ?? [];
		expect(faults.map((fault) => fault.message)).toEqual([
			'Enter the product’s name, as it stands on the papers.',
			'Enter the family, such as berries or fish.',
			'Enter what is counted, such as case or box.'
		]);
	});
});

describe('the list of products', () => {
	it('shows the version in force, and that a draft is open', async () => {
		const ctx = await as('dock');
		const { product } = await buildProduct({ name: 'Medlars', family: 'pome' });
		const { text, sha256 } = storedFigures(testSpec);
		await SpecVersion.create({
			id: uuid(),
			productId: product.id,
			varietyId: null,
			number: 2,
			state: 'draft',
			figures: text,
			figuresSha256: sha256,
			createdAt: testNow
		});
		const { items, total } = await listProducts(ctx, query({ q: 'medl' }));
		expect(total).toBe(1);
		expect(items[0]).toMatchObject({
			name: 'Medlars',
			draftNumber: 2,
			inForce: { number: 1, figures: testSpec }
		});
	});

	it('searches, filters by family and state, and sorts by figures with the unknown last either way', async () => {
		const ctx = await as('admin');
		const short = await buildProduct({
			name: 'Aa short',
			family: 'sorted',
			spec: { ...testSpec, fullLifeHours: 300 }
		});
		const long = await buildProduct({ name: 'Bb long', family: 'sorted' });
		const bare = await saveProduct(ctx, null, form('Cc bare', { family: 'sorted' }));
		const names = async (more: Record<string, unknown>) =>
			(await listProducts(ctx, query({ family: 'sorted', ...more }))).items.map((row) => row.id);

		expect(await names({ sort: 'life' })).toEqual([short.product.id, long.product.id, bare]);
		expect(await names({ sort: 'life', dir: 'desc' })).toEqual([long.product.id, short.product.id, bare]);
		expect(await names({ sort: 'name', dir: 'desc' })).toEqual([bare, long.product.id, short.product.id]);
		expect(await names({ q: '%' })).toEqual([]);
		await switchProduct(ctx, bare, false);
		expect(await names({ state: 'off' })).toEqual([bare]);
		expect(await names({})).not.toContain(bare);
		expect(await listFamilies(ctx)).toContain('sorted');
	});

	it('comes in pages, and past the last one is empty', async () => {
		const ctx = await as('qa');
		expect((await listProducts(ctx, query({ page: '999' }))).items).toEqual([]);
		expect(query({ page: 'x', sort: 'y', state: 'z' })).toMatchObject({
			page: 1,
			sort: 'name',
			state: 'in-use'
		});
	});
});

describe('the rules for a product’s loads', () => {
	const rules = (more: Record<string, unknown> = {}) => productRulesForm.parse(more);

	it('are changed by admins only', async () => {
		const { product } = await buildProduct();
		for (const role of ['dock', 'qa', 'claims', 'supplier'] as const)
			await expect(saveProductRules(await as(role), product.id, rules())).rejects.toEqual(
				refusal('not-allowed')
			);
	});

	it('hold dates, the logger and grades, on the record with both states, and nobody overwrites unseen', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const before = (await getProduct(ctx, product.id)).rules;
		expect(before).toMatchObject({
			minimumDatedDays: null,
			isNotOlderThanLast: false,
			isLoggerRequired: false,
			grades: {}
		});
		const sent = {
			minimumDatedDays: '14',
			isNotOlderThanLast: 'on',
			isLoggerRequired: 'on',
			grades: { 'interval-too-long': 'hold', 'calibration-overdue': 'inform', 'seal-broken': '' },
			revision: before.revision
		};
		await saveProductRules(ctx, product.id, rules(sent));
		const after = (await getProduct(ctx, product.id)).rules;
		const kept = {
			minimumDatedDays: 14,
			isNotOlderThanLast: true,
			isLoggerRequired: true,
			grades: { 'calibration-overdue': 'inform', 'interval-too-long': 'hold' }
		};
		expect(after).toMatchObject(kept);
		const ofProduct = { type: 'product.saved', actorId: ctx.actor.id };
		const entry = await AuditEntry.findOne({ where: ofProduct });
		const payload = await AuditPayload.findByPk(entry?.id ?? '');
		expect(JSON.parse(payload?.text ?? '{}')).toMatchObject({ before: { grades: {} }, after: kept });
		await expect(saveProductRules(ctx, product.id, rules(sent))).rejects.toEqual(
			refusal('changed-meanwhile')
		);
		// Choosing nothing again takes every grade back.
		await saveProductRules(ctx, product.id, rules({ revision: after.revision }));
		expect((await getProduct(ctx, product.id)).rules).toMatchObject({ grades: {}, minimumDatedDays: null });
		await expect(saveProductRules(ctx, uuid(), rules())).rejects.toEqual(refusal('not-found'));
	});

	it.each([
		[{ minimumDatedDays: '1.5' }, 'minimumDatedDays'],
		[{ minimumDatedDays: '-1' }, 'minimumDatedDays'],
		[{ minimumDatedDays: '99999' }, 'minimumDatedDays'],
		[{ minimumDatedDays: 'soon' }, 'minimumDatedDays'],
		[{ grades: { 'seal-broken': 'reject' } }, 'grades.seal-broken'],
		[{ grades: { 'life-short': 'note' } }, 'grades'],
		[{ grades: { 'stop-reached': 'inform' } }, 'grades'],
		[{ grades: { nonsense: 'hold' } }, 'grades']
	])('refuse %j in words', (sent, field) => {
		const faults = productRulesForm.safeParse(sent).error?.issues ?? [];
		expect(faults.map((fault) => fault.path.join('.'))).toEqual([field]);
		for (const fault of faults) expect(fault.message).toMatch(/^[A-Z].+\.$/);
	});
});
