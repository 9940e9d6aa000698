import type { Handle } from '@sveltejs/kit';
import { findTokenActor } from '../accounts/api-tokens';
import { loadActor } from '../accounts/load-actor';
import { isWithinLimit } from '../accounts/rate-limit';
import type { Claims } from '../accounts/sign-in';
import type { SessionKind } from '../context';
import { Refusal } from '../refusals';
import { refusalAsJson } from '../request';
import { requestScope, type RequestScope } from '../request-scope';
import { bearerOf } from './bearer';

/** Wrong tokens from one address: a program that was switched off keeps trying, one that guesses tries more. */
const wrongTokens = { attempts: 60, windowMs: 15 * 60_000 };

const sessionKindOf = ({ kind, by }: Claims): SessionKind => (kind === 'link' ? 'link' : (by ?? 'password'));

/** Looks up who the session or token speaks of, anew at every request: a switched-off user is out at once. */
export const attachContext: Handle = async ({ event, resolve }) => {
	const { pathname } = event.url;
	// Health must answer while the database is away, also to a browser that has a session.
	if (pathname.startsWith('/_app/') || pathname === '/api/v1/health') return resolve(event);
	const scope = requestScope();
	const secret = bearerOf(event);
	if (secret !== null) {
		const actor = await findTokenActor(secret, scope);
		if (!actor) return wrongToken(scope);
		event.locals.context = { actor, ...scope, sessionKind: 'token' };
		return resolve(event);
	}
	const session = await event.locals.auth();
	const actor = session?.claims ? await loadActor(session.claims, scope.now) : null;
	if (session?.claims && actor)
		event.locals.context = { actor, ...scope, sessionKind: sessionKindOf(session.claims) };
	return resolve(event);
};

/** Never falls back to a cookie: the caller meant the token. */
async function wrongToken({ address, now }: RequestScope): Promise<Response> {
	const isAllowed = await isWithinLimit(`token from ${address}`, wrongTokens, now);
	return refusalAsJson(
		isAllowed
			? new Refusal('no-session', 'This token is not known, or it was revoked. Make another.')
			: new Refusal('too-many-attempts')
	);
}
