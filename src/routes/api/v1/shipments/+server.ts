import { boardQuery } from '$lib/schemas/board';
import { queryOf } from '$lib/schemas/list';
import { queueQuery } from '$lib/schemas/queue';
import { shipmentInput } from '$lib/schemas/shipment-form';
import { shipmentListQuery } from '$lib/schemas/shipment-list';
import { listBoard } from '$lib/server/arrivals/list-board';
import { listQueue } from '$lib/server/queue/list-queue';
import { asJson, contextOf, parseInput, refusalAsJson } from '$lib/server/request';
import { createShipment } from '$lib/server/shipments/create-shipment';
import { listShipments } from '$lib/server/shipments/list-shipments';
import { readJson } from '$lib/server/shipments/read-json';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import { sha256Hex } from '$lib/server/storage/sha256';
import type { RequestHandler } from './$types';

/**
 * The dockets of a site, with `view=board` its board of a day, with `view=waiting` what waits for QA; an answer that
 * has not changed is told by its tag.
 */
export const GET: RequestHandler = async ({ locals, url, cookies, request }) => {
	const ctx = contextOf(locals);

	const asked = queryOf(url.searchParams);

	let body: string;
	try {
		const siteId = asked.site ?? (await getCurrentSite(ctx, cookies.get(siteCookie))).id;
		const list =
			asked.view === 'board'
				? listBoard(ctx, siteId, boardQuery.parse(asked))
				: asked.view === 'waiting'
					? listQueue(ctx, siteId, queueQuery.parse(asked))
					: listShipments(ctx, siteId, shipmentListQuery.parse(asked));
		body = JSON.stringify(await list);
	} catch (e) {
		return refusalAsJson(e);
	}

	const headers = { ETag: `"${sha256Hex(Buffer.from(body)).slice(0, 32)}"`, Vary: 'Cookie' };
	if (request.headers.get('if-none-match') === headers.ETag)
		return new Response(null, { status: 304, headers });
	return new Response(body, { headers: { ...headers, 'Content-Type': 'application/json' } });
};

/** Opens a docket. `site` in the query names one of the caller's sites; without it, the one they work at. */
export const POST: RequestHandler = async ({ locals, url, cookies, request }) => {
	const ctx = contextOf(locals);

	return asJson(async () => {
		const input = parseInput(await readJson(request), shipmentInput);
		const siteId = url.searchParams.get('site') ?? (await getCurrentSite(ctx, cookies.get(siteCookie))).id;

		return createShipment(ctx, siteId, input);
	});
};
