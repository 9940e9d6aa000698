import axe from 'axe-core';
import type { Page } from '@playwright/test';
import { places, test } from './every-page';
import { expect } from './people';

test.describe.configure({ mode: 'parallel' });

declare global {
	interface Window {
		axe: typeof axe;
	}
}

const wide = { width: 1440, height: 900 };
const narrow = { width: 390, height: 844 };
const looks = [
	{ name: 'wide and light', viewport: wide, colorScheme: 'light' },
	{ name: 'narrow and dark', viewport: narrow, colorScheme: 'dark' },
	{ name: 'wide and dark', viewport: wide, colorScheme: 'dark' },
	{ name: 'narrow and light', viewport: narrow, colorScheme: 'light' }
] as const;
/** The pages the work is done on are looked at in all four. */
const inAllLooks = new Set(['arrivals', 'a docket at QA', 'reads', 'signing', 'a load of a supplier']);
const rules = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];

/** What axe finds in the look of the moment: the rule and where, so that a failure reads as a list of what to mend. */
function findings(page: Page): Promise<string[]> {
	return page.evaluate(async (values) => {
		// A mail stands in a sandboxed frame that runs no script, ours no more than its sender's.
		const context = { exclude: [['iframe']] };
		const { violations } = await window.axe.run(context, {
			runOnly: { type: 'tag', values },
			resultTypes: ['violations'],
			elementRef: false
		});
		return violations.flatMap(({ id, impact, nodes }) =>
			nodes.map(({ target, failureSummary }) => `${impact} ${id}: ${target.join(' ')}: ${failureSummary}`)
		);
	}, rules);
}

/** Elements that reach beyond the right edge while the page itself can be scrolled sideways. */
function sideways(page: Page): Promise<string[]> {
	return page.evaluate(() => {
		const { scrollWidth, clientWidth } = document.documentElement;
		if (scrollWidth <= clientWidth) return [];
		const isHeld = ({ parentElement: around }: Element): boolean =>
			around !== null &&
			around !== document.body &&
			(getComputedStyle(around).overflowX !== 'visible' || isHeld(around));
		return [...document.querySelectorAll('body *')]
			.filter((element) => element.getBoundingClientRect().right > clientWidth + 1 && !isHeld(element))
			.slice(0, 5)
			.map(({ tagName, className, textContent }) => `${tagName} ${className} ${textContent?.slice(0, 40)}`);
	});
}

const softly = expect.configure({ soft: true });

for (const place of places) {
	test(`${place.name}: open to everybody, silent, no wider than its window`, async ({ tourOf, found }) => {
		const { page, complaints } = await tourOf(place.as);
		await page.setViewportSize(wide);
		const path = typeof place.path === 'string' ? place.path : place.path(found);
		const answer = await page.goto(path, { waitUntil: 'networkidle' });
		expect(answer?.status()).toBe(200);
		expect(new URL(page.url()).pathname).toBe(path.split('?')[0]);

		await page.evaluate(axe.source);
		for (const look of inAllLooks.has(place.name) ? looks : looks.slice(0, 2)) {
			await page.emulateMedia({ colorScheme: look.colorScheme, reducedMotion: 'reduce' });
			await page.setViewportSize(look.viewport);
			// Asked again: colours are on their way from one scheme to the other, and charts to their new width.
			await softly.poll(() => findings(page), { message: look.name }).toEqual([]);
			await softly.poll(() => sideways(page), { message: look.name }).toEqual([]);
		}
		await page.setViewportSize({ width: 360, height: 780 });
		await expect.poll(() => sideways(page), { message: 'at 360 px' }).toEqual([]);
		expect(complaints.all).toEqual([]);
	});
}
