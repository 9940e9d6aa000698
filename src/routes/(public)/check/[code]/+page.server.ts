import { redirect } from '@sveltejs/kit';
import type { PageServerLoad } from './$types';

/** Reports printed before the page moved carry this address in their code. */
export const load: PageServerLoad = ({ params }) =>
	redirect(308, `/verify/${encodeURIComponent(params.code)}`);
