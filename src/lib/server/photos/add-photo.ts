import { v7 as uuid } from 'uuid';
import { maxPhotoBytes, type PhotoInput } from '../../schemas/photo';
import type { Context } from '../context';
import { Photo } from '../db/models/photo';
import { Shipment } from '../db/models/shipment';
import { inTransaction } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import { lockDocket, refuseClosed } from '../shipments/lock-docket';
import { keepBytes } from '../storage/store';
import { cleanJpeg } from './clean-jpeg';

/** Checks the bytes: a whole JPEG within the limit, without the camera's own remarks. */
function pictureOf(bytes: Uint8Array): Uint8Array {
	if (bytes.length > maxPhotoBytes)
		throw new Refusal('too-large', 'The photograph is larger than 10 MB. Take it again at a smaller size.');
	const picture = cleanJpeg(bytes);
	if (!picture)
		throw new Refusal(
			'wrong-type',
			'This is not a JPEG photograph, or it broke off. Take it again, or save it as JPEG first.'
		);
	return picture;
}

/** Adds a photograph to a docket that is not signed yet. The same id again answers the one it made. */
export async function addPhoto(
	ctx: Context,
	number: string,
	input: PhotoInput,
	bytes: Uint8Array
): Promise<{ id: string }> {
	authorizeShipment(ctx, 'photo.add', await Shipment.findOne({ where: { number } }));
	const file = await keepBytes(pictureOf(bytes), 'image/jpeg', ctx.now);
	const id = input.id ?? uuid();

	return inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'photo.add', number, transaction);
		refuseClosed(shipment);
		const known = await Photo.findByPk(id, { transaction });
		if (known && known.shipmentId !== shipment.id) throw new Refusal('duplicate');
		if (known) return { id };
		const { kind, caption } = input;
		const row = { id, shipmentId: shipment.id, fileId: file.id, kind, caption: caption ?? '' };
		await Photo.create({ ...row, takenBy: ctx.actor.id, takenAt: ctx.now }, { transaction });
		record(
			'photo.added',
			{ scope: 'shipment', id: shipment.id },
			{ photoId: id, fileSha256: file.sha256, kind }
		);
		return { id };
	});
}
