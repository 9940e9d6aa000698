import { sequence } from '@sveltejs/kit/hooks';
import type { Handle, HandleServerError, ServerInit } from '@sveltejs/kit';
import { building } from '$app/environment';
import { authHandle } from '$lib/server/accounts/auth';
import { openDatabase } from '$lib/server/db/sequelize';
import { env } from '$lib/server/env';
import { attachContext } from '$lib/server/hooks/attach-context';
import { guardOrigin } from '$lib/server/hooks/guard-origin';
import { guardRoutes } from '$lib/server/hooks/guard-routes';
import { keepRefusals } from '$lib/server/hooks/keep-refusals';
import { isDatabaseAway } from '$lib/server/hooks/database-away';
import { openScope } from '$lib/server/hooks/open-scope';
import { setHeaders } from '$lib/server/hooks/set-headers';
import { wearTheme } from '$lib/server/hooks/wear-theme';
import { log } from '$lib/server/log';

export const init: ServerInit = () => {
	if (!building) openDatabase(env().databaseUrl);
};

export const handle: Handle = sequence(
	openScope,
	setHeaders,
	guardOrigin,
	authHandle,
	attachContext,
	keepRefusals,
	guardRoutes,
	wearTheme
);

export const handleError: HandleServerError = ({ error, event, status, message }) => {
	if (status === 404) return { message: 'There is nothing at this address.', code: 'not-found' };
	if (status < 500) return { message };
	const errorId = event.locals.requestId;
	log().error({ requestId: errorId, route: event.route.id, err: error }, 'request failed');
	if (isDatabaseAway(error))
		return {
			message: 'The database does not answer. Nothing was changed. Try again in a minute.',
			code: 'database-away',
			errorId
		};
	return { message: 'Something went wrong on our side. Nothing was changed.', code: 'bug', errorId };
};
