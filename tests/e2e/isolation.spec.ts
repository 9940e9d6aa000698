import { randomUUID } from 'node:crypto';
import type { APIResponse, Page } from '@playwright/test';
import { linkInMail, openMail } from './mailbox';
import { demoPassword, expect, signIn, test } from './people';
import { signInSupplier } from './supplier-room';

test.describe.configure({ mode: 'parallel' });

/** A signed docket with everything a stranger may try to get at. */
interface Target {
	id: string;
	number: string;
	supplier: string;
	contactEmail: string;
	/** Every address below the API that speaks of it. */
	reads: string[];
	/** Words that must stand in no answer to a stranger. */
	secrets: string[];
}

interface DocketAnswer {
	id: string;
	number: string;
	title: string;
	supplier: { id: string; name: string };
	lines: { lot: string }[];
	loggers: { traceId: string | null; readId: string | null }[];
	photos: { id: string }[];
	signatures: { report: { id: string } | null }[];
}

/** Signed dockets of a supplier at the site worked at. */
async function signedOf(qa: Page, supplier: string) {
	const pages = [1, 2].map(async (page) => {
		const list = await qa.request.get(`/api/v1/shipments?stage=done&page=${page}`);
		const { items }: { items: { id: string; number: string; supplier: string; verdict: string }[] } =
			await list.json();
		return items.filter((row) => row.supplier === supplier);
	});
	return (await Promise.all(pages)).flat();
}

/** The newest refused docket of that supplier in the demo, once its report is made. */
async function targetOf(qa: Page, supplier: string): Promise<Target> {
	const refused = ['rejected', 'part'];
	const number = (await signedOf(qa, supplier)).find(({ verdict }) => refused.includes(verdict))?.number;
	expect(number, `a refused docket of ${supplier}`).toBeDefined();
	let docket: DocketAnswer | undefined;
	await expect(async () => {
		docket = await (await qa.request.get(`/api/v1/shipments/${number}`)).json();
		expect(docket?.signatures.every(({ report }) => report !== null)).toBe(true);
	}).toPass();
	if (!docket) throw new Error('no docket');
	const partner = await qa.request.get(`/partners/${docket.supplier.id}`);
	const contactEmail = /[\w.]+@[\w-]+\.example/.exec(await partner.text())?.[0] ?? '';
	const base = '/api/v1';
	const reads = [
		`${base}/shipments/${number}`,
		`${base}/shipments/${number}/reads`,
		`${base}/shipments/${number}/evidence`,
		...docket.photos.map(({ id }) => `${base}/photos/${id}`),
		...docket.signatures.map(({ report }) => `${base}/reports/${report?.id}`),
		...docket.loggers.flatMap(({ traceId, readId }) => [
			...(traceId ? [`${base}/traces/${traceId}/series`, `${base}/traces/${traceId}/readings.csv`] : []),
			...(readId ? [`${base}/reads/${readId}`, `${base}/reads/${readId}/file`] : [])
		])
	];
	const secrets = [docket.supplier.name, docket.title, ...docket.lines.map(({ lot }) => lot)];
	return { id: docket.id, number: docket.number, supplier, contactEmail, reads, secrets };
}

async function refuses(answer: APIResponse, target: Target, allowed: readonly number[]): Promise<void> {
	const what = `${answer.url()} answered ${answer.status()}`;
	expect(allowed, what).toContain(answer.status());
	const body = await answer.text();
	for (const secret of target.secrets) expect(body, what).not.toContain(secret);
}

/** Tries every way in that a signed-in stranger has. */
async function expectNoWayIn(page: Page, target: Target): Promise<void> {
	const closed = [403, 404];
	const origin = new URL(page.url()).origin;
	for (const path of target.reads) await refuses(await page.request.get(path), target, closed);
	const pages = [`/loads/${target.id}`, `/shipments/${target.number}`, `/shipments/${target.number}/sign`];
	for (const path of pages) await refuses(await page.request.get(path), target, closed);
	for (const path of [`/loads/${target.id}/__data.json`, `/shipments/${target.number}/__data.json`]) {
		const answer = await page.request.get(path);
		const body = await answer.text();
		for (const secret of target.secrets) expect(body, path).not.toContain(secret);
	}
	const acts: [string, Record<string, string>][] = [
		[`/loads/${target.id}?/answer`, { kind: 'acknowledge', who: 'A stranger' }],
		[`/shipments/${target.number}?/note`, { text: 'A stranger was here' }],
		[`/shipments/${target.number}/sign`, { password: demoPassword }]
	];
	for (const [path, form] of acts) {
		const headers = { origin, accept: 'text/html' };
		await refuses(await page.request.post(path, { form, headers }), target, [403, 404, 422]);
	}
	const posts = ['reads', 'photos', 'notes'].map((kind) => `/api/v1/shipments/${target.number}/${kind}`);
	for (const path of posts) {
		const file = { name: 'a.csv', mimeType: 'text/csv', buffer: Buffer.from('Time;°C\n') };
		const answer = await page.request.post(path, { multipart: { files: file }, headers: { origin } });
		await refuses(answer, target, [403, 404, 422]);
	}
	for (const path of [`/loads/${randomUUID()}`, `/api/v1/reports/${randomUUID()}`])
		await refuses(await page.request.get(path), target, closed);
	const found = await page.request.get(`/api/v1/search?q=${target.number}`);
	await refuses(found, target, [200, 403]);
	const list = await page.request.get('/loads');
	await refuses(list, target, [200]);
}

