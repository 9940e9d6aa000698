import { createHash } from 'node:crypto';
import { PassThrough, Readable, Transform } from 'node:stream';
import { ZipArchive } from 'archiver';
import { Transaction } from 'sequelize';
import { docketFiles } from '../claims/evidence-bundle';
import type { Context } from '../context';
import { Disposition } from '../db/models/disposition';
import { Shipment } from '../db/models/shipment';
import { database } from '../db/sequelize';
import { inTransaction } from '../db/transaction';
import { log } from '../log';
import { authorizeShipment } from '../policies';
import { chainCopy, type ChainCopy } from './chain-copy';
import { docketRecords, type Row } from './docket-records';
import { otherFiles } from './other-files';
import { instructions } from './instructions';
import { recordsCsv } from './records-csv';
import verifyScript from './verify-copy.mjs?raw';

/** One file of a copy; hashed while it is packed. */
interface Piece {
	name: string;
	open: () => Promise<Readable>;
}

const textPiece = (name: string, text: string): Piece => ({
	name,
	open: async () => Readable.from([Buffer.from(text, 'utf8')])
});

interface Snapshot {
	records: Map<string, Row[]>;
	chain: ChainCopy;
	decisions: Disposition[];
}

/** Rows and trail as they are at one moment. */
async function snapshotOf(shipmentId: string): Promise<Snapshot> {
	const isolationLevel = Transaction.ISOLATION_LEVELS.REPEATABLE_READ;
	return database().transaction({ isolationLevel }, async (transaction) => ({
		records: await docketRecords(shipmentId, transaction),
		chain: await chainCopy(shipmentId, transaction),
		decisions: await Disposition.findAll({ where: { shipmentId }, order: ['version'], transaction })
	}));
}

function textPieces(ctx: Context, shipment: Shipment, { records, chain, decisions }: Snapshot): Piece[] {
	const lines = chain.entries.map((entry) => `${JSON.stringify(entry)}\n`).join('');
	return [
		textPiece('README.txt', instructions(shipment.number, ctx.now.toISOString(), ctx.actor.name)),
		textPiece('verify.mjs', verifyScript),
		textPiece('records.json', `${JSON.stringify(Object.fromEntries(records), null, '\t')}\n`),
		...[...records].map(([table, rows]) => textPiece(`records/${table}.csv`, recordsCsv(rows))),
		...decisions.map(({ version, frozen }) => textPiece(`decisions/version-${version}.json`, frozen)),
		textPiece('audit/entries.jsonl', lines),
		textPiece('audit/entries.csv', recordsCsv(chain.entries)),
		textPiece('audit/head.json', `${JSON.stringify(chain.head, null, '\t')}\n`)
	];
}

function hashing(done: (sha256: string, bytes: number) => void): Transform {
	const hash = createHash('sha256');
	let bytes = 0;
	return new Transform({
		transform(chunk: Buffer, _encoding, next) {
			hash.update(chunk);
			bytes += chunk.length;
			next(null, chunk);
		},
		flush(next) {
			done(hash.digest('hex'), bytes);
			next();
		}
	});
}

/** Packs one file after the other, so that a copy of any size needs the memory of one chunk. */
async function pack(
	archive: ZipArchive,
	pieces: readonly Piece[],
	ctx: Context,
	docket: string
): Promise<void> {
	const date = ctx.now;
	const files: { file: string; bytes: number; sha256: string }[] = [];
	for (const { name, open } of pieces) {
		const source = await open();
		const hashed = hashing((sha256, bytes) => files.push({ file: name, bytes, sha256 }));
		const taken = new Promise((resolve, reject) => {
			hashed.once('end', resolve);
			for (const stream of [source, hashed]) stream.once('error', reject);
		});
		archive.append(source.pipe(hashed), { name, date });
		await taken;
	}
	const manifest = { docket, takenAt: date.toISOString(), takenBy: ctx.actor.name, files };
	const sums = files.map(({ sha256, file }) => `${sha256}  ${file}\n`).join('');
	archive.append(sums, { name: 'SHA256SUMS', date });
	archive.append(`${JSON.stringify(manifest, null, '\t')}\n`, { name: 'manifest.json', date });
	await archive.finalize();
}

/**
 * Everything about a docket as one streamed ZIP that can be checked without this program. Taking it goes on the record.
 * @throws Refusal `not-found`, `not-allowed`
 */
export async function takeDocketCopy(
	ctx: Context,
	number: string
): Promise<{ fileName: string; stream: Readable }> {
	const shipment = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'copy.take', shipment);
	const docket = shipment as Shipment;
	const evidence = await docketFiles(docket);
	// Written before the snapshot, so that the copy's own trail says that it was taken.
	await inTransaction(ctx, async ({ record }) =>
		record(
			'copy.taken',
			{ scope: 'shipment', id: docket.id },
			{ shipmentId: docket.id, files: evidence.length }
		)
	);
	const snapshot = await snapshotOf(docket.id);
	const others = otherFiles(snapshot.records, new Set(evidence.map(({ sha256 }) => sha256)));
	const pieces = [
		...textPieces(ctx, docket, snapshot),
		...[...evidence, ...others].map(({ fileName, open }) => ({ name: fileName, open }))
	];
	const archive = new ZipArchive({ zlib: { level: 6 } });
	const out = new PassThrough();
	const breakOff = (error: unknown) => out.destroy(error instanceof Error ? error : new Error(String(error)));
	archive.on('error', breakOff);
	archive.pipe(out);
	pack(archive, pieces, ctx, docket.number).catch((error: unknown) => {
		log().error({ requestId: ctx.requestId, err: error }, 'a copy broke off');
		breakOff(error);
	});
	return { fileName: `${docket.number}-copy.zip`, stream: out };
}
