import { redirect } from '@sveltejs/kit';
import type { PageServerLoad } from './$types';

/** Reports printed before the page moved carry this address. */
export const load: PageServerLoad = ({ url }) => redirect(308, `/verify${url.search}`);
