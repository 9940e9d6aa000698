import { describe, expect, it } from 'vitest';
import type { Context } from '../../src/lib/server/context';
import { buildShipment, buildSite, buildUser, contextFor } from '../helpers/factories';
import { useTestDatabase } from '../helpers/test-database';
import { exportText } from '../helpers/upload';
import { GET as getFile } from '../../src/routes/api/v1/reads/[read=uuid]/file/+server';
import { GET as getRead } from '../../src/routes/api/v1/reads/[read=uuid]/+server';
import { POST as answer } from '../../src/routes/api/v1/reads/[read=uuid]/answers/+server';
import { POST as keep } from '../../src/routes/api/v1/reads/[read=uuid]/keep/+server';
import { GET as list, POST as upload } from '../../src/routes/api/v1/shipments/[docket=docket]/reads/+server';
import { GET as getCsv } from '../../src/routes/api/v1/traces/[trace=uuid]/readings.csv/+server';
import { GET as getSeries } from '../../src/routes/api/v1/traces/[trace=uuid]/series/+server';

useTestDatabase();

interface Call {
	context: Context | null;
	params: Record<string, string>;
	request?: Request;
	url?: string;
}

const unknownId = '01970000-0000-7000-8000-000000000000';
const origin = 'http://localhost';

/** Calls a handler with the parts of an event that these use. */
async function call(handler: (event: never) => unknown, { context, params, request, url = '/' }: Call) {
	const event = { locals: { context }, params, request, url: new URL(url, origin) };
	const response = await handler(event as never);
	if (!(response instanceof Response)) throw new Error('The handler gave no response.');
	return response;
}

function fileRequest(content: string, name = 'trip.csv'): Request {
	const form = new FormData();
	form.append('files', new File([content], name, { type: 'text/html' }));
	return new Request(origin, { method: 'POST', body: form });
}

const jsonRequest = (body: string) => new Request(origin, { method: 'POST', body });

async function scene() {
	const site = await buildSite();
	const dock = await contextFor(await buildUser(['dock'], { sites: [site] }));
	const qa = await contextFor(await buildUser(['qa'], { sites: [site] }));
	const made = await buildShipment({ site });
	const supplier = await contextFor(await buildUser(['supplier'], { partner: made.supplier }));
	return { ...made, dock, qa, supplier, docket: { docket: made.shipment.number } };
}

describe('the API of reads and traces', () => {
	it.each([
		['reads of a docket', list, { docket: 'PS-26-1' }],
		['an upload', upload, { docket: 'PS-26-1' }],
		['a read', getRead, { read: unknownId }],
		['an answer', answer, { read: unknownId }],
		['keeping', keep, { read: unknownId }],
		['a raw file', getFile, { read: unknownId }],
		['a series', getSeries, { trace: unknownId }],
		['readings', getCsv, { trace: unknownId }]
	])('asks who is calling: %s', async (_, handler, params) => {
		await expect(call(handler, { context: null, params, request: jsonRequest('{}') })).rejects.toMatchObject({
			status: 401
		});
	});

	it('walks from upload to series and answers each step as JSON', async () => {
		const { dock, qa, docket } = await scene();
		const sent = await call(upload, { context: dock, params: docket, request: fileRequest(exportText()) });
		expect(sent.status).toBe(200);
		const { reads } = await sent.json();
		const params = { read: reads[0].id };
		const body = JSON.stringify({ serial: 'WH-77', placement: 'air', accuracyCelsius: 0.5, lineId: null });
		const kept = await call(keep, { context: dock, params, request: jsonRequest(body) });
		const view = await kept.json();
		expect(view).toMatchObject({ state: 'kept', readings: 561 });
		const trace = { trace: view.traceIds[0] };
		const series = await call(getSeries, { context: qa, params: trace, url: '/?points=100' });
		expect((await series.json()).times.length).toBeLessThanOrEqual(100);
		const csv = await call(getCsv, { context: qa, params: trace });
		expect((await csv.text()).split('\r\n')).toHaveLength(561 + 2);
		const listed = await (await call(list, { context: qa, params: docket })).json();
		expect(listed.reads).toMatchObject([{ id: params.read, state: 'kept' }]);
	});

	it('gives a raw file as an attachment that no browser runs, whatever type it came as', async () => {
		const { dock, qa, docket } = await scene();
		const name = 'evil "name".html';
		const sent = await call(upload, {
			context: dock,
			params: docket,
			request: fileRequest(exportText({ celsius: 2 }), name)
		});
		const params = { read: (await sent.json()).reads[0].id };
		const file = await call(getFile, { context: qa, params });
		expect(await file.text()).toBe(exportText({ celsius: 2 }));
		expect(file.headers.get('content-type')).toBe('application/octet-stream');
		expect(file.headers.get('content-disposition')).toMatch(/^attachment; filename="evil %22name%22\.html"/);
		expect(file.headers.get('x-content-type-options')).toBe('nosniff');
		expect(file.headers.get('content-security-policy')).toContain('sandbox');
		expect((await call(getFile, { context: dock, params })).status).toBe(403);
	});

	it('answers 403 to who may not, and 404 to who may not know', async () => {
		const { docket, supplier } = await scene();
		const stranger = await scene();
		const own = await call(upload, { context: supplier, params: docket, request: fileRequest('x') });
		expect([own.status, (await own.json()).code]).toEqual([403, 'not-allowed']);
		const other = await call(upload, { context: stranger.dock, params: docket, request: fileRequest('x') });
		expect([other.status, (await other.json()).code]).toEqual([404, 'not-found']);
		const guess = await call(getSeries, { context: stranger.qa, params: { trace: unknownId } });
		expect(guess.status).toBe(404);
	});

	it('answers 422 to bad input and names the field', async () => {
		const { dock, qa, docket } = await scene();
		const query = await call(getSeries, { context: qa, params: { trace: unknownId }, url: '/?points=3' });
		expect(query.status).toBe(422);
		expect(await query.json()).toMatchObject({ code: 'invalid', message: expect.stringContaining('points') });
		const noForm = await call(upload, { context: dock, params: docket, request: jsonRequest('{}') });
		expect([noForm.status, (await noForm.json()).code]).toEqual([422, 'not-multipart']);
		const broken = await call(answer, {
			context: dock,
			params: { read: unknownId },
			request: jsonRequest('{')
		});
		expect(broken.status).toBe(422);
		const empty = await call(keep, {
			context: dock,
			params: { read: unknownId },
			request: jsonRequest('{}')
		});
		expect((await empty.json()).message).toContain('serial');
	});
});
