import { redirect } from '@sveltejs/kit';
import { reportCode } from '$lib/schemas/report-code';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = ({ url }) => {
	const typed = url.searchParams.get('code');
	const code = typed === null ? null : reportCode(typed);

	if (code) redirect(303, `/verify/${code}`);

	return { typed };
};
