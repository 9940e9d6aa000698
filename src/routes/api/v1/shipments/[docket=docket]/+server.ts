import { getDocket } from '$lib/server/dockets/get-docket';
import { asJson, contextOf } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) => {
	const ctx = contextOf(locals);

	return asJson(() => getDocket(ctx, params.docket));
};
