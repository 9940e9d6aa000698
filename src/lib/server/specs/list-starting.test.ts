import { describe, expect, it } from 'vitest';
import {
	buildProduct,
	buildSite,
	buildUser,
	contextFor,
	testPassword
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { readSpecForm } from '../../schemas/spec-form';
import { startingValues } from '../../schemas/spec-form-starting';
import type { Role } from '../context';
import { SpecVersion } from '../db/models/spec-version';
import { Variety } from '../db/models/variety';
import { findSpecInForce } from './find-spec-in-force';
import { getStarting, listCopyPlaces, listStarting } from './list-starting';
import { saveDraft } from './save-draft';
import { signSpec } from './sign-spec';

useTestDatabase();

const as = async (role: Role) => contextFor(await buildUser([role], { sites: [await buildSite()] }));
const refusal = (code: string) => expect.objectContaining({ code });

async function copied(key: string) {
	const starting = await getStarting(await as('admin'), key);
	const { spec } = readSpecForm({ ...startingValues(starting, 'celsius'), needed: '5', openingDefault: '1' });
	if (!spec) throw new Error(`the starting spec ${key} is not whole`);
	return { starting, spec };
}

describe('the library of starting specs', () => {
	it('is searched by product, family and source, every word', async () => {
		const ctx = await as('qa');
		const { items, total } = await listStarting(ctx, '');
		expect(items.length).toBe(total);
		expect(total).toBeGreaterThanOrEqual(30);
		const found = await listStarting(ctx, 'frozen  BROCCOLI');
		expect(found.items.map(({ product }) => product)).toEqual(['Broccoli, frozen']);
		expect((await listStarting(ctx, 'huss fish')).items.length).toBeGreaterThan(2);
		expect((await listStarting(ctx, 'no such thing')).items).toEqual([]);
	});

	it('is for staff; where copies may go is for who changes the catalogue', async () => {
		const qa = await as('qa');
		await expect(listCopyPlaces(qa)).rejects.toEqual(refusal('not-allowed'));
		await expect(getStarting(qa, 'unheard-of')).rejects.toEqual(refusal('not-found'));
		const { product } = await buildProduct();
		await Variety.create({ id: crypto.randomUUID(), productId: product.id, name: '12 × 125 g' });
		const places = (await listCopyPlaces(await as('admin'))).filter((one) => one.productId === product.id);
		expect(places.map(({ name }) => name)).toEqual([product.name, `${product.name}, 12 × 125 g`]);
	});
});

describe('a copy of a starting spec', () => {
	it('is a draft that names where it came from, and judges nothing before it is signed', async () => {
		const ctx = await as('admin');
		const { product, spec: inForce } = await buildProduct();
		const { starting, spec } = await copied('broccoli-frozen');
		const input = { productId: product.id, varietyId: null, figures: spec, seenSha256: '' };
		const { id } = await saveDraft(ctx, { ...input, copiedFrom: starting.key });
		const draft = await SpecVersion.findByPk(id);
		expect(draft).toMatchObject({
			state: 'draft',
			reason: 'Copied from the starting spec “Broccoli, frozen”.'
		});
		const line = { productId: product.id, varietyId: null };
		expect((await findSpecInForce(line, ctx.now))?.id).toBe(inForce.id);

		// Saved again with other figures it still says so; signed, it has the signer's own reason.
		const again = await saveDraft(ctx, {
			...input,
			figures: { ...spec, neededHours: 96 },
			seenSha256: draft?.figuresSha256 ?? ''
		});
		const later = await SpecVersion.findByPk(again.id);
		expect(later?.reason).toBe(draft?.reason);
		await signSpec(ctx, {
			specVersionId: again.id,
			figuresSha256: later?.figuresSha256 ?? '',
			password: testPassword,
			reason: 'checked against our own goods',
			inForceFrom: null
		});
		expect((await findSpecInForce(line, ctx.now))?.id).toBe(again.id);
		expect((await SpecVersion.findByPk(again.id))?.reason).toBe('checked against our own goods');
	});

	it('is refused of a key the library does not know', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const { spec } = await copied('ice-cream');
		const input = { productId: product.id, varietyId: null, figures: spec, seenSha256: '' };
		await expect(saveDraft(ctx, { ...input, copiedFrom: 'nothing' })).rejects.toEqual(refusal('not-found'));
		expect(await SpecVersion.count({ where: { productId: product.id, state: 'draft' } })).toBe(0);
	});
});
