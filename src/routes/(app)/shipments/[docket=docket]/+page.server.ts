import { fail } from '@sveltejs/kit';
import { v7 as uuid } from 'uuid';
import { pulpInput } from '$lib/schemas/arrival';
import type { DocketView } from '$lib/schemas/docket';
import { queryOf } from '$lib/schemas/list';
import { photoInput } from '$lib/schemas/photo';
import { holdInput } from '$lib/schemas/note';
import { shareBasisQuery } from '$lib/schemas/share-basis';
import { trimUndoing, typedTrim } from '$lib/schemas/trim';
import { uploadOf } from '$lib/server/reads/upload-of';
import { airAtPulp } from '$lib/server/arrivals/air-at-pulp';
import { recordPulp } from '$lib/server/arrivals/record-pulp';
import type { Context } from '$lib/server/context';
import { getVersion } from '$lib/server/dispositions/get-version';
import { addPhoto } from '$lib/server/photos/add-photo';
import { photoOf } from '$lib/server/photos/photo-upload';
import { findTaker } from '$lib/server/queue/find-taker';
import { handBackDocket, takeDocket } from '$lib/server/queue/take-docket';
import { getDocket } from '$lib/server/dockets/get-docket';
import { listForecastBases } from '$lib/server/dockets/list-forecast-bases';
import { liftHold } from '$lib/server/holds/lift-hold';
import { putHold } from '$lib/server/holds/put-hold';
import { NoteNotTaken, receiveNote } from '$lib/server/notes/receive-note';
import { mayAcceptAtDock } from '$lib/server/authority/dock-accept';
import { findNextWaiting } from '$lib/server/queue/list-queue';
import { may } from '$lib/server/policies';
import { contextOf, orError, orFail, parseForm, parseInput } from '$lib/server/request';
import { InvalidFields } from '$lib/server/shipments/invalid-fields';
import { trimAsTyped } from '$lib/server/traces/trim-as-typed';
import { undoTrim } from '$lib/server/traces/trims';
import type { Actions, PageServerLoad } from './$types';

const nothing = {
	...{ sign: false, log: false, hold: false, lift: false, upload: false, trim: false, claim: false },
	...{ accept: false, photo: false, copy: false }
};

async function permissionsOf(ctx: Context, docket: DocketView): Promise<typeof nothing> {
	return {
		sign: may(ctx.actor, 'disposition.sign'),
		log: may(ctx.actor, 'arrival.log'),
		hold: may(ctx.actor, 'hold.put'),
		lift: may(ctx.actor, 'hold.lift'),
		upload: may(ctx.actor, 'read.upload'),
		trim: may(ctx.actor, 'trim.make'),
		claim: may(ctx.actor, 'claim.work'),
		photo: may(ctx.actor, 'photo.add'),
		copy: may(ctx.actor, 'copy.take'),
		accept: await mayAcceptAtDock(ctx, docket)
	};
}

/** An earlier version that the address asks to see; null for the docket as it stands. */
function versionOf(text: string | null): number | null {
	return text !== null && /^[1-9]\d{0,3}$/.test(text) ? Number(text) : null;
}

export const load: PageServerLoad = async ({ locals, params, url, depends }) => {
	depends('app:docket');
	const ctx = contextOf(locals);
	const version = versionOf(url.searchParams.get('version'));

	const docket = await orError(
		version === null ? getDocket(ctx, params.docket) : getVersion(ctx, params.docket, version)
	);
	const { basis } = shareBasisQuery.parse(queryOf(url.searchParams));
	const isDecidedHere = version === null && docket.stage === 'done' && may(ctx.actor, 'disposition.sign');

	return {
		docket,
		version,
		/** Sent along with the next note: pressed twice, it writes one. */
		newNoteId: version === null ? uuid() : null,
		shareBasis: version === null ? basis : undefined,
		forecasts: version === null ? await orError(listForecastBases(ctx, docket.id)) : [],
		taker: docket.arrival && version === null ? await orError(findTaker(ctx, docket.number)) : null,
		airCelsius: await airAtPulp(docket),
		nextWaiting: isDecidedHere ? await orError(findNextWaiting(ctx, docket.site.id, docket.number)) : null,
		may: version === null ? await permissionsOf(ctx, docket) : nothing,
		back: { href: '/arrivals', word: docket.number.split('-').at(-1) ?? '', title: docket.title }
	};
};

export const actions = {
	note: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		try {
			await receiveNote(ctx, params.docket, uploadOf(request));
		} catch (e) {
			if (!(e instanceof NoteNotTaken)) return orFail(e);
			const issues: Record<string, string> = { [e.fault.field]: e.fault.sentence };
			return fail(e.status, { values: { text: e.text }, issues, code: 'note' });
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

	pulp: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, pulpInput);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'pulp' });

		try {
			await recordPulp(ctx, params.docket, form.data.pulp);
		} catch (e) {
			return orFail(e);
		}
	},

	photo: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		try {
			const { fields, bytes } = await photoOf(request);
			await addPhoto(ctx, params.docket, parseInput(fields, photoInput), bytes);
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { ...data, code: 'photo' });
		}
	},

	take: async ({ locals, params }) => {
		const ctx = contextOf(locals);

		try {
			await takeDocket(ctx, params.docket);
		} catch (e) {
			return orFail(e);
		}
	},

	handBack: async ({ locals, params }) => {
		const ctx = contextOf(locals);

		try {
			await handBackDocket(ctx, params.docket);
		} catch (e) {
			return orFail(e);
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
