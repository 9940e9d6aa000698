import { inspectUpload } from '$lib/server/reads/inspect-upload';
import { uploadOf } from '$lib/server/reads/upload-of';
import { asJson, contextOf } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, request }) => {
	const ctx = contextOf(locals);

	return asJson(() => inspectUpload(ctx, uploadOf(request)));
};
