import type { FrozenDocket } from '../../schemas/docket';
import { Photo } from '../db/models/photo';
import { StoredFile } from '../db/models/stored-file';
import { fileStore } from '../storage/store';
import type { ReportPhoto } from './pdf/report-input';

/** Two pages of pictures; a report stays light enough to mail. */
const photosAtMost = 12;
const photoBytesAtMost = 4_000_000;

/** The photographs a report prints: the first ones, as far as there is room. All are named, these are shown. */
export async function photosOf(docket: FrozenDocket['docket']): Promise<ReportPhoto[]> {
	const printed: ReportPhoto[] = [];
	let total = 0;
	for (const { id } of docket.photos) {
		const photo = await Photo.findByPk(id);
		const file = photo ? await StoredFile.findByPk(photo.fileId) : null;
		if (!file || file.mediaType !== 'image/jpeg' || total + file.bytes > photoBytesAtMost) continue;
		total += file.bytes;
		printed.push({ id, sha256: file.sha256, jpeg: await (await fileStore()).read(file.sha256) });
		if (printed.length === photosAtMost) break;
	}
	return printed;
}
