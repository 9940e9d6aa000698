import { readFileSync } from 'node:fs';
import type { Page } from '@playwright/test';
import { demoPassword, expect } from './people';

/** QA rejects the first line of a docket, with a wrong password first, and signs. */
export async function rejectAndSign(page: Page, docket: string): Promise<void> {
	await page.goto(`/shipments/${docket}`);
	await page.getByRole('link', { name: 'Sign disposition' }).click();
	const line = page.getByRole('group', { name: 'Disposition of line 1' });
	await line.getByRole('radio', { name: 'Reject' }).check();
	const reason = page.getByLabel('Reason, printed on the report').filter({ visible: true });
	await reason.fill('Warm from the first reading on.');
	await page.getByLabel('Where the goods go').selectOption({ label: 'Returned' });
	await page.getByLabel('Your reasons, printed on the report').fill('Probe B rode in the product.');
	await page.getByRole('radio', { name: /^Approval/ }).check();
	await expect(page.getByRole('checkbox', { name: /^Notice to/ })).toBeChecked();

	// The first signature of a session shows every component.
	await page.getByLabel('Your e-mail').fill('qa@wharfinger.example');
	await page.getByLabel('Password').fill('not-my-password');
	await page.getByRole('button', { name: 'Sign as Ruth Calloway' }).click();
	await expect(
		page.getByText('That is not your password. Nothing was signed.', { exact: true })
	).toBeVisible();
	await expect(reason).toHaveValue('Warm from the first reading on.');

	await page.getByLabel('Password').fill(demoPassword);
	await page.getByRole('button', { name: 'Sign as Ruth Calloway' }).click();
	await expect(page).toHaveURL(new RegExp(`/shipments/${docket}(#|$)`));
}

/** The bytes behind a link that downloads. */
export async function downloaded(
	page: Page,
	press: () => Promise<void>
): Promise<{ name: string; bytes: Buffer }> {
	const [download] = await Promise.all([page.waitForEvent('download'), press()]);
	return { name: download.suggestedFilename(), bytes: readFileSync(await download.path()) };
}
