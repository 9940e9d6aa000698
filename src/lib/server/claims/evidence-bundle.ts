import { createHash } from 'node:crypto';
import { PassThrough, Readable } from 'node:stream';
import { ZipArchive } from 'archiver';
import type { Context } from '../context';
import { Claim } from '../db/models/claim';
import { Disposition } from '../db/models/disposition';
import { Shipment } from '../db/models/shipment';
import { TraceRow } from '../db/models/trace-row';
import { inTransaction } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import { readingsCsv } from '../traces/readings-csv';
import { evidenceFiles, type EvidenceFile } from './evidence';
import { log } from '../log';

async function sha256Of(open: () => Readable): Promise<{ sha256: string; bytes: number }> {
	const hash = createHash('sha256');
	let bytes = 0;
	for await (const chunk of open()) {
		hash.update(chunk);
		bytes += Buffer.byteLength(chunk);
	}
	return { sha256: hash.digest('hex'), bytes };
}

/** The readings of every assessed trace, written out; hashed on a first pass so that the manifest can name them. */
async function readingsFiles(shipment: Shipment): Promise<EvidenceFile[]> {
	const traces = await TraceRow.findAll({
		where: { shipmentId: shipment.id, isAssessed: true },
		order: ['firstAt']
	});
	return Promise.all(
		traces.map(async (trace) => {
			const { fileName, open } = await readingsCsv(trace, shipment);
			return {
				what: 'Readings as CSV',
				fileName: `readings/${fileName}`,
				...(await sha256Of(open)),
				open: async () => open()
			};
		})
	);
}

/** Every kept file of a docket: reports, exports, photographs, and the readings written out. */
export async function docketFiles(shipment: Shipment): Promise<EvidenceFile[]> {
	return [...(await evidenceFiles(shipment)), ...(await readingsFiles(shipment))];
}

interface Manifest {
	docket: string;
	claim: string | null;
	takenAt: string;
	takenBy: string;
	signedRecordSha256: { version: number; sha256: string }[];
	files: { file: string; what: string; bytes: number; sha256: string }[];
	howToCheck: string;
}

async function manifestOf(
	ctx: Context,
	shipment: Shipment,
	files: readonly EvidenceFile[]
): Promise<Manifest> {
	const dispositions = await Disposition.findAll({
		where: { shipmentId: shipment.id },
		attributes: ['version', 'frozenSha256'],
		order: ['version']
	});
	const claim = await Claim.findOne({ where: { shipmentId: shipment.id } });
	return {
		docket: shipment.number,
		claim: claim?.number ?? null,
		takenAt: ctx.now.toISOString(),
		takenBy: ctx.actor.name,
		signedRecordSha256: dispositions.map((row) => ({ version: row.version, sha256: row.frozenSha256 })),
		files: files.map(({ fileName, what, bytes, sha256 }) => ({ file: fileName, what, bytes, sha256 })),
		howToCheck: 'sha256sum -c SHA256SUMS; the PDF carries a digital signature that any PDF reader checks'
	};
}

/** Feeds the archive one file after the other, so that a bundle of any size needs the memory of one chunk. */
async function fill(
	archive: ZipArchive,
	files: readonly EvidenceFile[],
	manifest: Manifest,
	date: Date
): Promise<void> {
	for (const file of files) {
		const stream = await file.open();
		const taken = new Promise((resolve, reject) => {
			stream.once('end', resolve);
			stream.once('error', reject);
		});
		archive.append(stream, { name: file.fileName, date });
		await taken;
	}
	archive.append(`${JSON.stringify(manifest, null, '\t')}\n`, { name: 'manifest.json', date });
	archive.append(files.map(({ sha256, fileName }) => `${sha256}  ${fileName}\n`).join(''), {
		name: 'SHA256SUMS',
		date
	});
	await archive.finalize();
}

/**
 * A docket's evidence as one streamed ZIP: signed reports, raw exports, photographs, readings as CSV, and a manifest
 * with the SHA-256 of each. Taking it goes on the record. @throws Refusal `not-found`, `not-allowed`, `not-signed`
 */
export async function takeEvidenceBundle(
	ctx: Context,
	number: string
): Promise<{ fileName: string; stream: Readable }> {
	const shipment = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'bundle.take', shipment);
	const docket = shipment as Shipment;
	const files = await docketFiles(docket);
	if (!files.some((file) => file.fileName.endsWith('.pdf')))
		throw new Refusal(
			'not-signed',
			docket.decidedAt ? 'The receiving report is still being made. Try again in a minute.' : undefined
		);
	const manifest = await manifestOf(ctx, docket, files);
	await inTransaction(ctx, async ({ record }) =>
		record(
			'evidence.taken',
			{ scope: 'shipment', id: docket.id },
			{ claimId: null, shipmentId: docket.id, files: files.length }
		)
	);
	const archive = new ZipArchive({ zlib: { level: 6 } });
	const out = new PassThrough();
	archive.on('error', (error) => out.destroy(error instanceof Error ? error : new Error(String(error))));
	archive.pipe(out);
	fill(archive, files, manifest, ctx.now).catch((error) => {
		log().error({ requestId: ctx.requestId, err: error }, 'evidence bundle broke off');
		out.destroy(error instanceof Error ? error : new Error(String(error)));
	});
	return { fileName: `${docket.number}-evidence.zip`, stream: out };
}
