import { getRead } from '$lib/server/reads/get-read';
import { asJson, contextOf } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) => {
	const ctx = contextOf(locals);

	return asJson(() => getRead(ctx, params.read));
};
