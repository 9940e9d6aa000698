import type { Handle } from '@sveltejs/kit';
import { loadActor } from '../accounts/load-actor';
import type { Claims } from '../accounts/sign-in';
import type { SessionKind } from '../context';
import { requestScope } from '../request-scope';

const sessionKindOf = ({ kind, by }: Claims): SessionKind => (kind === 'link' ? 'link' : (by ?? 'password'));

/** Looks up who the session speaks of, anew at every request: a switched-off user is out at once. */
export const attachContext: Handle = async ({ event, resolve }) => {
	const { pathname } = event.url;
	// Health must answer while the database is away, also to a browser that has a session.
	const isForAll = pathname.startsWith('/_app/') || pathname === '/api/v1/health';
	const session = isForAll ? null : await event.locals.auth();
	if (session?.claims) {
		const scope = requestScope();
		const actor = await loadActor(session.claims, scope.now);
		if (actor) event.locals.context = { actor, ...scope, sessionKind: sessionKindOf(session.claims) };
	}
	return resolve(event);
};
