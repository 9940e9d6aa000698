import { contextOf, refusalAsJson } from '$lib/server/request';
import { computeForCaller } from '$lib/server/specs/compute-for-caller';
import type { RequestHandler } from './$types';

/** Life used by readings under a model, for other programs. Looks nothing up and keeps nothing. */
export const POST: RequestHandler = async ({ locals, request }) => {
	const ctx = contextOf(locals);

	try {
		const json = await computeForCaller(ctx, await request.text());

		return new Response(json, { headers: { 'Content-Type': 'application/json' } });
	} catch (e) {
		return refusalAsJson(e);
	}
};
