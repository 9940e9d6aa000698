import { redirect } from '@sveltejs/kit';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = ({ url }) => {
	const code = url.searchParams.get('code')?.replace(/[\s-]/g, '');
	if (code) redirect(303, `/check/${encodeURIComponent(code)}`);
};
