import { QueryTypes } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildProduct,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword,
	testSpec
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import type { Spec } from '../../domain/shelf-life/spec';
import { verifyAllChains } from '../audit/verify';
import type { Context, Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { SpecVersion } from '../db/models/spec-version';
import { User } from '../db/models/user';
import { Variety } from '../db/models/variety';
import { database } from '../db/sequelize';
import { sha256Hex } from '../storage/sha256';
import { discardDraft } from './discard-draft';
import { storedFigures } from './figures';
import { findSpecInForce } from './find-spec-in-force';
import { getSpecSheet } from './get-spec-sheet';
import { saveDraft } from './save-draft';
import { signSpec, type SpecSignature } from './sign-spec';

useTestDatabase();

const warmer: Spec = { ...testSpec, model: { kind: 'constant-q10', q10: 3.5 } };
const later = new Date(testNow.getTime() + 86_400_000);

async function as(role: Role, now = testNow): Promise<Context> {
	if (role === 'supplier')
		return contextFor(await buildUser(['supplier'], { partner: await buildPartner() }), now);
	return contextFor(await buildUser([role], { sites: [await buildSite()] }), now);
}

async function draftOf(ctx: Context, productId: string, figures = warmer, seenSha256 = '') {
	return saveDraft(ctx, { productId, varietyId: null, figures, seenSha256 });
}

async function sign(ctx: Context, specVersionId: string, more: Partial<SpecSignature> = {}) {
	const { sha256 } = storedFigures(warmer);
	const reason = 'new respiration figures';
	return signSpec(ctx, {
		specVersionId,
		figuresSha256: sha256,
		password: testPassword,
		reason,
		inForceFrom: null,
		...more
	});
}

const refusal = (code: string) => expect.objectContaining({ code });

describe('a draft', () => {
	it('is made by admins only; other staff read, suppliers see nothing', async () => {
		const { product } = await buildProduct();
		for (const role of ['dock', 'qa', 'claims', 'supplier'] as const) {
			await expect(draftOf(await as(role), product.id)).rejects.toEqual(refusal('not-allowed'));
		}
		expect((await getSpecSheet(await as('dock'), product.id, null)).inForce?.number).toBe(1);
		await expect(getSpecSheet(await as('supplier'), product.id, null)).rejects.toEqual(
			refusal('not-allowed')
		);
		expect(await SpecVersion.count({ where: { productId: product.id } })).toBe(1);
	});

	it('takes the next number, and keeps it while it is edited', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const first = await draftOf(ctx, product.id);
		const again = await draftOf(
			ctx,
			product.id,
			{ ...warmer, neededHours: 200 },
			storedFigures(warmer).sha256
		);

		expect([first.number, again.number]).toEqual([2, 2]);
		const sheet = await getSpecSheet(ctx, product.id, null);
		expect(sheet.versions.map(({ number, standing }) => [number, standing])).toEqual([
			[2, 'draft'],
			[1, 'in-force']
		]);
		expect(sheet.draft).toMatchObject({ id: again.id, savedBy: ctx.actor.name, dockets: 0 });
		expect(sheet.draft?.figures.neededHours).toBe(200);
		expect(await AuditEntry.count({ where: { type: 'spec.drafted' } })).toBeGreaterThanOrEqual(2);
	});

	it('is numbered for itself for each variety', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const variety = await Variety.create({ id: uuid(), productId: product.id, name: 'Duke' });
		const made = await saveDraft(ctx, {
			productId: product.id,
			varietyId: variety.id,
			figures: warmer,
			seenSha256: ''
		});
		expect(made.number).toBe(1);
		expect((await draftOf(ctx, product.id)).number).toBe(2);
	});

	it('of a variety of another product is refused', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const other = await buildProduct();
		const variety = await Variety.create({ id: uuid(), productId: other.product.id, name: 'Duke' });
		const input = { productId: product.id, varietyId: variety.id, figures: warmer, seenSha256: '' };
		await expect(saveDraft(ctx, input)).rejects.toEqual(refusal('not-found'));
	});

	it('is not overwritten by somebody who has not seen it', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		await draftOf(ctx, product.id);
		await expect(draftOf(await as('admin'), product.id, testSpec)).rejects.toEqual(
			refusal('changed-meanwhile')
		);
	});

	it('that could not be assessed with is refused, and nothing is written', async () => {
		const { product } = await buildProduct();
		const faulty: Spec = { ...warmer, neededHours: 1000 };
		await expect(draftOf(await as('admin'), product.id, faulty)).rejects.toEqual(refusal('invalid'));
		expect(await SpecVersion.count({ where: { productId: product.id } })).toBe(1);
	});

	it('is discarded by an admin, and its number is free again', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const { id } = await draftOf(ctx, product.id);
		await expect(discardDraft(await as('qa'), id)).rejects.toEqual(refusal('not-allowed'));
		await discardDraft(ctx, id);
		await expect(discardDraft(ctx, id)).rejects.toEqual(refusal('not-found'));
		expect((await draftOf(ctx, product.id)).number).toBe(2);
	});
});

