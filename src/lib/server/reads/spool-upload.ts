import busboy from 'busboy';
import { createHash, randomBytes } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, rm } from 'node:fs/promises';
import { basename, join } from 'node:path';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { Refusal } from '../refusals';

/** One file of an upload on this machine's disk. */
export interface SpooledFile {
	path: string;
	/** The form's name for it. */
	field: string;
	fileName: string;
	mediaType: string;
	bytes: number;
	sha256: string;
	isTooLarge: boolean;
}

export interface Spooled {
	/** Values by field name, in the order they came, before or after the files. */
	fields: Map<string, string[]>;
	files: SpooledFile[];
	/** Removes what was spooled; call it whatever happens next. */
	clear: () => Promise<void>;
}

interface SpoolLimits {
	folder: string;
	maxBytes: number;
	maxFiles: number;
	/** What one field may hold; the rest is cut off. */
	maxFieldBytes?: number;
}

/**
 * Streams a multipart body to disk, hashing on the way; nothing of a file is held in memory.
 * @throws Refusal `not-multipart`, `upload-broken`; nothing is left on the disk then.
 */
export async function spoolUpload(
	body: Readable,
	contentType: string | null,
	limits: SpoolLimits
): Promise<Spooled> {
	const { folder, maxBytes } = limits;
	const place = join(folder, randomBytes(8).toString('hex'));
	await mkdir(place, { recursive: true });
	const clear = () => rm(place, { recursive: true, force: true });
	const fields = new Map<string, string[]>();
	const writes: Promise<SpooledFile | null>[] = [];
	try {
		const parser = parserFor(contentType, limits);
		parser.on('field', (name, value) => void fields.set(name, [...(fields.get(name) ?? []), value]));
		parser.on('file', (field, stream, info) => {
			const written = writeOne(stream, { ...info, field }, join(place, String(writes.length)), maxBytes);
			// An error before anyone awaits this would otherwise end the process.
			written.catch(() => {});
			writes.push(written);
		});
		await pipeline(body, parser);
		const files = (await Promise.all(writes)).filter((file) => file !== null);
		return { fields, files, clear };
	} catch (error) {
		await Promise.allSettled(writes);
		await clear();
		throw refusalOf(error);
	}
}

function parserFor(contentType: string | null, { maxBytes, maxFiles, maxFieldBytes = 4096 }: SpoolLimits) {
	if (!contentType?.startsWith('multipart/form-data')) throw new Refusal('not-multipart');
	try {
		return busboy({
			headers: { 'content-type': contentType },
			defParamCharset: 'utf8',
			// One byte more than is taken: a file of just the limit is whole.
			limits: { fileSize: maxBytes + 1, files: maxFiles, fields: 100, fieldSize: maxFieldBytes, parts: 200 }
		});
	} catch {
		throw new Refusal('not-multipart');
	}
}

async function writeOne(
	stream: Readable,
	info: busboy.FileInfo & { field: string },
	path: string,
	maxBytes: number
): Promise<SpooledFile | null> {
	const hash = createHash('sha256');
	let bytes = 0;
	await pipeline(
		stream,
		async function* (chunks: AsyncIterable<Buffer>) {
			for await (const chunk of chunks) {
				hash.update(chunk);
				bytes += chunk.length;
				yield chunk;
			}
		},
		createWriteStream(path, { flags: 'wx' })
	);
	// A form sent without choosing a file carries one without name and bytes.
	if (!info.filename && bytes === 0) return null;
	return {
		path,
		field: info.field,
		fileName: safeFileName(info.filename),
		mediaType: info.mimeType || 'application/octet-stream',
		bytes,
		sha256: hash.digest('hex'),
		isTooLarge: bytes > maxBytes
	};
}

/** The name as it is shown: no folders, nothing unprintable, and short enough for its row. */
export function safeFileName(name: string | undefined): string {
	const plain = basename((name ?? '').replaceAll('\\', '/'))
		.replace(/[\p{Cc}\p{Cf}]/gu, '')
		.trim();
	return [...(plain || 'export')].slice(0, 180).join('');
}

function refusalOf(error: unknown): unknown {
	if (error instanceof Refusal) return error;
	const status = error instanceof Error && 'status' in error ? error.status : null;
	return new Refusal(status === 413 ? 'too-large' : 'upload-broken');
}
