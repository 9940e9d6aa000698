import { describe, expect, it } from 'vitest';
import { pannedView, pinchedView } from './pinch';

const hour = 3_600_000;
const whole = { fromMs: 0, toMs: 100 * hour };
const view = { fromMs: 40 * hour, toMs: 60 * hour };
/** In hours, as the table below has them. */
const hours = ({ fromMs, toMs }: { fromMs: number; toMs: number }) => [fromMs / hour, toMs / hour];

// A plot of 200 px: in the view of 20 h a pixel is six minutes.
describe('two fingers', () => {
	it.each([
		['apart to twice the distance halve the view around them', [50, 150], [0, 200], [45, 55]],
		['together to half the distance double it', [0, 200], [50, 150], [30, 70]],
		['moved together carry the view along', [50, 150], [70, 170], [38, 58]],
		['moved the other way likewise', [50, 150], [30, 130], [42, 62]],
		['apart on one side keep what lies under the middle', [0, 100], [0, 200], [40, 50]],
		['crossed count as if they had not', [150, 50], [200, 0], [45, 55]],
		['as near as can be do not zoom without end', [10, 34], [20, 20], [40.2, 60.2]],
		['together to nothing show the whole', [0, 200], [99, 101], [0, 100]]
	])('%s', (_, from, to, expected) => {
		const [a, b, c, d] = [...from, ...to] as [number, number, number, number];
		const found = hours(pinchedView(view, whole, [a, b], [c, d], 200));
		found.forEach((value, at) => expect(value).toBeCloseTo(expected[at] ?? NaN, 6));
	});

	it('never show less than ten minutes', () => {
		const short = { fromMs: hour, toMs: hour + 12 * 60_000 };
		const { fromMs, toMs } = pinchedView(short, whole, [90, 110], [0, 200], 200);
		expect(toMs - fromMs).toBeCloseTo(10 * 60_000, 6);
	});
});

describe('the view moved along', () => {
	it.each([
		[100, [50, 70]],
		[-100, [30, 50]],
		[1000, [80, 100]],
		[-1000, [0, 20]],
		[0, [40, 60]]
	])('by %d px ends where the trip does', (byPx, expected) => {
		expect(hours(pannedView(view, whole, byPx, 200))).toEqual(expected);
	});
});
