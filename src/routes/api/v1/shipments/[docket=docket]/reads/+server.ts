import { listReads } from '$lib/server/reads/list-reads';
import { receiveUpload } from '$lib/server/reads/receive-upload';
import { uploadOf } from '$lib/server/reads/upload-of';
import { asJson, contextOf } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) => {
	const ctx = contextOf(locals);

	return asJson(() => listReads(ctx, params.docket));
};

export const POST: RequestHandler = ({ locals, params, request }) => {
	const ctx = contextOf(locals);

	return asJson(() => receiveUpload(ctx, params.docket, uploadOf(request)));
};
