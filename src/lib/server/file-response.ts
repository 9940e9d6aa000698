import { Readable } from 'node:stream';
import type { OutgoingFile } from './reports/open-report';

/** Streams a file as an attachment that no browser will run: whatever was uploaded, it is saved, not shown. */
export async function attachmentResponse({
	fileName,
	mediaType,
	bytes,
	sha256,
	open
}: OutgoingFile): Promise<Response> {
	const ascii = fileName.replace(/[^\x20-\x7e]|["\\]/g, '_');
	return new Response(Readable.toWeb(await open()) as ReadableStream, {
		headers: {
			'content-type': mediaType,
			'content-length': String(bytes),
			'content-disposition': `attachment; filename="${ascii}"; filename*=UTF-8''${encodeURIComponent(fileName)}`,
			'content-security-policy': "sandbox; default-src 'none'",
			'x-content-type-options': 'nosniff',
			etag: `"${sha256}"`
		}
	});
}
