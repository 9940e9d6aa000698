import { SvelteKitAuth, type SvelteKitAuthConfig } from '@auth/sveltekit';
import Credentials from '@auth/sveltekit/providers/credentials';
import type { RequestEvent } from '@sveltejs/kit';
import { env } from '../env';
import { Refusal } from '../refusals';
import { requestScope } from '../request-scope';
import { signInByLink } from './sign-in-by-link';
import { signInByPassword, type Claims } from './sign-in';

const sessionSeconds = 10 * 3600;

declare module '@auth/core/types' {
	interface User {
		claims?: Claims;
	}
	interface Session {
		claims?: Claims;
	}
}

const asUser = (claims: Claims | null) => (claims ? { id: claims.subjectId, claims } : null);

const byPassword = Credentials({
	id: 'password',
	credentials: { email: {}, password: {}, code: {} },
	async authorize({ email, password, code }) {
		if (typeof email !== 'string' || typeof password !== 'string') return null;
		return asUser(
			await signInByPassword(email, password, requestScope(), typeof code === 'string' ? code : null)
		);
	}
});

const byLink = Credentials({
	id: 'link',
	credentials: { secret: {} },
	async authorize({ secret }) {
		return typeof secret === 'string' ? asUser(await signInByLink(secret, requestScope())) : null;
	}
});

function isClaims(value: unknown): value is Claims {
	return (
		typeof value === 'object' &&
		value !== null &&
		'kind' in value &&
		'subjectId' in value &&
		'tokenVersion' in value
	);
}

function config(): SvelteKitAuthConfig {
	return {
		secret: env().authSecret,
		trustHost: true,
		providers: [byPassword, byLink],
		session: { strategy: 'jwt', maxAge: sessionSeconds },
		pages: { signIn: '/sign-in', signOut: '/sign-in', error: '/sign-in' },
		callbacks: {
			jwt: ({ token, user }) => (user?.claims ? { ...token, claims: user.claims } : token),
			session: ({ session, token }) =>
				isClaims(token.claims) ? { ...session, claims: token.claims } : session
		},
		logger: { error: () => {}, warn: () => {}, debug: () => {} }
	};
}

const auth = SvelteKitAuth(async () => config());

/** Reads the session cookie of every request and answers Auth.js' own paths. */
export const authHandle = auth.handle;

async function signIn(
	event: RequestEvent,
	providerId: string,
	fields: Record<string, string>
): Promise<boolean> {
	const body = new URLSearchParams({ providerId, redirect: 'false', redirectTo: '/', ...fields });
	const request = new Request(event.url, { method: 'POST', headers: event.request.headers, body });
	request.headers.set('content-type', 'application/x-www-form-urlencoded');
	try {
		await auth.signIn({ ...event, request });
		return true;
	} catch (error) {
		if (isRedirect(error)) return true;
		if (error instanceof Error && 'type' in error) {
			const refusal =
				error.cause && typeof error.cause === 'object' && 'err' in error.cause ? error.cause.err : null;
			if (refusal instanceof Refusal) throw refusal;
			if (error.type === 'CredentialsSignin') return false;
		}
		throw error;
	}
}

function isRedirect(error: unknown): boolean {
	return typeof error === 'object' && error !== null && 'status' in error && 'location' in error;
}

/** Sets the session cookie for a right pair. @returns false for a wrong one. @throws Refusal `too-many-attempts`, `switched-off`, `locked`, `code-needed`, `wrong-code` */
export function signInWithPassword(
	event: RequestEvent,
	{ email, password, code }: { email: string; password: string; code: string }
): Promise<boolean> {
	return signIn(event, 'password', { email, password, code });
}

/**
 * Opens a session for who has just set this password; an account with a second factor shows its code at the sign-in
 * page first. @returns where to go
 */
export async function goOnWithPassword(
	event: RequestEvent,
	email: string,
	password: string
): Promise<string> {
	try {
		await signInWithPassword(event, { email, password, code: '' });
		return '/';
	} catch (error) {
		if (error instanceof Refusal && error.code === 'code-needed') return '/sign-in';
		throw error;
	}
}

/** Uses a mailed link up and sets the session cookie. @returns false when the link no longer works. */
export function signInWithLink(event: RequestEvent, secret: string): Promise<boolean> {
	return signIn(event, 'link', { secret });
}

/** Ends this browser's session: its cookie is taken away. */
export async function signOut(event: RequestEvent): Promise<void> {
	const body = new URLSearchParams({ redirectTo: '/sign-in' });
	const request = new Request(event.url, { method: 'POST', headers: event.request.headers, body });
	request.headers.set('content-type', 'application/x-www-form-urlencoded');
	try {
		await auth.signOut({ ...event, request });
	} catch (error) {
		if (!isRedirect(error)) throw error;
	}
}
