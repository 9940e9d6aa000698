import { checkReport } from '$lib/server/check/check-report';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ params }) => ({ standing: await checkReport(params.code) });
