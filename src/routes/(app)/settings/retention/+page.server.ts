import { fail, redirect } from '@sveltejs/kit';
import { retentionForm, retentionHoldForm, retentionReleaseForm } from '$lib/schemas/retention';
import type { Context } from '$lib/server/context';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { liftRetentionHold, listRetentionHolds, putRetentionHold } from '$lib/server/retention/holds';
import { getPeriods, savePeriods } from '$lib/server/retention/periods';
import { previewRetention } from '$lib/server/retention/preview-retention';
import type { z } from 'zod';
import type { Actions, PageServerLoad, RequestEvent } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	const holds = await orError(listRetentionHolds(ctx));
	const preview = await orError(previewRetention(ctx));

	return { holds, preview, periods: await getPeriods() };
};

/** An act of this page: the same beats for each, and the page again. */
function act<Schema extends z.ZodType>(
	of: 'periods' | 'hold' | 'release',
	schema: Schema,
	work: (ctx: Context, input: z.output<Schema>) => Promise<unknown>
) {
	return async ({ locals, request }: RequestEvent) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const form = await parseForm(request, schema);
		if (!form.ok) return fail(422, { of, values: form.values, issues: form.issues });

		try {
			await work(ctx, form.data);
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { of, ...data });
		}

		redirect(303, '/settings/retention');
	};
}

export const actions = {
	periods: act('periods', retentionForm, savePeriods),
	hold: act('hold', retentionHoldForm, putRetentionHold),
	release: act('release', retentionReleaseForm, liftRetentionHold)
} satisfies Actions;
