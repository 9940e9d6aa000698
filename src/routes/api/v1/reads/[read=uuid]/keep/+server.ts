import { keepForm } from '$lib/schemas/read';
import { getRead } from '$lib/server/reads/get-read';
import { jsonBody } from '$lib/server/reads/json-body';
import { keepRead } from '$lib/server/reads/keep-read';
import { asJson, contextOf, parseInput } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) => {
	const ctx = contextOf(locals);

	return asJson(async () => {
		const form = parseInput(await jsonBody(request), keepForm);

		await keepRead(ctx, params.read, form);

		return getRead(ctx, params.read);
	});
};
