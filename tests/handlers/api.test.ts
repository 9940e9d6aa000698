import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { v7 as uuid } from 'uuid';
import { z } from 'zod';
import { Report } from '../../src/lib/server/db/models/report';
import { buildShipment, testPassword } from '../helpers/factories';
import { startProduct, Visitor, type Product } from '../helpers/product';
import { useTestDatabase } from '../helpers/test-database';
import { buildSeenLoad } from './signed-load';
import { signInAs } from './sign-in-as';

useTestDatabase();

let product: Product;
let load: Awaited<ReturnType<typeof buildSeenLoad>>;
let visitors: Record<keyof typeof load.people, Visitor>;
let reportId = '';

async function sign(qa: Visitor, number: string): Promise<void> {
	const page = await (await qa.request(`/shipments/${number}/sign`)).text();
	const shown = (name: string) => new RegExp(`name="${name}" value="([^"]+)"`).exec(page)?.[1] ?? '';
	const signed = await qa.post(`/shipments/${number}/sign`, {
		evidenceSha256: shown('evidenceSha256'),
		'lines.0.lineId': shown('lines.0.lineId'),
		'lines.0.outcome': 'reject',
		'lines.0.reason': 'crushed',
		reasons: 'Half the cases are crushed.',
		meaning: 'approval',
		// The first signature of a session shows every component.
		email: load.people.qa.email,
		password: testPassword
	});
	expect(signed.status).toBe(303);
	const report = await vi.waitFor(async () => Report.findOne({ rejectOnEmpty: true }), 20_000);
	reportId = report.id;
}

beforeAll(async () => {
	load = await buildSeenLoad();
	product = await startProduct();
	const entries = Object.entries(load.people).map(async ([name, user]) => [
		name,
		await signInAs(product, user)
	]);
	visitors = Object.fromEntries(await Promise.all(entries));
	await sign(visitors.qa, load.shipment.number);
}, 90_000);

afterAll(() => product.stop());

type Who = keyof typeof visitors;
const everybody: readonly Who[] = ['dock', 'qa', 'claims', 'admin', 'far', 'supplier', 'stranger'];

/** Every reading route with who gets an answer; everybody else is refused, out-of-sight people as if it did not exist. */
const readings: { route: string; path: () => string; opensTo: readonly Who[]; type: string }[] = [
	{
		route: 'shipments',
		path: () => '/api/v1/shipments',
		opensTo: ['dock', 'qa', 'claims', 'admin', 'far'],
		type: 'application/json'
	},
	{
		route: 'shipments?view=board',
		path: () => '/api/v1/shipments?view=board',
		opensTo: ['dock', 'qa', 'claims', 'admin', 'far'],
		type: 'application/json'
	},
	{
		route: 'shipments/{docket}',
		path: () => `/api/v1/shipments/${load.shipment.number}`,
		opensTo: ['dock', 'qa', 'claims', 'admin'],
		type: 'application/json'
	},
	{
		route: 'shipments/{docket}/reads',
		path: () => `/api/v1/shipments/${load.shipment.number}/reads`,
		opensTo: ['dock', 'qa', 'claims', 'admin'],
		type: 'application/json'
	},
	{
		route: 'shipments/{docket}/evidence',
		path: () => `/api/v1/shipments/${load.shipment.number}/evidence`,
		opensTo: ['qa', 'claims', 'admin'],
		type: 'application/zip'
	},
	{
		route: 'shipments/{docket}/copy',
		path: () => `/api/v1/shipments/${load.shipment.number}/copy`,
		opensTo: ['qa', 'admin'],
		type: 'application/zip'
	},
	{
		route: 'reads/{read}',
		path: () => `/api/v1/reads/${load.readId}`,
		opensTo: ['dock', 'qa', 'claims', 'admin'],
		type: 'application/json'
	},
	{
		route: 'reads/{read}/file',
		path: () => `/api/v1/reads/${load.readId}/file`,
		opensTo: ['qa', 'claims', 'admin', 'supplier'],
		type: 'application/octet-stream'
	},
	{
		route: 'traces/{trace}/series',
		path: () => `/api/v1/traces/${load.traceId}/series?points=100`,
		opensTo: ['dock', 'qa', 'claims', 'admin', 'supplier'],
		type: 'application/json'
	},
	{
		route: 'traces/{trace}/readings.csv',
		path: () => `/api/v1/traces/${load.traceId}/readings.csv`,
		opensTo: ['dock', 'qa', 'claims', 'admin', 'supplier'],
		type: 'text/csv'
	},
	{
		route: 'traces/{trace}/basis',
		path: () => `/api/v1/traces/${load.traceId}/basis`,
		opensTo: ['dock', 'qa', 'claims', 'admin'],
		type: 'application/json'
	},
	{
		route: 'traces/{trace}/lines',
		path: () => `/api/v1/traces/${load.traceId}/lines`,
		opensTo: ['dock', 'qa', 'claims', 'admin'],
		type: 'application/json'
	},
	{
		route: 'photos/{photo}',
		path: () => `/api/v1/photos/${load.photoId}`,
		opensTo: ['dock', 'qa', 'claims', 'admin', 'supplier'],
		type: 'image/jpeg'
	},
	{
		route: 'notes/files/{file}',
		path: () => `/api/v1/notes/files/${load.noteFileId}`,
		opensTo: ['dock', 'qa', 'claims', 'admin'],
		type: 'application/octet-stream'
	},
	{
		route: 'reports/{report}',
		path: () => `/api/v1/reports/${reportId}`,
		opensTo: ['dock', 'qa', 'claims', 'admin', 'supplier'],
		type: 'application/pdf'
	},
	{
		route: 'search',
		path: () => `/api/v1/search?q=${load.shipment.number}`,
		opensTo: ['dock', 'qa', 'claims', 'admin', 'far'],
		type: 'application/json'
	}
];

