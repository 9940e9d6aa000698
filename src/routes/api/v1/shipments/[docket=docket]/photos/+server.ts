import { photoInput } from '$lib/schemas/photo';
import { addPhoto } from '$lib/server/photos/add-photo';
import { photoOf } from '$lib/server/photos/photo-upload';
import { contextOf, parseInput, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

/** Adds one photograph: a form with `photo`, `kind`, `caption` and, for sending again, `id`. */
export const POST: RequestHandler = async ({ locals, params, request }) => {
	const ctx = contextOf(locals);

	try {
		const { fields, bytes } = await photoOf(request);
		const input = parseInput(fields, photoInput);

		return Response.json(await addPhoto(ctx, params.docket, input, bytes), { status: 201 });
	} catch (e) {
		return refusalAsJson(e);
	}
};
