import { redirect } from '@sveltejs/kit';
import { may } from '$lib/server/policies';
import { listReads } from '$lib/server/reads/list-reads';
import { receiveUpload } from '$lib/server/reads/receive-upload';
import { uploadOf } from '$lib/server/reads/upload-of';
import { contextOf, orError, orFail } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const found = await orError(listReads(ctx, params.docket));

	return {
		...found,
		mayUpload: may(ctx.actor, 'read.upload'),
		back: {
			href: `/shipments/${params.docket}`,
			word: params.docket.split('-').at(-1) ?? '',
			title: found.docket.title
		}
	};
};

export const actions = {
	upload: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		let answer;
		try {
			answer = await receiveUpload(ctx, params.docket, uploadOf(request));
		} catch (e) {
			return orFail(e);
		}

		const [read] = answer.reads;
		if (answer.reads.length === 1 && answer.refused.length === 0 && read)
			redirect(303, `/shipments/${params.docket}/reads/${read.id}`);
		return { answer };
	}
} satisfies Actions;
