import { asJson, contextOf } from '$lib/server/request';
import { getTraceBasis } from '$lib/server/traces/get-trace-basis';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) => {
	const ctx = contextOf(locals);

	return asJson(() => getTraceBasis(ctx, params.trace));
};
