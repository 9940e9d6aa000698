import type { Page } from '@playwright/test';
import { expect } from './people';

/** QA on the docket: every reading as a table, a reading from there on the chart and back, a trim tried and put back. */
export async function reviewTrace(page: Page, readings: number): Promise<void> {
	const trace = page.locator('#trace');
	await trace.getByText('Every reading as a table').click();
	const table = trace.getByRole('grid');
	await expect(table).toHaveAttribute('aria-rowcount', String(readings + 1));
	expect(await table.getByRole('row').count()).toBeLessThan(40);
	await table.focus();
	await page.keyboard.press('End');
	await expect(table.getByRole('row', { selected: true })).toHaveAttribute(
		'aria-rowindex',
		String(readings + 1)
	);
	await page.keyboard.press('Enter');
	await expect(trace.getByText(/^line [\d,]+$/)).toBeVisible();

	await page.keyboard.press('Space');
	const chart = trace.getByRole('slider', { name: 'Trace' });
	await expect(chart).toBeFocused();
	await expect(chart).toHaveAttribute('aria-valuenow', String(readings - 1));
	await trace.getByRole('button', { name: 'Show its row' }).click();
	await expect(table).toBeFocused();

	const end = trace.getByRole('slider', { name: 'Custody window ends' });
	const before = await end.getAttribute('aria-valuetext');
	await end.focus();
	await page.keyboard.press('Shift+ArrowLeft');
	await expect(end).toHaveAttribute('aria-valuetext', /, 10 readings left out$/);
	await expect(trace.getByText('Not sent yet.', { exact: true })).toBeVisible();
	await trace.getByRole('button', { name: 'Put it back' }).click();
	await expect(end).toHaveAttribute('aria-valuetext', before ?? '');
}
