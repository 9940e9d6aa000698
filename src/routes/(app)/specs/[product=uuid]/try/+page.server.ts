import { queryOf } from '$lib/schemas/list';
import { specSheetQuery } from '$lib/schemas/spec-signing';
import { contextOf, orError } from '$lib/server/request';
import { findVersionToTry } from '$lib/server/specs/find-version-to-try';
import { tryVersion } from '$lib/server/specs/try-version';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, url }) => {
	const ctx = contextOf(locals);

	const { variety, version } = specSheetQuery.parse(queryOf(url.searchParams));

	const tried = await orError(findVersionToTry(ctx, params.product, variety, version));
	const trial = await orError(tryVersion(ctx, params.product, tried.versionId));

	return {
		...tried,
		trial,
		back: {
			href: `/specs/${params.product}${variety ? `?variety=${variety}` : ''}`,
			word: 'Spec',
			title: tried.name
		}
	};
};
