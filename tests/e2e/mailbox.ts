import { expect, type Page } from '@playwright/test';

/** Opens the newest mail to an address in the local mailbox, once it has come. */
export async function openMail(page: Page, to: string): Promise<void> {
	const row = page.getByRole('row').filter({ hasText: to }).first();
	await expect(async () => {
		await page.goto('/mailbox');
		await expect(row).toBeVisible({ timeout: 500 });
	}).toPass();
	await row.getByRole('link').click();
	await expect(page.getByRole('heading', { name: 'Its plain-text part' })).toBeVisible();
}

/** The address behind the one link of the open mail that leads to a page of ours. */
export async function linkInMail(page: Page, path: '/invitation/' | '/link/'): Promise<string> {
	const href = await page.locator(`a[href*="${path}"]`).first().getAttribute('href');
	return href ?? '';
}
