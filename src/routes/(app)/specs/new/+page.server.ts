import { fail, redirect } from '@sveltejs/kit';
import { productForm } from '$lib/schemas/product';
import { authorize } from '$lib/server/policies';
import { listFamilies } from '$lib/server/products/list-products';
import { saveProduct } from '$lib/server/products/save-product';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	await orError(Promise.resolve().then(() => authorize(ctx, 'catalogue.change')));

	return { families: await orError(listFamilies(ctx)), back: { href: '/specs', word: 'Specs' } };
};

export const actions = {
	save: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, productForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues });

		let productId: string;
		try {
			productId = await saveProduct(ctx, null, form.data);
		} catch (e) {
			return orFail(e, form.data);
		}

		redirect(303, `/specs/${productId}`);
	}
} satisfies Actions;