const refusal = z.strictObject({
	code: z.string().min(1),
	message: z.string().regex(/\.$/),
	issues: z.record(z.string(), z.string()).optional()
});

describe.each(readings)('GET $route', ({ path, opensTo, type }) => {
	it('answers 401 without a session', async () => {
		const answer = await new Visitor(product.address).request(path());
		expect(answer.status).toBe(401);
		expect(await answer.json()).toEqual({ code: 'no-session', message: 'Sign in first.' });
	});

	it.each(everybody)('to %s: an answer of its kind, or a refusal that tells nothing', async (who) => {
		const answer = await visitors[who].request(path());
		if (opensTo.includes(who)) {
			expect(answer.status).toBe(200);
			expect(answer.headers.get('content-type')).toContain(type);
			expect((await answer.arrayBuffer()).byteLength).toBeGreaterThan(0);
			return;
		}
		expect([403, 404]).toContain(answer.status);
		const { message } = refusal.parse(await answer.json());
		expect(message).not.toContain(load.shipment.title);
	});
});

describe('notes', () => {
	it('are on the docket of the house, and on no page of its supplier', async () => {
		const house = await (await visitors.qa.request(`/shipments/${load.shipment.number}`)).text();
		const supplied = await (await visitors.supplier.request(`/loads/${load.shipment.id}`)).text();
		expect(supplied).toContain(load.shipment.number);
		for (const part of ['Carrier was told at 06:40.', 'letter.pdf', load.noteFileId]) {
			expect(house).toContain(part);
			expect(supplied).not.toContain(part);
		}
	});
});

describe('the shapes of the API', () => {
	const json = async (path: string) => (await visitors.qa.request(path)).json();

	it('are a docket, a page of dockets, a board, reads, a series', async () => {
		const { number } = load.shipment;
		expect(await json(`/api/v1/shipments/${number}`)).toMatchObject({
			number,
			stage: 'done',
			verdict: 'rejected',
			lines: [{ lot: 'OB-26089-1', outcome: { outcome: 'reject', reason: 'crushed' } }],
			signatures: [{ version: 1, meaning: 'approval', report: { id: reportId } }]
		});
		expect(await json('/api/v1/shipments')).toMatchObject({ items: [{ number }], total: 1 });
		expect(await json(`/api/v1/shipments/${number}/reads`)).toMatchObject({
			reads: [{ id: load.readId, state: 'kept' }]
		});
		const series = await json(`/api/v1/traces/${load.traceId}/series?points=100`);
		expect(series.times.length).toBe(series.celsius.length);
		expect(series.times.length).toBeLessThanOrEqual(400);
		expect(await json(`/api/v1/search?q=${number}`)).toMatchObject({ items: [{ number }] });
		expect(await json(`/api/v1/search?q=nothing+like+it`)).toEqual({ items: [] });
	});

	it('say 304 to who has the same answer already', async () => {
		const first = await visitors.qa.request('/api/v1/shipments');
		const again = await visitors.qa.request('/api/v1/shipments', {
			headers: { 'if-none-match': first.headers.get('etag') ?? '' }
		});
		expect(again.status).toBe(304);
	});

	it.each([
		['a docket nobody has', () => '/api/v1/shipments/ZZ-26-9999', 404],
		['a guessed read', () => `/api/v1/reads/${uuid()}`, 404],
		['a guessed report', () => `/api/v1/reports/${uuid()}`, 404],
		['an id that is none', () => '/api/v1/reports/1', 404],
		['a series of no points', () => `/api/v1/traces/${load.traceId}/series?points=none`, 422]
	])('answer %s with code and message', async (_, path, status) => {
		const answer = await visitors.qa.request(path(), { headers: { accept: 'application/json' } });
		expect(answer.status).toBe(status);
	});
});

