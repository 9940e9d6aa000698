import { fail, redirect } from '@sveltejs/kit';
import { clockCorrectionForm, clockRestoring } from '$lib/schemas/clock-correction';
import { rememberForm } from '$lib/schemas/layout';
import { answerForm, keepForm, withdrawForm } from '$lib/schemas/read';
import { rememberLayout } from '$lib/server/layouts/remember-layout';
import { may } from '$lib/server/policies';
import { answerQuestion, askQa } from '$lib/server/reads/answer-question';
import { askAgain } from '$lib/server/reads/ask-again';
import { getRead } from '$lib/server/reads/get-read';
import { keepRead } from '$lib/server/reads/keep-read';
import { keepUnread } from '$lib/server/reads/keep-unread';
import { withdrawRead } from '$lib/server/reads/withdraw-read';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import { correctClock, restoreClock } from '$lib/server/traces/correct-clock';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const read = await orError(getRead(ctx, params.read));

	return {
		read,
		may: {
			confirm: may(ctx.actor, 'layout.confirm'),
			keep: may(ctx.actor, 'read.upload'),
			withdraw: may(ctx.actor, 'read.withdraw'),
			correctClock: may(ctx.actor, 'clock.correct'),
			openRaw: may(ctx.actor, 'raw-file.open')
		},
		back: {
			href: `/shipments/${read.docket.number}/reads`,
			word: read.docket.number.split('-').at(-1) ?? '',
			title: read.docket.title
		}
	};
};

export const actions = {
	answer: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, answerForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await answerQuestion(ctx, params.read, form.data);
		} catch (e) {
			return orFail(e, { ...form.data });
		}

		redirect(303, `/shipments/${params.docket}/reads/${params.read}`);
	},

	reopen: async ({ locals, params }) => {
		const ctx = contextOf(locals);

		try {
			await askAgain(ctx, params.read);
		} catch (e) {
			return orFail(e);
		}

		redirect(303, `/shipments/${params.docket}/reads/${params.read}`);
	},

	remember: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, rememberForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await rememberLayout(ctx, params.read, form.data.scope);
		} catch (e) {
			return orFail(e, { ...form.data });
		}

		redirect(303, `/shipments/${params.docket}/reads/${params.read}`);
	},

	keepUnread: async ({ locals, params }) => {
		const ctx = contextOf(locals);

		try {
			await keepUnread(ctx, params.read);
		} catch (e) {
			return orFail(e);
		}

		redirect(303, `/shipments/${params.docket}/reads/${params.read}`);
	},

	ask: async ({ locals, params }) => {
		const ctx = contextOf(locals);

		try {
			await askQa(ctx, params.read);
		} catch (e) {
			return orFail(e);
		}

		redirect(303, `/shipments/${params.docket}/reads`);
	},

	keep: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, keepForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await keepRead(ctx, params.read, form.data);
		} catch (e) {
			return orFail(e, { ...form.data });
		}

		redirect(303, `/shipments/${params.docket}`);
	},

	correctClock: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, clockCorrectionForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'clock' });

		try {
			await correctClock(ctx, params.read, form.data);
		} catch (e) {
			return orFail(e, { reason: form.data.reason });
		}

		redirect(303, `/shipments/${params.docket}/reads/${params.read}#clock`);
	},

	restoreClock: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, clockRestoring);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'clock' });

		try {
			await restoreClock(ctx, params.read, form.data.correctionId);
		} catch (e) {
			return orFail(e);
		}

		redirect(303, `/shipments/${params.docket}/reads/${params.read}#clock`);
	},

	withdraw: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, withdrawForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await withdrawRead(ctx, params.read, form.data.reason);
		} catch (e) {
			return orFail(e, { ...form.data });
		}

		redirect(303, `/shipments/${params.docket}/reads`);
	}
} satisfies Actions;
