import { redirect, type Handle } from '@sveltejs/kit';
import { noteRefusedAct } from '../request-scope';

/** API routes that answer without a session. */
const openApi = new Set(['/api/v1/health']);

function isOpen(routeId: string | null): boolean {
	// No route: Kit answers 404 by itself.
	return routeId === null || routeId.startsWith('/(public)') || openApi.has(routeId);
}

/** Suppliers live in their own group and nowhere else; staff do not enter it. The API answers both by policy. */
function isInRightGroup(routeId: string, isSupplier: boolean): boolean {
	if (routeId.startsWith('/(supplier)')) return isSupplier;
	if (routeId.startsWith('/(app)')) return !isSupplier;
	return true;
}

/** Nothing outside the public group is reached without a session. */
export const guardRoutes: Handle = ({ event, resolve }) => {
	const routeId = event.route.id;
	if (routeId === null || isOpen(routeId)) return resolve(event);
	const { context } = event.locals;
	const isApi = routeId.startsWith('/api/');
	if (!context) {
		if (isApi) return Response.json({ code: 'no-session', message: 'Sign in first.' }, { status: 401 });
		const to =
			event.request.method === 'GET'
				? `?to=${encodeURIComponent(event.url.pathname + event.url.search)}`
				: '';
		redirect(303, `/sign-in${to}`);
	}
	if (!isInRightGroup(routeId, context.actor.roles.includes('supplier'))) {
		noteRefusedAct({ act: 'page.open', why: 'other-group', shipmentId: null });
		return new Response('There is no such page.', { status: 404 });
	}
	return resolve(event);
};
