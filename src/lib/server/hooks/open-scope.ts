import { randomUUID } from 'node:crypto';
import type { Handle } from '@sveltejs/kit';
import { withRequestScope } from '../request-scope';

function addressOf(event: { getClientAddress: () => string }): string {
	try {
		return event.getClientAddress().slice(0, 64);
	} catch {
		// No socket behind the request: a handler under test.
		return 'unknown';
	}
}

/** Gives the request its number, address and moment. */
export const openScope: Handle = ({ event, resolve }) => {
	const scope = { requestId: randomUUID(), address: addressOf(event), now: new Date() };
	event.locals.requestId = scope.requestId;
	event.locals.context = null;
	return withRequestScope(scope, () => resolve(event));
};
