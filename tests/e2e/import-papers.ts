import type { Page } from '@playwright/test';
import { story } from './load-story';
import { expect } from './people';

const head = 'load;supplier;carrier;waybill;due;product;lot;cases;pallets';
const row = (load: string, product: string, cases: string) =>
	[load, story.supplier.name, story.carrier, `${load}-${story.mark}`, '2026-04-16 08:00', product]
		.concat(`LOT-${load}`, cases, '2')
		.join(';');

function file(rows: string[]) {
	return {
		name: 'notices.csv',
		mimeType: 'text/csv',
		buffer: Buffer.from([head, ...rows, ''].join('\n'))
	};
}

/** Advance notices from a file: faults are shown by row before anything is written, then the good file opens dockets. */
export async function importPapers(page: Page): Promise<void> {
	await page.goto('/shipments/import', { waitUntil: 'networkidle' });
	const choose = page.getByLabel('Choose a file', { exact: true });
	const good = [
		row('N1', story.product, '40'),
		row('N1', story.product, '60'),
		row('N2', story.product, '10')
	];
	await choose.setInputFiles(file([...good, row('N3', 'Nothing of the kind', 'many')]));
	const faults = page.getByRole('table', { name: 'Faults of the file' });
	await expect(faults.getByRole('row', { name: /^5 product/ })).toBeVisible();
	await expect(faults.getByRole('row', { name: /^5 cases/ })).toBeVisible();
	await expect(page.getByText('Nothing has been written yet.')).toBeVisible();

	await choose.setInputFiles(file(good));
	await expect(faults).toHaveCount(0);
	await page.getByRole('button', { name: 'Import 2 loads' }).click();
	await expect(page.getByRole('region', { name: 'Opened' }).getByRole('link', { name: /^PS-/ })).toHaveCount(
		2
	);
}
