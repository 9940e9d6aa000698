import type { Handle } from '@sveltejs/kit';
import { recordRefusedActs } from '../audit/record-refused-acts';
import { log } from '../log';
import { requestScope } from '../request-scope';

/** Writes acts that were declined into the audit trail once the request has been answered. */
export const keepRefusals: Handle = async ({ event, resolve }) => {
	const response = await resolve(event);
	const { refusedActs } = requestScope();
	const { context } = event.locals;
	if (!context || !refusedActs || response.status < 400) return response;
	try {
		await recordRefusedActs(context, event.route.id ?? '', event.request.method, refusedActs);
	} catch (error) {
		// The refusal stands whether or not it could be written down.
		log().error({ requestId: context.requestId, err: error }, 'a refused act is not in the trail');
	}
	return response;
};
