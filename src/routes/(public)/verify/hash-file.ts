import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex } from '@noble/hashes/utils.js';

const head = '%PDF-';

/** Whether it begins as a PDF does; nothing more is read of it here. */
export async function isPdf(file: Blob): Promise<boolean> {
	const begin = new Uint8Array(await file.slice(0, head.length).arrayBuffer());
	return String.fromCharCode(...begin) === head;
}

/** SHA-256 of a file, piece by piece, in this browser: the file itself goes nowhere. */
export async function hashFile(file: Blob): Promise<string> {
	const hash = sha256.create();
	const reader = file.stream().getReader();
	for (let piece = await reader.read(); !piece.done; piece = await reader.read()) hash.update(piece.value);
	return bytesToHex(hash.digest());
}
