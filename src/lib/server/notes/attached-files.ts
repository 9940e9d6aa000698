import { open } from 'node:fs/promises';
import { maxNoteFileBytes, maxNoteFiles, noteFileEndings } from '../../schemas/note';
import type { SpooledFile } from '../reads/spool-upload';
import { Refusal } from '../refusals';
import { fileStore, nameFile } from '../storage/store';

/** A file in the store, under the name it came with. */
export interface KeptFile {
	fileId: string;
	fileName: string;
	sha256: string;
	bytes: number;
	mediaType: string;
}

/** What a file of an ending begins with. Sources: ISO 32000-1 7.5.2; ITU-T T.81 B.1; W3C PNG 5.2; RFC 9649; APPNOTE 4.3.7. */
const zip = Buffer.from('PK\x03\x04', 'latin1');
const jpeg = Buffer.from([0xff, 0xd8, 0xff]);
const beginnings: Record<string, Buffer> = {
	pdf: Buffer.from('%PDF-'),
	png: Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
	webp: Buffer.from('RIFF'),
	...{ jpg: jpeg, jpeg, xlsx: zip, docx: zip, ods: zip, odt: zip }
};

const mediaTypes: Record<string, string> = {
	...{ jpg: 'image/jpeg', jpeg: 'image/jpeg', png: 'image/png', webp: 'image/webp' },
	...{ pdf: 'application/pdf', csv: 'text/csv', tsv: 'text/tab-separated-values', txt: 'text/plain' },
	...{ json: 'application/json', eml: 'message/rfc822' }
};

async function startOf(path: string, bytes: number): Promise<Buffer> {
	const file = await open(path);
	try {
		const { buffer, bytesRead } = await file.read(Buffer.alloc(bytes), 0, bytes, 0);
		return buffer.subarray(0, bytesRead);
	} finally {
		await file.close();
	}
}

/** The ending of a file that may be attached, by its name and its first bytes. @throws Refusal `wrong-type` */
async function endingOf({ fileName, path }: SpooledFile): Promise<string> {
	const ending = noteFileEndings.find((one) => fileName.toLowerCase().endsWith(`.${one}`));
	if (!ending)
		throw new Refusal(
			'wrong-type',
			`${fileName} is of a kind that is not taken here. Attach a photograph, a PDF, a text or a table (${noteFileEndings.join(', ')}).`
		);
	const beginning = beginnings[ending];
	if (beginning && !beginning.equals(await startOf(path, beginning.length)))
		throw new Refusal(
			'wrong-type',
			`${fileName} is not what its name says. Open it, save it again, attach that.`
		);
	return ending;
}

/** @throws Refusal `too-large`, `wrong-type` */
async function checked(file: SpooledFile): Promise<string> {
	if (file.isTooLarge)
		throw new Refusal(
			'too-large',
			`${file.fileName} is larger than ${maxNoteFileBytes / 1e6} MB. Attach its parts.`
		);
	if (file.bytes === 0) throw new Refusal('wrong-type', `${file.fileName} is empty. Attach it again.`);
	return endingOf(file);
}

/**
 * Puts a note's files into the store, byte for byte, all or none. @throws Refusal `invalid`, `too-large`, `wrong-type`
 */
export async function keepAttached(files: readonly SpooledFile[], now: Date): Promise<KeptFile[]> {
	if (files.length > maxNoteFiles)
		throw new Refusal('invalid', `At most ${maxNoteFiles} files a note. Write another for the rest.`);
	const endings = await Promise.all(files.map(checked));
	const kept: KeptFile[] = [];
	for (const [at, { sha256, path, bytes, fileName }] of files.entries()) {
		await (await fileStore()).putFile(sha256, path);
		const mediaType = mediaTypes[endings[at] ?? ''] ?? 'application/octet-stream';
		const { id } = await nameFile(sha256, bytes, mediaType, now);
		kept.push({ fileId: id, fileName, sha256, bytes, mediaType });
	}
	return kept;
}
