import { getTraceLines } from '$lib/server/reads/get-trace-lines';
import { asJson, contextOf } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) => {
	const ctx = contextOf(locals);

	return asJson(() => getTraceLines(ctx, params.trace));
};
