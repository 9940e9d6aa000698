import { fail, redirect } from '@sveltejs/kit';
import type { Spec } from '$lib/domain/shelf-life/spec';
import type { StartingSpec } from '$lib/domain/starting-specs/starting-spec';
import type { TemperatureUnit } from '$lib/domain/units';
import { specIssues } from '$lib/messages/en/spec-faults';
import { queryOf } from '$lib/schemas/list';
import { productForm, productRulesForm, varietyForm } from '$lib/schemas/product';
import { readSpecForm } from '$lib/schemas/spec-form';
import { startingValues } from '$lib/schemas/spec-form-starting';
import { specFormValues, type SpecFormValues } from '$lib/schemas/spec-form-values';
import { draftRef, specDiscardForm, specSheetQuery, specSignForm } from '$lib/schemas/spec-signing';
import { componentsAsked } from '$lib/server/accounts/check-signing-components';
import { may } from '$lib/server/policies';
import { listFamilies } from '$lib/server/products/list-products';
import { addVariety, saveProduct, switchProduct } from '$lib/server/products/save-product';
import { saveProductRules } from '$lib/server/products/save-rules';
import { contextOf, issuesOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import { discardDraft } from '$lib/server/specs/discard-draft';
import { getSpecSheet } from '$lib/server/specs/get-spec-sheet';
import { getStarting } from '$lib/server/specs/list-starting';
import { saveDraft } from '$lib/server/specs/save-draft';
import { signSpec } from '$lib/server/specs/sign-spec';
import { startOfDay } from '$lib/server/specs/start-of-day';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, url, parent }) => {
	const ctx = contextOf(locals);

	const query = specSheetQuery.parse(queryOf(url.searchParams));

	const sheet = await orError(getSpecSheet(ctx, params.product, query.variety));
	const asked = sheet.versions.find((version) => version.number === query.version) ?? null;
	const shown = asked ?? sheet.draft ?? sheet.inForce ?? sheet.versions[0] ?? null;

	const { temperatureUnit } = await parent();
	const mayChange = may(ctx.actor, 'catalogue.change');
	const starting = mayChange && query.from ? await orError(getStarting(ctx, query.from)) : null;
	return {
		...sheet,
		shown,
		starting,
		isEditable: mayChange && (starting !== null || asked === null || asked.standing === 'draft'),
		mayChange,
		maySign: may(ctx.actor, 'spec.sign'),
		asks: await componentsAsked(ctx),
		values: valuesOf(starting, shown, temperatureUnit),
		families: mayChange ? await listFamilies(ctx) : [],
		back: { href: '/specs', word: 'Specs', title: sheet.product.name }
	};
};

/** A starting spec's figures where one is to be copied, else those of the version in view. */
function valuesOf(
	starting: StartingSpec | null,
	shown: { figures: Spec } | null,
	unit: TemperatureUnit
): SpecFormValues {
	if (starting) return startingValues(starting, unit);
	return shown ? specFormValues(shown.figures, unit) : { unit };
}

/** The form's own page again, the variety kept. */
function sheetOf(url: URL): string {
	const variety = url.searchParams.get('variety');
	return variety ? `${url.pathname}?variety=${encodeURIComponent(variety)}` : url.pathname;
}

function textsOf(form: FormData): SpecFormValues {
	const texts = [...form].filter((entry): entry is [string, string] => typeof entry[1] === 'string');
	return Object.fromEntries(texts);
}

export const actions = {
	save: async ({ locals, request, params, url }) => {
		const ctx = contextOf(locals);

		const values = textsOf(await request.formData());
		const { spec, faults } = readSpecForm(values);
		const ref = draftRef.safeParse(values);
		if (!spec || !ref.success) {
			const issues = { ...specIssues(faults, values), ...(ref.success ? {} : issuesOf(ref.error)) };
			return fail(422, { act: 'save', values, issues });
		}

		try {
			await saveDraft(ctx, { productId: params.product, figures: spec, ...ref.data });
		} catch (e) {
			return orFail(e, { act: 'save', ...values });
		}

		redirect(303, sheetOf(url));
	},

	sign: async ({ locals, request, cookies, url }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, specSignForm);
		if (!form.ok) return fail(422, { act: 'sign', values: form.values, issues: form.issues });

		try {
			const { zone } = await getCurrentSite(ctx, cookies.get(siteCookie));
			const { inForceOn, ...signature } = form.data;
			await signSpec(ctx, { ...signature, inForceFrom: startOfDay(inForceOn, zone, ctx.now) });
		} catch (e) {
			return orFail(e, { act: 'sign', ...form.data });
		}

		redirect(303, sheetOf(url));
	},

	discard: async ({ locals, request, url }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, specDiscardForm);
		if (!form.ok) return fail(422, { act: 'discard', values: form.values, issues: form.issues });

		try {
			await discardDraft(ctx, form.data.specVersionId);
		} catch (e) {
			return orFail(e, { act: 'discard' });
		}

		redirect(303, sheetOf(url));
	},

	product: async ({ locals, request, params, url }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, productForm);
		if (!form.ok) return fail(422, { act: 'product', values: form.values, issues: form.issues });

		try {
			await saveProduct(ctx, params.product, form.data);
		} catch (e) {
			return orFail(e, { act: 'product', ...form.data });
		}

		redirect(303, sheetOf(url));
	},

	rules: async ({ locals, request, params, url }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const form = await parseForm(request, productRulesForm);
		if (!form.ok) return fail(422, { act: 'rules', values: form.values, issues: form.issues });

		try {
			await saveProductRules(ctx, params.product, form.data);
		} catch (e) {
			return orFail(e, { act: 'rules', ...nestedOf(await sent.formData()) });
		}

		redirect(303, sheetOf(url));
	},

	variety: async ({ locals, request, params, url }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, varietyForm);
		if (!form.ok) return fail(422, { act: 'variety', values: form.values, issues: form.issues });

		let varietyId: string;
		try {
			varietyId = await addVariety(ctx, params.product, form.data.variety);
		} catch (e) {
			return orFail(e, { act: 'variety', ...form.data });
		}

		redirect(303, `${url.pathname}?variety=${varietyId}`);
	},

	switch: async ({ locals, request, params, url }) => {
		const ctx = contextOf(locals);

		const isOn = (await request.formData()).get('isOn') === 'true';

		try {
			await switchProduct(ctx, params.product, isOn);
		} catch (e) {
			return orFail(e, { act: 'switch' });
		}

		redirect(303, sheetOf(url));
	}
} satisfies Actions;
