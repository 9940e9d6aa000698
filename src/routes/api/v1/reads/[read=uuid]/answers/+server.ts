import { answerForm } from '$lib/schemas/read';
import { answerQuestion } from '$lib/server/reads/answer-question';
import { getRead } from '$lib/server/reads/get-read';
import { jsonBody } from '$lib/server/reads/json-body';
import { asJson, contextOf, parseInput } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request }) => {
	const ctx = contextOf(locals);

	return asJson(async () => {
		const answer = parseInput(await jsonBody(request), answerForm);

		await answerQuestion(ctx, params.read, answer);

		return getRead(ctx, params.read);
	});
};