describe('what changes something by the API', () => {
	const upload = () => {
		const form = new FormData();
		form.append('files', new File(['Time;Temperature °C\n'], 'a.csv', { type: 'text/csv' }));
		return form;
	};
	const changes = () =>
		[
			['/api/v1/shipments', JSON.stringify({}), 'application/json'],
			[`/api/v1/shipments/${load.shipment.number}/reads`, upload(), null],
			[`/api/v1/shipments/${load.shipment.number}/photos`, upload(), null],
			[`/api/v1/shipments/${load.shipment.number}/notes`, upload(), null],
			[`/api/v1/reads/${load.readId}/answers`, JSON.stringify({ choice: 0 }), 'application/json'],
			[`/api/v1/reads/${load.readId}/keep`, JSON.stringify({}), 'application/json']
		] as const;
	const send = (visitor: Visitor, [path, body, type]: ReturnType<typeof changes>[number], origin?: string) =>
		visitor.request(path, {
			method: 'POST',
			body,
			headers: { ...(type ? { 'content-type': type } : {}), ...(origin ? { origin } : {}) }
		});

	it('answers 401 without a session', async () => {
		for (const change of changes())
			expect((await send(new Visitor(product.address), change)).status, change[0]).toBe(401);
	});

	it('is refused to who may not: another role, another firm, another site', async () => {
		for (const change of changes())
			for (const who of ['claims', 'supplier', 'stranger'] as const)
				expect([403, 404, 422], `${who} ${change[0]}`).toContain((await send(visitors[who], change)).status);
		for (const change of changes().slice(1))
			expect((await send(visitors.far, change)).status, `far ${change[0]}`).toBeGreaterThanOrEqual(400);
	});

	it('is refused from a foreign origin, and from none', async () => {
		for (const change of changes())
			for (const origin of ['https://elsewhere.example', 'null']) {
				const answer = await send(visitors.qa, change, origin);
				expect(answer.status, change[0]).toBe(403);
				expect(refusal.parse(await answer.json()).code).toBe('foreign-origin');
			}
	});

	it('says beside each field what is wrong', async () => {
		const answer = await send(visitors.dock, changes()[0]);
		expect(answer.status).toBe(422);
		const { issues } = refusal.parse(await answer.json());
		expect(issues).toMatchObject({ supplierId: 'Choose the supplier.', due: 'When is it due?' });
	});

	it('does nothing to a signed docket', async () => {
		const answer = await send(visitors.dock, changes()[1]);
		expect(answer.status).toBe(409);
		expect(refusal.parse(await answer.json()).code).toBe('already-signed');
	});

	it('opens a docket once, however often the same is sent', async () => {
		const { supplier, lines } = await buildShipment();
		const body = JSON.stringify({
			id: uuid(),
			supplierId: supplier.id,
			due: '2026-04-09T09:30',
			lines: [{ productId: lines[0]?.productId, lot: 'TWICE-1', cases: 10 }]
		});
		const twice = ['/api/v1/shipments', body, 'application/json'] as const;
		const [first, second] = [await send(visitors.dock, twice), await send(visitors.dock, twice)];
		expect(first.status).toBe(200);
		expect(await second.json()).toEqual(await first.json());
	});
});
