import { asJson, contextOf } from '$lib/server/request';
import { computeForCaller } from '$lib/server/specs/compute-life';
import type { RequestHandler } from './$types';

/** Life used by readings under a model, for other programs. Looks nothing up and keeps nothing. */
export const POST: RequestHandler = ({ locals, request }) => {
	const ctx = contextOf(locals);

	return asJson(async () => computeForCaller(ctx, await request.text()));
};
