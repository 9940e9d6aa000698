import type { Page } from '@playwright/test';
import { linkInMail, openMail } from './mailbox';
import { expect } from './people';

let counter = 0;

/**
 * Signs a supplier's user of that firm in, as one does: an admin gives access, and the link in the mail is used.
 * Every call makes somebody new, so that no test uses up another's link.
 * @returns the user's e-mail address
 */
export async function signInSupplier(admin: Page, page: Page, firm: string): Promise<string> {
	const email = `guest.${Date.now().toString(36)}.${process.pid}.${++counter}@firm.example`;
	await admin.goto('/settings/users/new');
	await admin.getByLabel('E-mail').fill(email);
	await admin.getByLabel('Name').fill('Guest of a firm');
	await admin.getByRole('checkbox', { name: /^Supplier/ }).check();
	await admin.getByLabel('Firm, for a supplier’s user').selectOption({ label: firm });
	await admin.getByRole('button', { name: 'Send invitation' }).click();
	await expect(admin.getByRole('heading', { level: 1, name: 'Guest of a firm' })).toBeVisible();
	await openMail(admin, email);
	await page.goto(await linkInMail(admin, '/link/'), { waitUntil: 'networkidle' });
	await page.getByRole('button', { name: 'Sign in' }).click();
	await expect(page).toHaveURL(/\/loads/);
	return email;
}
