import { randomUUID } from 'node:crypto';
import type { Handle } from '@sveltejs/kit';
import { clientAddress } from './client-address';
import { withRequestScope } from '../request-scope';

/** Gives the request its number, address and moment. */
export const openScope: Handle = ({ event, resolve }) => {
	const scope = { requestId: randomUUID(), address: clientAddress(event), now: new Date() };
	event.locals.requestId = scope.requestId;
	event.locals.context = null;
	return withRequestScope(scope, () => resolve(event));
};
