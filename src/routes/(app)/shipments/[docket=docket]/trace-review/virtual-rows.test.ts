import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { rowByKey, scrollToShow, virtualRows } from './virtual-rows';

const room = { count: 50_000, rowPx: 34, heightPx: 408, scrollPx: 0 };

describe('the rows of a long table', () => {
	it.each([
		['begin at the first', {}, { first: 0, end: 19, topPx: 0 }],
		['follow the scrolling', { scrollPx: 34_000 }, { first: 994, end: 1019, topPx: 994 * 34 }],
		[
			'stand where they are, part of one above',
			{ scrollPx: 34_017 },
			{ first: 994, end: 1019, topPx: 994 * 34 }
		],
		['end at the last', { scrollPx: 50_000 * 34 - 408 }, { first: 49_982, end: 50_000, topPx: 49_982 * 34 }],
		['do not go past it', { scrollPx: 9e9 }, { first: 49_982, end: 50_000, topPx: 49_982 * 34 }],
		['are all there where they are few', { count: 5 }, { first: 0, end: 5, topPx: 0, contentPx: 170 }],
		['are none where there are none', { count: 0 }, { first: 0, end: 0, topPx: 0, contentPx: 0 }]
	])('%s', (_, change, expected) => {
		const found = virtualRows({ ...room, ...change });
		expect({ ...found, topPx: Math.round(found.topPx) }).toMatchObject(expected);
	});

	it('are at most two dozen, however many readings there are', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 1, max: 5_000_000 }),
				fc.double({ min: 0, max: 1, noNaN: true }),
				(count, share) => {
					const tallest = Math.min(count * 34, 8_000_000);
					const scrollPx = share * Math.max(0, tallest - 408);
					const { first, end, topPx, contentPx } = virtualRows({ ...room, count, scrollPx });
					expect(end - first).toBeLessThanOrEqual(25);
					expect(contentPx).toBeLessThanOrEqual(8_000_000);
					// What shows is covered, unless the rows end before.
					expect(topPx).toBeLessThanOrEqual(scrollPx + 1e-6);
					if (count * 34 > 408)
						expect(topPx + (end - first) * 34).toBeGreaterThanOrEqual(scrollPx + 408 - 1e-6);
				}
			)
		);
	});

	it('are brought into view by the least scrolling, also past what a browser can lay out', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 1, max: 5_000_000 }),
				fc.double({ min: 0, max: 1, noNaN: true }),
				fc.double({ min: 0, max: 1, noNaN: true }),
				(count, share, target) => {
					const row = Math.min(count - 1, Math.floor(target * count));
					const scrollPx = share * Math.max(0, Math.min(count * 34, 8_000_000) - 408);
					const next = scrollToShow({ ...room, count, scrollPx }, row);
					const { first, topPx } = virtualRows({ ...room, count, scrollPx: next });
					const rowTopPx = topPx + (row - first) * 34;
					expect(rowTopPx).toBeGreaterThanOrEqual(next - 0.5);
					expect(rowTopPx + 34).toBeLessThanOrEqual(next + 408.5);
				}
			)
		);
		expect(scrollToShow({ ...room, scrollPx: 100 }, 5)).toBe(100);
	});
});

describe('the keys of the table', () => {
	it.each([
		['ArrowDown', 10, 11],
		['ArrowUp', 10, 9],
		['PageDown', 10, 21],
		['PageUp', 10, 0],
		['PageUp', 30, 19],
		['Home', 10, 0],
		['End', 10, 99],
		['ArrowDown', 99, 99],
		['ArrowUp', 0, 0],
		['a', 10, null],
		['Tab', 10, null]
	])('%s from row %d leads to %s', (key, row, expected) => {
		expect(rowByKey(key, row, 100, 11)).toBe(expected);
	});
});
