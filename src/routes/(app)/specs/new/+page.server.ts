import { fail, redirect } from '@sveltejs/kit';
import { queryOf } from '$lib/schemas/list';
import { productForm } from '$lib/schemas/product';
import { startingQuery } from '$lib/schemas/spec-library';
import { authorize } from '$lib/server/policies';
import { listFamilies } from '$lib/server/products/list-products';
import { saveProduct } from '$lib/server/products/save-product';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import { getStarting } from '$lib/server/specs/list-starting';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const { from } = startingQuery.parse(queryOf(url.searchParams));

	await orError(Promise.resolve().then(() => authorize(ctx, 'catalogue.change')));

	const starting = from ? await orError(getStarting(ctx, from)) : null;

	return { starting, families: await orError(listFamilies(ctx)), back: { href: '/specs', word: 'Specs' } };
};

export const actions = {
	save: async ({ locals, request, url }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, productForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues });

		let productId: string;
		try {
			productId = await saveProduct(ctx, null, form.data);
		} catch (e) {
			return orFail(e, form.data);
		}

		const { from } = startingQuery.parse(queryOf(url.searchParams));
		redirect(303, `/specs/${productId}${from ? `?from=${encodeURIComponent(from)}` : ''}`);
	}
} satisfies Actions;
