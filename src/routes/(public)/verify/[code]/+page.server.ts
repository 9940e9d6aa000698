import { checkReport } from '$lib/server/check/check-report';
import { orError } from '$lib/server/request';
import { requestScope } from '$lib/server/request-scope';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ params, url, setHeaders }) => {
	const standing = await orError(checkReport(params.code, requestScope()));

	// What is current today is superseded tomorrow.
	setHeaders({ 'cache-control': 'no-store' });

	return { standing, isFile: url.searchParams.get('of') === 'file' };
};
