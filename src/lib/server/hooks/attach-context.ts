import type { Handle } from '@sveltejs/kit';
import { loadActor } from '../accounts/load-actor';
import { requestScope } from '../request-scope';

/** Looks up who the session speaks of, anew at every request: a switched-off user is out at once. */
export const attachContext: Handle = async ({ event, resolve }) => {
	const isAsset = event.url.pathname.startsWith('/_app/');
	const session = isAsset ? null : await event.locals.auth();
	if (session?.claims) {
		const scope = requestScope();
		const actor = await loadActor(session.claims, scope.now);
		if (actor) event.locals.context = { actor, ...scope };
	}
	return resolve(event);
};
