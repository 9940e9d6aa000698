import { Readable } from 'node:stream';
import { takeEvidenceBundle } from '$lib/server/claims/evidence-bundle';
import { contextOf, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	try {
		const { fileName, stream } = await takeEvidenceBundle(ctx, params.docket);
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
