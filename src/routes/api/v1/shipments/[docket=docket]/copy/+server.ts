import { Readable } from 'node:stream';
import { takeDocketCopy } from '$lib/server/copies/take-docket-copy';
import { contextOf, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	try {
		const { fileName, stream } = await takeDocketCopy(ctx, params.docket);
		return new Response(Readable.toWeb(stream) as ReadableStream, {
			headers: {
				'content-type': 'application/zip',
				'content-disposition': `attachment; filename="${fileName}"`
			}
		});
	} catch (e) {
		return refusalAsJson(e);
	}
};
