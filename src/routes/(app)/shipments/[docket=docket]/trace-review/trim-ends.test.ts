import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { endByKey, endsAfter, reachOf, stretchTo } from './trim-ends';

const minute = 60_000;
/** Every ten minutes from 0 to 90. */
const times = Array.from({ length: 10 }, (_, i) => i * 10 * minute);
const minutes = (stretch: { fromMs: number; toMs: number } | null) =>
	stretch && [stretch.fromMs / minute, stretch.toMs / minute];

describe('an end of the custody window that is moved', () => {
	it.each([
		['from', 0, null],
		['from', 1, [0, 5]],
		['from', 4, [0, 35]],
		['from', 99, [0, 75]],
		['from', -5, null],
		['to', 9, null],
		['to', 8, [85, 90]],
		['to', 1, [15, 90]],
		['to', -3, [15, 90]],
		['to', 99, null]
	] as const)('%s to reading %d leaves out %j', (end, index, expected) => {
		expect(minutes(stretchTo(times, end, index))).toEqual(expected);
	});

	it('is on whole seconds where minutes are too coarse, and between readings wherever they are', () => {
		expect(stretchTo([0, 30_000, 60_000, 90_000], 'from', 1)).toEqual({ fromMs: 0, toMs: 15_000 });
		expect(stretchTo([0, 400, 800, 1200], 'from', 2)).toEqual({ fromMs: 0, toMs: 600 });
		const rising = fc.uniqueArray(fc.integer({ min: 0, max: 1e9 }), { minLength: 3, maxLength: 40 });
		fc.assert(
			fc.property(rising, fc.nat(50), fc.constantFrom('from' as const, 'to' as const), (some, index, end) => {
				const sorted = some.map((ms) => ms * 2).sort((a, b) => a - b);
				const stretch = stretchTo(sorted, end, index);
				const { least, most } = reachOf(sorted, end);
				const at = Math.min(most, Math.max(least, index));
				expect(endsAfter(sorted, stretch)[end]).toBe(at);
				// A stretch of no length would be refused.
				if (stretch) expect(stretch.toMs).toBeGreaterThan(stretch.fromMs);
			})
		);
	});

	it('leaves two readings at least', () => {
		expect(reachOf(times, 'from')).toEqual({ least: 0, most: 8 });
		expect(reachOf(times, 'to')).toEqual({ least: 1, most: 9 });
		expect(reachOf([], 'to')).toEqual({ least: 0, most: 0 });
		expect(reachOf([5], 'from')).toEqual({ least: 0, most: 0 });
	});
});

describe('where the ends stand', () => {
	it.each([
		['untouched', null, { from: 0, to: 9 }],
		['after a beginning left out', { fromMs: 0, toMs: 25 * minute }, { from: 3, to: 9 }],
		['after an end left out', { fromMs: 55 * minute, toMs: 200 * minute }, { from: 0, to: 5 }],
		['with a stretch in the middle', { fromMs: 25 * minute, toMs: 35 * minute }, { from: 0, to: 9 }],
		['with everything left out', { fromMs: -1, toMs: 200 * minute }, { from: 9, to: 9 }]
	])('%s', (_, stretch, expected) => {
		expect(endsAfter(times, stretch)).toEqual(expected);
	});

	it('without readings is nowhere', () => {
		expect(endsAfter([], { fromMs: 0, toMs: 1 })).toEqual({ from: 0, to: -1 });
	});
});

describe('the keys of an end', () => {
	const reach = { least: 0, most: 100 };
	it.each([
		['ArrowRight', false, 50, 51],
		['ArrowLeft', false, 50, 49],
		['ArrowRight', true, 50, 60],
		['ArrowLeft', true, 50, 40],
		['ArrowUp', false, 50, 51],
		['ArrowDown', true, 50, 40],
		['PageUp', false, 95, 100],
		['PageDown', false, 5, 0],
		['Home', false, 50, 0],
		['End', false, 50, 100],
		['x', false, 50, null],
		['Tab', true, 50, null]
	])('%s, Shift %s, from %d leads to %s', (key, hasShift, at, expected) => {
		expect(endByKey(key, hasShift, at, reach)).toBe(expected);
	});
});
