import { Readable } from 'node:stream';

/** A file as a browser would send it. */
export interface SentFile {
	name: string;
	content: string | Uint8Array;
	type?: string;
}

/** A multipart body made by the platform's own FormData, as a stream. */
export async function multipart(
	files: readonly SentFile[],
	fields: Record<string, string> = {},
	order: 'fields-first' | 'files-first' = 'fields-first'
): Promise<{ body: Readable; contentType: string; bytes: Buffer }> {
	const form = new FormData();
	const addFields = () => {
		for (const [name, value] of Object.entries(fields)) form.append(name, value);
	};
	if (order === 'fields-first') addFields();
	for (const { name, content, type = 'text/csv' } of files)
		form.append('files', new File([content as BlobPart], name, { type }));
	if (order === 'files-first') addFields();
	const response = new Response(form);
	const bytes = Buffer.from(await response.arrayBuffer());
	return { body: Readable.from(cut(bytes)), contentType: response.headers.get('content-type') ?? '', bytes };
}

/** The bytes in pieces of a network's size, so that boundaries fall anywhere. */
export function* cut(bytes: Buffer, size = 16_000): Generator<Buffer> {
	for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size);
}

/** A tidy export: ISO times with offset, a reading every ten minutes at one temperature. */
export function exportText(
	options: { celsius?: number; fromAt?: string; readings?: number; everyMinutes?: number } = {}
): string {
	const { celsius = 1, fromAt = '2026-03-30T06:10:00Z', readings = 561, everyMinutes = 10 } = options;
	const rows = Array.from({ length: readings }, (_, i) => {
		const at = new Date(Date.parse(fromAt) + i * everyMinutes * 60_000);
		return `${at.toISOString().slice(0, 19)}Z;${celsius.toFixed(1)}`;
	});
	return ['Time;Temperature °C', ...rows, ''].join('\n');
}
