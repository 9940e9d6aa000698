import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { maxPhotoBytes, photoInput } from '../../schemas/photo';
import { AuditEntry } from '../db/models/audit-entry';
import { Photo } from '../db/models/photo';
import { addPhoto } from './add-photo';
import { getPhoto } from './get-photo';
import { exifSegment, samplePhoto, withSegment } from './sample-photo';

useTestDatabase();

const input = photoInput.parse({ kind: 'seal', caption: 'seal at the rear door' });

async function setUp(overrides: Parameters<typeof buildShipment>[0] = {}) {
	const built = await buildShipment(overrides);
	const ctx = await contextFor(await buildUser(['dock'], { sites: [built.site] }));
	return { ...built, ctx, number: built.shipment.number };
}

describe('photographs', () => {
	it('are not for claims or suppliers to add, nor at another site', async () => {
		const { number, site, supplier } = await setUp();
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(addPhoto(claims, number, input, samplePhoto)).rejects.toMatchObject({ code: 'not-allowed' });
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(addPhoto(own, number, input, samplePhoto)).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		await expect(addPhoto(elsewhere, number, input, samplePhoto)).rejects.toMatchObject({
			code: 'not-found'
		});
	});

	it('are kept without the place they were taken at, once, with an audit entry', async () => {
		const { ctx, number, shipment } = await setUp();
		const id = uuid();
		const taken = withSegment(samplePhoto, exifSegment('GPS 52.1 N'));
		await addPhoto(ctx, number, { ...input, id }, taken);
		await addPhoto(ctx, number, { ...input, id }, taken);
		expect(await Photo.findAll({ where: { shipmentId: shipment.id } })).toMatchObject([
			{ id, kind: 'seal', caption: 'seal at the rear door', takenBy: ctx.actor.id }
		]);
		expect(new Uint8Array((await getPhoto(ctx, id)).bytes)).toEqual(samplePhoto);
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'photo.added' } })).toBe(1);
	});

	it('are refused when they are no JPEG, too large, or the docket is signed', async () => {
		const { ctx, number } = await setUp();
		await expect(addPhoto(ctx, number, input, Buffer.from('<svg/>'))).rejects.toMatchObject({
			code: 'wrong-type'
		});
		const huge = new Uint8Array(maxPhotoBytes + 1);
		await expect(addPhoto(ctx, number, input, huge)).rejects.toMatchObject({ code: 'too-large' });
		const signed = await setUp({ decidedAt: testNow });
		await expect(addPhoto(signed.ctx, signed.number, input, samplePhoto)).rejects.toMatchObject({
			code: 'already-signed'
		});
	});

	it('are seen by the docket’s own supplier and site, and by nobody else', async () => {
		const { ctx, number, supplier } = await setUp();
		const { id } = await addPhoto(ctx, number, input, samplePhoto);
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		expect((await getPhoto(own, id)).bytes.length).toBe(samplePhoto.length);
		const other = await contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
		await expect(getPhoto(other, id)).rejects.toMatchObject({ code: 'not-found' });
		const elsewhere = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(getPhoto(elsewhere, id)).rejects.toMatchObject({ code: 'not-found' });
		await expect(getPhoto(ctx, uuid())).rejects.toMatchObject({ code: 'not-found' });
	});
});
