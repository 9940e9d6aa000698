import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { buildProduct, testSpec } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { SpecVersion } from '../db/models/spec-version';
import { Variety } from '../db/models/variety';
import { sha256Hex } from '../storage/sha256';
import { findSpecInForce } from './find-spec-in-force';

useTestDatabase();

const at = (text: string) => new Date(`${text}T12:00:00Z`);

async function addVersion(productId: string, overrides: Partial<SpecVersion>): Promise<SpecVersion> {
	const figures = JSON.stringify(testSpec);
	return SpecVersion.create({
		id: uuid(),
		productId,
		varietyId: null,
		number: 2,
		state: 'signed',
		figures,
		figuresSha256: sha256Hex(figures),
		createdAt: at('2026-02-01'),
		signedAt: at('2026-02-01'),
		inForceFrom: at('2026-02-01'),
		supersededAt: null,
		...overrides
	});
}

describe('the spec in force', () => {
	it('is the signed version that held at the moment asked about', async () => {
		const { product, spec } = await buildProduct();
		await spec.update({ supersededAt: at('2026-02-01') });
		const second = await addVersion(product.id, {});
		await addVersion(product.id, { number: 3, state: 'draft', signedAt: null, inForceFrom: null });

		expect(await findSpecInForce({ productId: product.id, varietyId: null }, at('2026-01-15'))).toMatchObject(
			{
				id: spec.id,
				number: 1
			}
		);
		expect(await findSpecInForce({ productId: product.id, varietyId: null }, at('2026-02-01'))).toMatchObject(
			{ id: second.id }
		);
		expect(await findSpecInForce({ productId: product.id, varietyId: null }, at('2026-03-01'))).toEqual({
			id: second.id,
			number: 2,
			figuresSha256: second.figuresSha256,
			figures: testSpec
		});
	});

	it('is null before the first version was signed, and for a product that is not known', async () => {
		const { product } = await buildProduct();
		expect(await findSpecInForce({ productId: product.id, varietyId: null }, at('2025-12-31'))).toBeNull();
		expect(await findSpecInForce({ productId: uuid(), varietyId: null }, at('2026-03-01'))).toBeNull();
	});

	it("is the variety's own where it has one, else the product's", async () => {
		const { product, spec } = await buildProduct();
		const own = await Variety.create({ id: uuid(), productId: product.id, name: 'Own spec' });
		const other = await Variety.create({ id: uuid(), productId: product.id, name: 'No spec' });
		const variety = await addVersion(product.id, { varietyId: own.id, number: 1 });

		expect(
			await findSpecInForce({ productId: product.id, varietyId: own.id }, at('2026-03-01'))
		).toMatchObject({ id: variety.id });
		expect(
			await findSpecInForce({ productId: product.id, varietyId: own.id }, at('2026-01-15'))
		).toMatchObject({ id: spec.id });
		expect(
			await findSpecInForce({ productId: product.id, varietyId: other.id }, at('2026-03-01'))
		).toMatchObject({ id: spec.id });
	});
});
