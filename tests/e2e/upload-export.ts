import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { story } from './load-story';
import { expect } from './people';

const sample = join(import.meta.dirname, '../../sample-uploads/cod-two-probes.csv');

/** Uploads an export that cannot say which probe rode with the goods, answers, looks at what was understood, keeps it. */
export async function uploadAndKeep(page: Page, docket: string): Promise<void> {
	await page.goto(`/shipments/${docket}/reads`);
	await page.getByLabel('Choose files').setInputFiles(sample);
	await expect(
		page.getByRole('heading', { name: 'Which column is the temperature of the goods?' })
	).toBeVisible();
	await page.getByRole('radio', { name: /Probe B/ }).check();
	await page.getByRole('button', { name: /^Use Probe B|^Use / }).click();

	const understood = page.getByRole('region', { name: 'What was understood' });
	await expect(understood).toContainText('Tue 14 Apr 12:00');
	await expect(understood).toContainText('Wed 15 Apr 12:45');
	await expect(understood).toContainText('CEST');
	await expect(understood).toContainText('every 15 min');
	await expect(page.getByRole('region', { name: 'Channels' })).toContainText('Probe B');
	await page.getByLabel('Serial').fill(story.logger);
	await page.getByRole('radio', { name: 'In the product' }).check();
	await page.getByRole('button', { name: 'Keep this read' }).click();
	await expect(page).toHaveURL(new RegExp(`/shipments/${docket}`));
}

/** The same bytes again are recognised, not doubled. */
export async function uploadAgain(page: Page, docket: string): Promise<void> {
	await page.goto(`/shipments/${docket}/reads`);
	await page.getByLabel('Choose files').setInputFiles(sample);
	await expect(page.getByRole('heading', { level: 1, name: 'cod-two-probes.csv' })).toBeVisible();
	await page.goto(`/shipments/${docket}/reads`);
	await expect(page.getByRole('link', { name: 'cod-two-probes.csv' })).toHaveCount(1);
}
