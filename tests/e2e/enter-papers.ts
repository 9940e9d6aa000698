import type { Page } from '@playwright/test';
import { story } from './load-story';
import { expect } from './people';

/** Opens the docket of the story by the form. @returns its number */
export async function openDocket(page: Page): Promise<string> {
	await page.goto('/shipments/new');
	const papers = page.getByRole('region', { name: /Papers$/ });
	await papers.getByLabel('Supplier').selectOption({ label: story.supplier.name });
	await papers.getByLabel('Carrier').selectOption({ label: story.carrier });
	await papers.getByLabel('Bill of lading').fill(story.bill);
	await papers.getByLabel('Due at Pell Staithe').fill(story.due);
	await papers.getByLabel('Seal').fill(story.seal);

	const line = page.getByRole('group', { name: 'Line 1' });
	await line.getByLabel('Product').selectOption({ label: story.product });
	await line.getByLabel('Lot').fill(story.lot);
	await line.getByLabel('Cases').fill('120');
	await line.getByLabel('Pallets').fill('3');
	await line.getByLabel('Value').fill('14160');

	for (const [nth, to, planned] of [
		[1, story.supplier.name, story.departed],
		[2, story.carrier, story.collected]
	] as const) {
		const handover = page.getByRole('group', { name: `Handover ${nth}` });
		await handover.getByLabel('To', { exact: true }).selectOption({ label: to });
		await handover.getByLabel('Planned').fill(planned);
		await handover.getByLabel('Set-point').fill('0');
	}
	const logger = page.getByRole('group', { name: 'Logger 1' });
	await logger.getByLabel('Serial').fill(story.logger);
	await logger.getByLabel('With line').fill('1');
	await logger.getByLabel('Rides').selectOption({ label: 'In the product' });

	await page.getByRole('button', { name: 'Open the docket' }).click();
	await expect(page).toHaveURL(/\/shipments\/PS-\d\d-\d+$/);
	return page.url().split('/').at(-1) ?? '';
}