test('a supplier’s user reaches its own loads and none of another supplier', async ({ pageOf }) => {
	const [admin, qa, page] = [await pageOf('admin'), await pageOf('qa'), await pageOf(null)];
	const own = await targetOf(qa, 'Olmarisa Berry Growers');
	await signInSupplier(admin, page, 'Olmarisa Berry Growers');
	await page.goto(`/loads/${own.id}`);
	await expect(page.getByText(own.number).first()).toBeVisible();
	await expectNoWayIn(page, await targetOf(qa, 'Skerrin Smokehouse'));
});

test('the link of a notice opens one docket, neither another of its firm nor of another', async ({
	pageOf
}) => {
	const [qa, page] = [await pageOf('qa'), await pageOf(null)];
	const own = await targetOf(qa, 'Skerrin Smokehouse');
	await openMail(qa, own.contactEmail);
	// Pressed while the page still loads, the button may go from under the pointer.
	await page.goto(await linkInMail(qa, '/link/'), { waitUntil: 'networkidle' });
	await page.getByRole('button', { name: 'Open the docket' }).click();
	await expect(page).toHaveURL(/\/loads\/[0-9a-f-]{36}/);
	await expectNoWayIn(page, await targetOf(qa, 'Olmarisa Berry Growers'));

	const opened = page.url().split('/').at(-1);
	for (const { id } of (await signedOf(qa, own.supplier)).filter((one) => one.id !== opened))
		expect((await page.request.get(`/loads/${id}`)).status()).toBe(404);
});

test('the dock cannot sign, and claims cannot upload, write papers or log an arrival', async ({ pageOf }) => {
	const [qa, dock, claims] = [await pageOf('qa'), await pageOf('dock'), await pageOf('claims')];
	const list = await qa.request.get('/api/v1/shipments?q=Blueberries+for+the+weekend');
	const { items }: { items: { number: string }[] } = await list.json();
	const number = items[0]?.number ?? '';
	await dock.goto('/arrivals');
	const headers = { origin: new URL(dock.url()).origin, accept: 'text/html' };
	expect((await dock.request.get(`/shipments/${number}/sign`)).status()).toBe(403);
	const { lines }: { lines: { id: string }[] } = await (
		await qa.request.get(`/api/v1/shipments/${number}`)
	).json();
	const form = {
		...Object.fromEntries(
			lines.flatMap(({ id }, at) => [
				[`lines.${at}.lineId`, id],
				[`lines.${at}.outcome`, 'accept']
			])
		),
		meaning: 'approval',
		password: demoPassword,
		evidenceSha256: '0'.repeat(64)
	};
	expect((await dock.request.post(`/shipments/${number}/sign`, { form, headers })).status()).toBe(403);

	const file = { name: 'a.csv', mimeType: 'text/csv', buffer: Buffer.from('Time;°C\n2026-04-01T00:00Z;1\n') };
	const upload = await claims.request.post(`/api/v1/shipments/${number}/reads`, {
		multipart: { files: file },
		headers
	});
	expect(upload.status()).toBe(403);
	const papers = await claims.request.post('/api/v1/shipments', { data: {}, headers });
	expect([403, 422]).toContain(papers.status());
	await qa.goto(`/shipments/${number}`);
	await expect(qa.locator('#signature')).toContainText('Nobody has signed yet');
});

test('nobody without a session gets anything but the way to sign in', async ({ pageOf }) => {
	const [qa, page] = [await pageOf('qa'), await pageOf(null)];
	const target = await targetOf(qa, 'Skerrin Smokehouse');
	for (const path of target.reads) {
		const answer = await page.request.get(path);
		expect(answer.status(), path).toBe(401);
		expect(await answer.json()).toEqual({ code: 'no-session', message: 'Sign in first.' });
	}
	for (const path of [`/shipments/${target.number}`, `/loads/${target.id}`, '/settings/users']) {
		const answer = await page.request.get(path, { maxRedirects: 0 });
		expect(answer.status(), path).toBe(303);
		expect(answer.headers().location).toContain('/sign-in?to=');
	}
});

test('switching a user off ends an open session at once', async ({ pageOf }) => {
	const [admin, page] = [await pageOf('admin'), await pageOf(null)];
	const email = `leaver.${Date.now().toString(36)}@wharfinger.example`;
	const password = 'a long enough pass phrase';
	await admin.goto('/settings/users/new');
	await admin.getByLabel('E-mail').fill(email);
	await admin.getByLabel('Name').fill('Leaver');
	await admin.getByRole('checkbox', { name: /^Claims/ }).check();
	await admin.getByRole('checkbox', { name: 'Pell Staithe' }).check();
	await admin.getByRole('button', { name: 'Send invitation' }).click();
	await expect(admin.getByRole('heading', { level: 1, name: 'Leaver' })).toBeVisible();
	const account = admin.url();
	await openMail(admin, email);
	await page.goto(await linkInMail(admin, '/invitation/'));
	await page.getByLabel('Password', { exact: true }).fill(password);
	await page.getByLabel('The same once more').fill(password);
	await page.getByRole('button', { name: 'Set password and sign in' }).click();
	await expect(page.getByRole('link', { name: 'Claims' })).toBeVisible();

	await admin.goto(account);
	await admin.getByRole('button', { name: 'Switch off' }).click();
	await expect(admin.getByRole('button', { name: 'Switch on' })).toBeVisible();
	await page.goto('/claims');
	await expect(page).toHaveURL(/sign-in/);
	expect((await page.request.get('/api/v1/shipments')).status()).toBe(401);
	await expect(signIn(page, email, password)).rejects.toThrow();
	await expect(page.getByText('This account has been switched off')).toBeVisible();
});
