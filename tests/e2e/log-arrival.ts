import type { Page } from '@playwright/test';
import { DateTime } from 'luxon';
import { samplePhoto } from '../../src/lib/server/photos/sample-photo';
import { clockAt } from './load-story';
import { expect } from './people';

/** A few strokes, as a driver signs. */
async function draw(page: Page): Promise<void> {
	const pad = page.getByLabel('Field to draw the driver’s signature in');
	await pad.scrollIntoViewIfNeeded();
	const box = await pad.boundingBox();
	if (!box) throw new Error('There is no field to sign in.');
	await page.mouse.move(box.x + 20, box.y + 40);
	await page.mouse.down();
	for (const [right, down] of [
		[60, 20],
		[90, 80],
		[140, 30]
	] as const)
		await page.mouse.move(box.x + right, box.y + down, { steps: 4 });
	await page.mouse.up();
	await expect(page.getByText('Drawn.')).toBeVisible();
}

/** The dock writes down what it sees at the door: one photograph, counts, pulp, the seal, the driver's name and hand. */
export async function logArrival(page: Page, docket: string): Promise<void> {
	await page.goto(`/shipments/${docket}/arrival`, { waitUntil: 'networkidle' });
	await page
		.getByLabel('Choose files')
		.setInputFiles({ name: 'door.jpg', mimeType: 'image/jpeg', buffer: Buffer.from(samplePhoto) });
	await expect(page.getByText('1 kept.')).toBeVisible();

	// After the spec was signed, which holds from that moment; a clock may run a few minutes ahead.
	await page.getByLabel('Arrived').fill(clockAt(DateTime.now().plus({ minutes: 5 })));
	await page.getByLabel('Set-point').fill('0');
	await page.getByLabel('Return air').fill('1,4');
	await page.getByRole('radio', { name: /^Intact, as on the papers/ }).check();
	await page.getByLabel('Received').fill('118');
	const pulp = page.getByRole('group', { name: 'Reading 1' });
	await pulp.getByLabel('Temperature').fill('38');
	await pulp.getByLabel('Position').fill('tail, left');
	await pulp.getByLabel('Instrument').fill('probe 4');
	await page.getByLabel('Driver’s name').fill('Jos Tarn');
	await draw(page);
	await page.getByRole('button', { name: 'Log this arrival' }).click();
	// 38 °C in a chilled load is more likely 38 °F: asked, and nothing typed is lost.
	await expect(page.getByText('Did you mean °F?')).toBeVisible();
	await expect(page.getByLabel('Driver’s name')).toHaveValue('Jos Tarn');
	await pulp.getByLabel('Unit', { exact: true }).selectOption({ label: '°F' });
	await page.getByRole('button', { name: 'Log this arrival' }).click();
	await expect(page).toHaveURL(new RegExp(`/shipments/${docket}$`));
}
