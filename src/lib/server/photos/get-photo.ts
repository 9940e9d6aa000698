import type { Context } from '../context';
import { Photo } from '../db/models/photo';
import { Shipment } from '../db/models/shipment';
import { StoredFile } from '../db/models/stored-file';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import { fileStore } from '../storage/store';

/** A photograph as it goes out: checked when it came in, named by its hash. */
export interface PhotoFile {
	bytes: Buffer;
	sha256: string;
}

/** A photograph, for whoever may see its docket. */
export async function getPhoto(ctx: Context, photoId: string): Promise<PhotoFile> {
	const photo = await Photo.findByPk(photoId);
	authorizeShipment(ctx, 'shipment.view', photo && (await Shipment.findByPk(photo.shipmentId)));
	const file = photo && (await StoredFile.findByPk(photo.fileId));
	if (!file) throw new Refusal('not-found');
	if (file.deletedAt) throw new Refusal('file-expired');
	return { bytes: await (await fileStore()).read(file.sha256), sha256: file.sha256 };
}
