import { linesQuery } from '$lib/schemas/file-lines';
import { queryOf } from '$lib/schemas/list';
import { getFileLines } from '$lib/server/reads/get-file-lines';
import { contextOf, orError } from '$lib/server/request';
import type { PageServerLoad } from './$types';

/** Lines shown before the one asked for, so that it stands among its neighbours. */
const linesBefore = 5;

export const load: PageServerLoad = async ({ locals, params, url }) => {
	const ctx = contextOf(locals);

	const { line } = linesQuery.parse(queryOf(url.searchParams));

	const found = await orError(getFileLines(ctx, params.read, Math.max(1, line - linesBefore)));

	return {
		...found,
		line: url.searchParams.has('line') ? line : null,
		readHref: `/shipments/${params.docket}/reads/${params.read}`,
		back: {
			href: `/shipments/${params.docket}/reads/${params.read}`,
			word: params.docket.split('-').at(-1) ?? '',
			title: found.fileName
		}
	};
};
