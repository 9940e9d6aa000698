import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { complaintsOf, expect, phone, test } from './people';

const folder = join(import.meta.dirname, '../../sample-uploads');

/** Ten exports of ten kinds: seven that are read or ask, three that cannot be read. */
const names = [
	'bananas.csv.gz',
	'berries-german.csv',
	'cheese-french-1252.csv',
	'dairy-nested.json',
	'frozen-utf16-tabs.txt',
	'grapes-which-day.csv',
	'herbs-no-unit.csv',
	'refused-report.pdf',
	'refused-humidity.csv',
	'refused-workbook.xlsx'
];

/** Bytes that are on no docket yet: an empty line at the end changes no reading, nor what a refused file is. */
const files = () =>
	names.map((name) => {
		const bytes = readFileSync(join(folder, name));
		const isText = /\.(csv|json)$/.test(name);
		const buffer = isText ? Buffer.concat([bytes, Buffer.from('\n')]) : bytes;
		return { name, mimeType: 'application/octet-stream', buffer };
	});

/** Tab until the element that has the focus is named so. */
async function tabTo(page: Page, name: RegExp): Promise<void> {
	for (let pressed = 0; pressed < 60; pressed++) {
		await page.keyboard.press('Tab');
		const focused = await page.evaluate(() => {
			const { activeElement } = document;
			const label = activeElement instanceof HTMLInputElement ? activeElement.labels?.[0] : null;
			return (label ?? activeElement)?.textContent?.replace(/\s+/g, ' ').trim() ?? '';
		});
		if (name.test(focused)) return;
	}
	throw new Error(`Nothing that takes the focus is named ${String(name)}.`);
}

/** A load on its way, which takes exports still; the last of the list, so that other stories keep theirs. */
async function openDocket(page: Page): Promise<string> {
	const answer = await page.request.get('/api/v1/shipments?stage=expected');
	const { items }: { items: { number: string }[] } = await answer.json();
	const number = items.at(-1)?.number;
	if (!number) throw new Error('No load is expected in the demo.');
	return number;
}

test('ten exports go up from a phone by keyboard alone, each with a state of its own', async ({ pageOf }) => {
	const page = await pageOf('dock', { ...phone, isMobile: false });
	const complaints = complaintsOf(page);
	const number = await openDocket(page);
	await page.goto(`/shipments/${number}/reads`, { waitUntil: 'networkidle' });

	await tabTo(page, /^Choose files$/);
	const chooser = page.waitForEvent('filechooser');
	await page.keyboard.press('Space');
	await (await chooser).setFiles(files());

	const list = page.getByRole('list', { name: 'Files of this upload' });
	await expect(list.getByRole('listitem').filter({ hasText: /\.(csv|json|txt|pdf|xlsx|gz)/ })).toHaveCount(
		10
	);
	await expect(page.getByText(/^10 of 10 files sent\./)).toBeVisible({ timeout: 30_000 });
	const rowOf = (name: string) => list.getByRole('listitem').filter({ hasText: name }).first();
	await expect(rowOf('refused-report.pdf')).toContainText('This is a PDF.');
	await expect(rowOf('refused-workbook.xlsx')).toContainText('This is a spreadsheet.');
	await expect(rowOf('herbs-no-unit.csv')).toContainText(/Will ask: .*°C or °F/);
	await expect(rowOf('berries-german.csv')).toContainText(/readings, every/);
	await expect(rowOf('frozen-utf16-tabs.txt')).toContainText('Read, not kept yet');

	for (const target of await list.getByRole('link').all())
		expect((await target.boundingBox())?.height).toBeGreaterThanOrEqual(48);
	const overflow = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
	expect(overflow).toBeLessThanOrEqual(0);

	await tabTo(page, /^Answer, herbs-no-unit.csv$/);
	await page.keyboard.press('Enter');
	await expect(page.getByRole('heading', { level: 1 })).toContainText('°C or °F?');
	await tabTo(page, /°C/);
	await page.keyboard.press('Space');
	await tabTo(page, /^Use °C$/);
	await page.keyboard.press('Enter');
	await expect(page.getByRole('region', { name: /How it was read/ })).toContainText('as answered here');
	await expect(page.getByText('Answered for this file: °C')).toBeVisible();
	await tabTo(page, /^Ask about this file again$/);
	await page.keyboard.press('Enter');
	await expect(page.getByRole('heading', { level: 1 })).toContainText('°C or °F?');
	expect(complaints.all).toEqual([]);
});

test('a broken network keeps a file back and loses nothing', async ({ pageOf }) => {
	const page = await pageOf('dock', { ...phone, isMobile: false });
	const number = await openDocket(page);
	await page.goto(`/shipments/${number}/reads`, { waitUntil: 'networkidle' });
	await page.context().setOffline(true);
	const rows = ['time,celsius', ...[0, 1, 2, 3].map((i) => `2026-04-03T10:${i}0:00Z,${4 + i}`)];
	const buffer = Buffer.from(`${rows.join('\n')}\n# ${Math.random()}\n`);
	await page.getByLabel('Choose files').setInputFiles([
		{ name: 'first.csv', mimeType: 'text/csv', buffer },
		{ name: 'second.csv', mimeType: 'text/csv', buffer: Buffer.concat([buffer, Buffer.from('\n')]) }
	]);
	await expect(page.getByText('2 wait for the network.')).toBeVisible();
	await page.context().setOffline(false);
	await expect(page.getByText(/^2 of 2 files sent\./)).toBeVisible();
});
