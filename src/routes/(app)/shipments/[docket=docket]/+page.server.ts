import { fail } from '@sveltejs/kit';
import { holdInput, noteInput } from '$lib/schemas/note';
import { trimUndoing, typedTrim } from '$lib/schemas/trim';
import { getDocket } from '$lib/server/dockets/get-docket';
import { liftHold } from '$lib/server/holds/lift-hold';
import { putHold } from '$lib/server/holds/put-hold';
import { addNote } from '$lib/server/notes/add-note';
import { mayAcceptAtDock } from '$lib/server/authority/dock-accept';
import { findNextWaiting } from '$lib/server/queue/list-queue';
import { may } from '$lib/server/policies';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import { InvalidFields } from '$lib/server/shipments/invalid-fields';
import { trimAsTyped } from '$lib/server/traces/trim-as-typed';
import { undoTrim } from '$lib/server/traces/trims';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, depends }) => {
	depends('app:docket');
	const ctx = contextOf(locals);
	const docket = await orError(getDocket(ctx, params.docket));
	const isDecidedHere = docket.stage === 'done' && may(ctx.actor, 'disposition.sign');

	return {
		docket,
		nextWaiting: isDecidedHere ? await orError(findNextWaiting(ctx, docket.site.id, docket.number)) : null,
		may: {
			sign: may(ctx.actor, 'disposition.sign'),
			log: may(ctx.actor, 'arrival.log'),
			hold: may(ctx.actor, 'hold.put'),
			lift: may(ctx.actor, 'hold.lift'),
			upload: may(ctx.actor, 'read.upload'),
			trim: may(ctx.actor, 'trim.make'),
			claim: may(ctx.actor, 'claim.work'),
			accept: await mayAcceptAtDock(ctx, docket)
		},
		back: { href: '/arrivals', word: docket.number.split('-').at(-1) ?? '', title: docket.title }
	};
};

export const actions = {
	note: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, noteInput);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await addNote(ctx, params.docket, form.data);
		} catch (e) {
			return orFail(e, form.data);
		}
	},

	hold: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, holdInput);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await putHold(ctx, params.docket, form.data);
		} catch (e) {
			return orFail(e, form.data);
		}
	},

	trim: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, typedTrim);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'trim' });

		try {
			await trimAsTyped(ctx, form.data);
		} catch (e) {
			if (e instanceof InvalidFields) return fail(422, { values: form.data, issues: e.issues, code: 'trim' });
			return orFail(e, form.data);
		}
	},

	untrim: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, trimUndoing);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'trim' });

		try {
			await undoTrim(ctx, form.data.trimId);
		} catch (e) {
			return orFail(e, form.data);
		}
	},

	lift: async ({ locals, params }) => {
		const ctx = contextOf(locals);

		try {
			await liftHold(ctx, params.docket);
		} catch (e) {
			return orFail(e);
		}
	}
} satisfies Actions;
