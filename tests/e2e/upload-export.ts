import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { DateTime } from 'luxon';
import { story } from './load-story';
import { expect } from './people';

const path = join(import.meta.dirname, '../../sample-uploads/cod-two-probes.csv');
const stamp = /^\d{4}-\d\d-\d\d \d\d:\d\d:\d\d/gm;
const utc = (text: string) => DateTime.fromSQL(text, { zone: 'utc' });

/** The sample as its logger would have written it on this journey: the same readings, days later. */
function sample() {
	const text = readFileSync(path, 'utf8');
	const last = utc(text.match(stamp)?.at(-1) ?? '');
	const later = story.lastReadingAt.diff(last);
	const moved = text.replace(stamp, (at) => utc(at).plus(later).toFormat('yyyy-MM-dd HH:mm:ss'));
	return { name: 'cod-two-probes.csv', mimeType: 'text/csv', buffer: Buffer.from(moved) };
}

/** Uploads an export that cannot say which probe rode with the goods, answers, looks at what was understood, keeps it. */
export async function uploadAndKeep(page: Page, docket: string): Promise<void> {
	await page.goto(`/shipments/${docket}/reads`, { waitUntil: 'networkidle' });
	await page.getByLabel('Choose files').setInputFiles(sample());
	await expect(
		page.getByRole('heading', { name: 'Which column is the temperature of the goods?' })
	).toBeVisible();
	await page.getByRole('radio', { name: /Probe B/ }).check();
	await page.getByRole('button', { name: /^Use Probe B|^Use / }).click();

	const understood = page.getByRole('region', { name: 'What was understood' });
	const { lastReadingAt } = story;
	for (const at of [lastReadingAt.minus({ hours: 24, minutes: 45 }), lastReadingAt])
		await expect(understood).toContainText(at.setLocale('en').toFormat('ccc d LLL HH:mm'));
	await expect(understood).toContainText(/CES?T/);
	await expect(understood).toContainText('every 15 min');
	await expect(page.getByRole('region', { name: 'Channels' })).toContainText('Probe B');
	await page.getByLabel('Serial').fill(story.logger);
	await page.getByRole('radio', { name: 'In the product' }).check();
	await page.getByRole('button', { name: 'Keep this read' }).click();
	await expect(page).toHaveURL(new RegExp(`/shipments/${docket}`));
}

/** The same bytes again are recognised, not doubled. */
export async function uploadAgain(page: Page, docket: string): Promise<void> {
	await page.goto(`/shipments/${docket}/reads`, { waitUntil: 'networkidle' });
	await page.getByLabel('Choose files').setInputFiles(sample());
	await expect(page.getByRole('heading', { level: 1, name: 'cod-two-probes.csv' })).toBeVisible();
	await page.goto(`/shipments/${docket}/reads`, { waitUntil: 'networkidle' });
	await expect(page.getByRole('link', { name: 'cod-two-probes.csv' })).toHaveCount(1);
}
