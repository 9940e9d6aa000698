import { demoPassword, expect } from './people';
import type { Page } from '@playwright/test';
import { story } from './load-story';

/** An admin enters a supplier and who there hears of excursions. */
export async function enterSupplier(page: Page): Promise<void> {
	await page.goto('/partners/new');
	await page.getByLabel('Name').fill(story.supplier.name);
	await page.getByLabel('Country').fill('GB');
	await page.getByRole('checkbox', { name: /^Supplier/ }).check();
	await page.getByRole('button', { name: 'Add partner' }).click();
	await expect(page.getByRole('heading', { level: 1, name: story.supplier.name })).toBeVisible();

	const contact = page.locator('#contact-form');
	await contact.getByLabel('Name').fill(story.supplier.contact);
	await contact.getByLabel('E-mail').fill(story.supplier.email);
	await contact.getByLabel('Duty').fill('quality');
	await contact.getByRole('button', { name: 'Add contact' }).click();
	await expect(page.getByRole('row', { name: new RegExp(story.supplier.contact) })).toContainText('notified');
}

export async function enterLogger(page: Page): Promise<void> {
	await page.goto('/settings/loggers/new');
	await page.getByLabel('Serial').fill(story.logger);
	await page.getByLabel('Accuracy, ±').fill('0.5');
	await page.getByLabel('Calibration due').fill('2027-05-01');
	await page.getByRole('button', { name: 'Add logger' }).click();
	await expect(page.getByRole('heading', { level: 1, name: story.logger })).toBeVisible();
}

/** The figures of a lean fish in ice: 14 d at 0 °C, square root with Tmin −10 °C (FAO Technical Paper 348). */
const figures: Record<string, string> = {
	'Reference temperature, °C': '0',
	'Full life at the reference temperature, days': '14',
	'Tmin, °C': '-10',
	'Valid from, °C': '-1',
	'Valid to, °C': '15',
	'Source 1': 'FAO Fisheries Technical Paper 348, 6.1',
	'Upper limit, °C': '2',
	'Upper limit, grace each event, minutes': '30',
	'Upper limit, grace in all, minutes': '60',
	'Upper limit, ends when back by, degrees': '0.2',
	'Upper limit, major from, hours and minutes': '1:00',
	'Upper limit, critical from, hours and minutes': '3:00',
	'Life needed at the dock, days': '12.5',
	'Opening balance when none is declared, days': '1'
};

/** A product with its first spec, drafted, signed and in force. */
export async function enterProduct(page: Page): Promise<void> {
	await page.goto('/specs/new');
	await page.getByLabel('Product').fill(story.product);
	await page.getByLabel('Family').fill('fish');
	await page.getByLabel('Counted in').fill('box');
	await page.getByRole('button', { name: 'Add product' }).click();
	await expect(page.getByRole('heading', { level: 1, name: story.product })).toBeVisible();

	await page.getByRole('radio', { name: /Square root/i }).check();
	for (const [label, value] of Object.entries(figures))
		await page.getByLabel(label, { exact: true }).fill(value);
	await page.getByRole('button', { name: /^Save (as )?draft/ }).click();
	await expect(page.getByLabel('Why this version')).toBeVisible();
	await page.getByLabel('Why this version').fill('first version');
	await page.getByLabel('Your e-mail').fill('admin@wharfinger.example');
	await page.getByLabel('Password').fill(demoPassword);
	await page.getByRole('button', { name: 'Sign version 1' }).click();
	await expect(page.getByRole('row', { name: /^v1 / })).toContainText('Hanneke Pryce');
}
