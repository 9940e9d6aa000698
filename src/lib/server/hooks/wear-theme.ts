import type { Handle } from '@sveltejs/kit';

/** The chosen set stands on the page from its first byte, so that nothing flashes in the other one. */
export const wearTheme: Handle = ({ event, resolve }) => {
	const theme = event.cookies.get('theme');
	if (theme !== 'light' && theme !== 'dark') return resolve(event);
	return resolve(event, {
		transformPageChunk: ({ html }) => html.replace('<html lang="en"', `<html lang="en" data-theme="${theme}"`)
	});
};
