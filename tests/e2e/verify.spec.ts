import { createHash } from 'node:crypto';
import type { Page, Request } from '@playwright/test';
import { expect, phone, test } from './people';

/** A sealed report of the demo, as its supplier has it. */
async function someReport(page: Page): Promise<Buffer> {
	await page.goto('/shipments?state=done');
	const answer = await page.request.get('/api/v1/shipments?view=board');
	expect(answer.ok()).toBe(true);
	for (const link of await page.locator('main a[href^="/shipments/"]').all()) {
		const number = (await link.getAttribute('href'))?.match(/[A-Z]{2}-\d{2}-\d+/)?.[0];
		if (!number) continue;
		const docket = await (await page.request.get(`/api/v1/shipments/${number}`)).json();
		const report = docket.signatures.at(-1)?.report;
		if (report) return (await page.request.get(`/api/v1/reports/${report.id}`)).body();
	}
	throw new Error('The demo has no report.');
}

async function drop(page: Page, name: string, bytes: Buffer): Promise<Request[]> {
	const sent: Request[] = [];
	page.on('request', (request) => sent.push(request));
	await page.goto('/verify');
	await page.getByLabel('Choose a file').setInputFiles({ name, mimeType: 'application/pdf', buffer: bytes });
	await expect(page).toHaveURL(/\/verify\/[0-9a-f]{64}/);
	return sent;
}

test('a report dropped on the public page is known by its hash, and its bytes never leave the browser', async ({
	pageOf
}) => {
	const report = await someReport(await pageOf('qa'));
	const sha256 = createHash('sha256').update(report).digest('hex');
	const stranger = await pageOf(null, phone);

	const sent = await drop(stranger, 'anything.pdf', report);
	await expect(stranger.getByRole('status')).toContainText('Genuine and current');
	await expect(stranger).toHaveURL(new RegExp(`/verify/${sha256}`));
	for (const request of sent) {
		expect(request.method(), request.url()).toBe('GET');
		expect(request.postData(), request.url()).toBeNull();
	}

	const changed = Buffer.from(report);
	changed[changed.length - 10] = (changed[changed.length - 10] ?? 0) ^ 1;
	await drop(stranger, 'report.pdf', changed);
	await expect(stranger.getByRole('status')).toContainText('Not known here');

	await stranger.goto('/verify');
	await stranger
		.getByLabel('Choose a file')
		.setInputFiles({ name: 'report.pdf', mimeType: 'application/pdf', buffer: Buffer.from('<html>') });
	await expect(stranger.getByText('That is not a PDF.')).toBeVisible();
});
