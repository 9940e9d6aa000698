import type { Handle } from '@sveltejs/kit';
import { bearerOf } from './bearer';

const changing = new Set(['POST', 'PUT', 'PATCH', 'DELETE']);

/** Every change must come from our own pages: a foreign or missing Origin is refused, whatever the content type. */
export const guardOrigin: Handle = ({ event, resolve }) => {
	if (!changing.has(event.request.method)) return resolve(event);
	if (event.request.headers.get('origin') === event.url.origin) return resolve(event);
	// No page can make a browser send a token, and a request with one is never answered by its cookie.
	if (bearerOf(event) !== null) return resolve(event);
	return new Response(
		JSON.stringify({
			code: 'foreign-origin',
			message: 'This request did not come from Wharfinger itself, so nothing was done.'
		}),
		{ status: 403, headers: { 'content-type': 'application/json' } }
	);
};
