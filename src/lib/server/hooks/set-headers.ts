import type { Handle } from '@sveltejs/kit';

/** Headers every answer carries. */
export const setHeaders: Handle = async ({ event, resolve }) => {
	const response = await resolve(event);
	response.headers.set('X-Content-Type-Options', 'nosniff');
	response.headers.set('Referrer-Policy', 'same-origin');
	response.headers.set('X-Frame-Options', 'DENY');
	response.headers.set('Cross-Origin-Opener-Policy', 'same-origin');
	if (!response.headers.has('Cache-Control') && !event.url.pathname.startsWith('/_app/'))
		response.headers.set('Cache-Control', 'private, no-cache');
	return response;
};
