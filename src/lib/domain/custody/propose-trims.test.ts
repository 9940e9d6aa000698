import { describe, expect, it } from 'vitest';
import type { Placement } from '../trace/trace';
import { proposeTrims } from './propose-trims';

const start = Date.UTC(2026, 3, 1, 6);
const minute = 60_000;

/** Readings at a distance, all at rest but what is said of the first and the last ones. */
function trace(
	first: readonly number[],
	last: readonly number[] = [],
	everyMinutes = 10,
	rest = 2,
	hours = 24
) {
	const count = Math.round((hours * 60) / everyMinutes);
	const celsius = [...first, ...Array.from({ length: count }, () => rest), ...last];
	return { times: celsius.map((_, at) => start + at * everyMinutes * minute), celsius };
}
const propose = (
	{ times, celsius }: { times: number[]; celsius: number[] },
	placement: Placement = 'between-cases'
) => proposeTrims(times, celsius, placement);

// Thresholds are the house's own: common practice, no source.
describe('what a trace shows before loading and after unloading', () => {
	it('is a run from the hand to the cold, up to the first reading at rest', () => {
		expect(propose(trace([21.4, 12, 6, 3.5]))).toEqual([
			{ end: 'from', index: 4, outermostCelsius: 21.4, restingCelsius: 2 }
		]);
	});

	it('is a run from a deep freezer up to the goods, too', () => {
		expect(propose(trace([-18, -9, -2]))).toMatchObject([{ end: 'from', index: 3, outermostCelsius: -18 }]);
	});

	it('is a run to the desk after unloading', () => {
		const made = trace([], [4.5, 9, 16.2]);
		expect(propose(made)).toEqual([
			{ end: 'to', index: made.times.length - 4, outermostCelsius: 16.2, restingCelsius: 2 }
		]);
	});

	it('is both at once', () => {
		expect(propose(trace([15, 8], [7, 14])).map(({ end }) => end)).toEqual(['from', 'to']);
	});

	it.each([
		['a trace that begins and ends at rest', trace([])],
		['readings less than two degrees away', trace([3.9, 3.6])],
		['a swing to both sides of where it rests', trace([8, -3, 7])],
		['a load that was warm for longer than three hours', trace(Array.from({ length: 20 }, () => 12))],
		['a rise in the middle of the journey', trace(Array.from({ length: 30 }, (_, i) => (i === 15 ? 9 : 2)))],
		['a trace of no two hours', trace([12, 6], [], 10, 2, 1)],
		['two readings', trace([12], [], 10, 2, 1 / 6)],
		['none', { times: [], celsius: [] }],
		['readings too far apart to tell', trace([18], [], 60)]
	])('is nothing for %s', (_what, made) => {
		expect(propose(made)).toEqual([]);
	});

	it('takes no product that cools for a logger in the hand', () => {
		const cooling = trace([18, 15, 12.5, 10, 8, 6.5, 5, 4]);
		expect(propose(cooling, 'in-product')).toEqual([]);
		expect(propose(cooling, 'air')).toHaveLength(1);
		expect(propose(trace([18, 9, 4]), 'in-product')).toHaveLength(1);
	});

	it('leaves a short trace its journey', () => {
		const all = trace([14, 9, 5], [6, 12], 10, 2, 4);
		const [from, to] = propose(all);
		expect(from?.index).toBeLessThan(to?.index ?? 0);
	});
});
