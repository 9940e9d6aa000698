import { getPhoto } from '$lib/server/photos/get-photo';
import { contextOf, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

/**
 * A photograph. It may be shown in the page only because it was checked to be a JPEG when it came in; the sandbox
 * keeps it harmless even if that check missed something.
 */
export const GET: RequestHandler = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	try {
		const { bytes, sha256 } = await getPhoto(ctx, params.photo);

		return new Response(new Uint8Array(bytes), {
			headers: {
				'Content-Type': 'image/jpeg',
				'Content-Length': String(bytes.length),
				'Content-Disposition': `inline; filename="${params.photo}.jpg"`,
				'Content-Security-Policy': "sandbox; default-src 'none'",
				'X-Content-Type-Options': 'nosniff',
				ETag: `"${sha256}"`
			}
		});
	} catch (e) {
		return refusalAsJson(e);
	}
};