describe('signing a version', () => {
	it('is for admins with their own password, on the figures they were shown', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const { id } = await draftOf(ctx, product.id);
		await expect(sign(await as('qa'), id)).rejects.toEqual(refusal('not-allowed'));
		await expect(sign(ctx, id, { password: 'not it' })).rejects.toEqual(refusal('wrong-password'));
		await expect(sign(ctx, id, { figuresSha256: sha256Hex('other') })).rejects.toEqual(
			refusal('changed-meanwhile')
		);
		expect((await User.findByPk(ctx.actor.id))?.failedPasswords).toBe(0);
		expect((await SpecVersion.findByPk(id))?.state).toBe('draft');
	});

	it('puts it in force, ends the one before, and is on the record with its reason and hash', async () => {
		const ctx = await as('admin');
		const { product, spec } = await buildProduct();
		const { id } = await draftOf(ctx, product.id);
		expect(await sign(ctx, id)).toEqual({ number: 2 });

		expect(await findSpecInForce({ productId: product.id, varietyId: null }, testNow)).toMatchObject({
			id,
			number: 2,
			figures: warmer
		});
		expect(
			await findSpecInForce({ productId: product.id, varietyId: null }, new Date(testNow.getTime() - 1))
		).toMatchObject({
			id: spec.id
		});
		const sheet = await getSpecSheet(ctx, product.id, null);
		expect(sheet.versions.map(({ standing }) => standing)).toEqual(['in-force', 'superseded']);
		expect(sheet.inForce).toMatchObject({ signedBy: ctx.actor.name, reason: 'new respiration figures' });
		expect(await AuditEntry.count({ where: { type: 'spec.signed', actorId: ctx.actor.id } })).toBe(1);
		expect((await verifyAllChains()).faults).toEqual([]);
	});

	it('may name a later day: until then the one before holds', async () => {
		const ctx = await as('admin');
		const { product, spec } = await buildProduct();
		const { id } = await draftOf(ctx, product.id);
		await sign(ctx, id, { inForceFrom: later });
		expect(await findSpecInForce({ productId: product.id, varietyId: null }, testNow)).toMatchObject({
			id: spec.id
		});
		expect(await findSpecInForce({ productId: product.id, varietyId: null }, later)).toMatchObject({ id });
		expect((await getSpecSheet(ctx, product.id, null)).versions[0]?.standing).toBe('to-come');
	});

	it('for the past is refused', async () => {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const { id } = await draftOf(ctx, product.id);
		await expect(sign(ctx, id, { inForceFrom: new Date(testNow.getTime() - 1) })).rejects.toEqual(
			refusal('invalid')
		);
	});
});

describe('a signed version', () => {
	async function signed() {
		const ctx = await as('admin');
		const { product } = await buildProduct();
		const { id } = await draftOf(ctx, product.id);
		await sign(ctx, id);
		return { ctx, product, id };
	}

	it('never changes: editing makes the next draft, and it can be neither signed again nor discarded', async () => {
		const { ctx, product, id } = await signed();
		const before = (await SpecVersion.findByPk(id))?.toJSON();
		const next = await draftOf(ctx, product.id, { ...warmer, neededHours: 100 });

		expect(next.number).toBe(3);
		expect(next.id).not.toBe(id);
		await expect(discardDraft(ctx, id)).rejects.toEqual(refusal('spec-signed'));
		await expect(sign(ctx, id)).rejects.toEqual(refusal('spec-signed'));
		expect((await SpecVersion.findByPk(id))?.toJSON()).toEqual(before);
	});

	it('never changes by SQL either: the app’s account may not write figures, hash or number', async () => {
		const { id } = await signed();
		for (const column of ["figures = '{}'", "figures_sha256 = ''", 'number = 9', 'created_by = NULL']) {
			const attempt = database().query(`UPDATE spec_versions SET ${column} WHERE id = ?`, {
				replacements: [id]
			});
			await expect(attempt).rejects.toThrow(/denied/);
		}
		const [row] = await database().query<{ figures: string }>(
			'SELECT figures FROM spec_versions WHERE id = ?',
			{
				replacements: [id],
				type: QueryTypes.SELECT
			}
		);
		expect(row?.figures).toBe(storedFigures(warmer).text);
	});
});

describe('the hash of figures', () => {
	it('is the same whatever order the keys came in, and after a round through the database', async () => {
		const reversed = Object.fromEntries(Object.entries(warmer).reverse()) as unknown as Spec;
		expect(storedFigures(reversed)).toEqual(storedFigures(warmer));
		const { product } = await buildProduct();
		const { id } = await draftOf(await as('admin'), product.id);
		const kept = await SpecVersion.findByPk(id);
		expect(sha256Hex(kept?.figures ?? '')).toBe(kept?.figuresSha256);
		expect(kept?.figuresSha256).toBe(storedFigures(warmer).sha256);
	});

	it('is another for any other figure', () => {
		expect(storedFigures({ ...warmer, freezingCelsius: -1.2 }).sha256).not.toBe(storedFigures(warmer).sha256);
	});
});
