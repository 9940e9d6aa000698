import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { complaintsOf, demoPassword, expect, test } from './people';

const samples = join(import.meta.dirname, '../../sample-uploads');
const file = (name: string, content: string | Buffer = readFileSync(join(samples, name))) => ({
	name,
	mimeType: 'application/octet-stream',
	buffer: Buffer.from(content)
});

/** A docket at the door that takes uploads. */
async function openDocket(page: Page): Promise<string> {
	const list = await page.request.get('/api/v1/shipments?stage=at-the-door&q=Salmon');
	const { items }: { items: { number: string }[] } = await list.json();
	return items[0]?.number ?? '';
}

async function readsOf(page: Page, docket: string): Promise<{ state: string; fileName: string }[]> {
	const answer = await page.request.get(`/api/v1/shipments/${docket}/reads`);
	const { reads }: { reads: { state: string; fileName: string }[] } = await answer.json();
	return reads;
}

const unreadable: [string, ReturnType<typeof file>, RegExp][] = [
	['a PDF', file('refused-report.pdf'), /This is a PDF/],
	['a spreadsheet', file('refused-workbook.xlsx'), /This is a spreadsheet\. Export it as CSV/],
	['a signed-out page', file('refused-signed-out.html'), /web page|HTML/i],
	['heads without readings', file('refused-only-heads.csv'), /no readings|no rows/i],
	['JSON cut short', file('refused-cut.json'), /line/],
	['humidity alone', file('refused-humidity.csv'), /temperature/],
	['JSON of endless depth', file('deep.json', '['.repeat(200_000)), /\w+\./],
	['scripts in place of readings', file('x.html', '<script>alert(1)</script>'), /web page|HTML/i]
];

for (const [what, bytes, sentence] of unreadable)
	test(`${what} is refused with a sentence, and nothing of it counts as evidence`, async ({ pageOf }) => {
		const page = await pageOf('dock');
		const docket = await openDocket(page);
		await page.goto(`/shipments/${docket}/reads`, { waitUntil: 'networkidle' });
		await page.locator('input[type=file]').first().setInputFiles(bytes);
		await expect(page.getByText('This file cannot be read.')).toBeVisible();
		await expect(page.getByText(sentence).first()).toBeVisible();
		const reads = await readsOf(page, docket);
		expect(reads.filter(({ fileName }) => fileName === bytes.name).map(({ state }) => state)).not.toContain(
			'kept'
		);
	});

test('an empty file and one of 51 MB are not sent, and the page says why', async ({ pageOf }) => {
	const page = await pageOf('dock');
	const docket = await openDocket(page);
	const before = await readsOf(page, docket);
	await page.goto(`/shipments/${docket}/reads`, { waitUntil: 'networkidle' });
	const choose = page.locator('input[type=file]').first();
	await choose.setInputFiles(file('nothing.csv', ''));
	await expect(page.getByRole('alert')).toContainText('It is empty. Export it again.');
	const huge = test.info().outputPath('huge.csv');
	writeFileSync(huge, Buffer.alloc(51_000_000, '1;2\n'));
	await choose.setInputFiles(huge);
	await expect(page.getByRole('alert')).toContainText('It is larger than 50 MB.');
	expect(await readsOf(page, docket)).toEqual(before);
});

test('51 MB sent past the page are refused by the server with the limit', async ({ pageOf }) => {
	const page = await pageOf('dock');
	const docket = await openDocket(page);
	const before = await readsOf(page, docket);
	await page.goto(`/shipments/${docket}/reads`, { waitUntil: 'networkidle' });
	const answer = await page.evaluate(async (url) => {
		const form = new FormData();
		form.append('files', new File([new Uint8Array(51_000_000)], 'huge.csv'));
		const response = await fetch(url, { method: 'POST', body: form });
		return { status: response.status, body: await response.json() };
	}, `/api/v1/shipments/${docket}/reads`);
	expect(answer.status).toBe(413);
	expect(answer.body).toEqual({ code: 'too-large', message: expect.stringContaining('50 MB') });
	expect(await readsOf(page, docket)).toEqual(before);
});

test('a formula in a file stays text', async ({ pageOf }) => {
	const page = await pageOf('dock');
	const complaints = complaintsOf(page);
	const docket = await openDocket(page);
	const rows = Array.from({ length: 30 }, (_, n) => `2026-04-01T10:${String(n).padStart(2, '0')}:00Z;1.5`);
	const formula = '=HYPERLINK("http://x.example","<img src=x onerror=alert(1)>")';
	await page.goto(`/shipments/${docket}/reads`, { waitUntil: 'networkidle' });
	await page
		.locator('input[type=file]')
		.first()
		.setInputFiles(file(`=cmd()<b>.csv`, [formula, 'Time;Temperature °C', ...rows, ''].join('\n')));
	await expect(page.getByRole('heading', { level: 1 })).toContainText('=cmd()');
	await expect(page.locator('img[src=x]')).toHaveCount(0);
	expect(complaints.all).toEqual([]);
});

test('a form keeps what was typed, says beside the field what is wrong, and writes nothing', async ({
	pageOf
}) => {
	const page = await pageOf('admin');
	await page.goto('/partners/new');
	await page.getByLabel('Name').fill('Half a Firm');
	await page.getByLabel('GLN').fill('9506000050011');
	await page.getByRole('checkbox', { name: /^Supplier/ }).check();
	await page.getByRole('button', { name: 'Add partner' }).click();
	await expect(page.getByText(/check digit/i).last()).toBeVisible();
	await expect(page.getByLabel('Name')).toHaveValue('Half a Firm');
	await expect(page.getByLabel('GLN')).toHaveValue('9506000050011');
	await expect(page.getByRole('checkbox', { name: /^Supplier/ })).toBeChecked();
	await page.goto('/partners?q=Half+a+Firm');
	await expect(page.getByRole('link', { name: 'Half a Firm' })).toHaveCount(0);
});

test.describe('without JavaScript', () => {
	test.use({ javaScriptEnabled: false });

	test('one signs in, writes a note, uploads, and is told of a bad file', async ({ page }) => {
		await page.goto('/sign-in');
		await page.getByLabel('E-mail', { exact: true }).fill('qa@wharfinger.example');
		await page.getByLabel('Password').fill('wrong password');
		await page.getByRole('button', { name: 'Sign in', exact: true }).click();
		await expect(page.getByText('do not belong together')).toBeVisible();
		await expect(page.getByLabel('E-mail', { exact: true })).toHaveValue('qa@wharfinger.example');
		await page.getByLabel('Password').fill(demoPassword);
		await page.getByRole('button', { name: 'Sign in', exact: true }).click();
		await expect(page).toHaveURL(/shipments\/waiting/);
		await page.goto('/settings');
		await page.getByRole('radio', { name: 'Pell Staithe' }).check();
		await page.getByRole('button', { name: 'Work there' }).click();

		const docket = await openDocket(page);
		await page.goto(`/shipments/${docket}`);
		const note = `Read without scripts, ${Date.now()}`;
		await page.getByLabel('Write a note').fill(note);
		await page.getByRole('button', { name: 'Add the note' }).click();
		await expect(page.getByText(note)).toBeVisible();

		await page.goto(`/shipments/${docket}/reads`, { waitUntil: 'networkidle' });
		await page.locator('input[type=file]').first().setInputFiles(file('refused-report.pdf'));
		await page.getByRole('button', { name: 'Upload' }).click();
		await expect(page.getByText('This is a PDF').first()).toBeVisible();
	});
});
