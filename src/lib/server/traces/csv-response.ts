import { Readable } from 'node:stream';

/** Streams rows as an attachment: a browser saves it and never shows it. */
export function csvResponse({ fileName, open }: { fileName: string; open: () => Readable }): Response {
	const ascii = fileName.replace(/[^\x20-\x7e]|["\\]/g, '_');
	return new Response(Readable.toWeb(open()) as ReadableStream, {
		headers: {
			'content-type': 'text/csv; charset=utf-8; header=present',
			'content-disposition': `attachment; filename="${ascii}"; filename*=UTF-8''${encodeURIComponent(fileName)}`,
			'content-security-policy': "sandbox; default-src 'none'",
			'x-content-type-options': 'nosniff'
		}
	});
}
