import type { Readable } from 'node:stream';
import { LoggerRead } from '../db/models/logger-read';
import { Photo } from '../db/models/photo';
import { Report } from '../db/models/report';
import type { Shipment } from '../db/models/shipment';
import { StoredFile } from '../db/models/stored-file';
import { safeFileName } from '../reports/safe-file-name';
import { fileStore } from '../storage/store';

/** A kept file that speaks for a docket, under the name it has in the bundle. */
export interface EvidenceFile {
	what: string;
	fileName: string;
	bytes: number;
	sha256: string;
	open: () => Promise<Readable>;
}

async function stored(fileId: string, what: string, fileName: string): Promise<EvidenceFile | null> {
	const file = await StoredFile.findByPk(fileId, { rejectOnEmpty: true });
	// Retention took the bytes; the hash stays on the record.
	if (file.deletedAt) return null;
	return {
		what,
		fileName,
		bytes: file.bytes,
		sha256: file.sha256,
		open: async () => (await fileStore()).open(file.sha256)
	};
}

/** Everything kept about a docket as bytes: reports of all versions, raw exports, photographs. */
export async function evidenceFiles(shipment: Shipment): Promise<EvidenceFile[]> {
	const where = { shipmentId: shipment.id };
	const [reports, reads, photos] = await Promise.all([
		Report.findAll({ where, order: ['madeAt'] }),
		LoggerRead.findAll({ where: { ...where, state: ['ok', 'withdrawn'] }, order: ['uploadedAt'] }),
		Photo.findAll({ where, order: ['takenAt'] })
	]);
	const files = await Promise.all([
		...reports.map((report) => stored(report.fileId, 'Receiving report, signed', report.fileName)),
		...reads.map((read, index) =>
			stored(
				read.fileId,
				read.state === 'withdrawn' ? 'Raw export, withdrawn' : 'Raw export, as received',
				`exports/${index + 1}-${safeFileName(read.fileName)}`
			)
		),
		...photos.map((photo, index) =>
			stored(
				photo.fileId,
				`Photograph, ${photo.caption || photo.kind}`,
				`photographs/${index + 1}-${photo.kind}.jpg`
			)
		)
	]);
	return files.filter((file) => file !== null);
}
