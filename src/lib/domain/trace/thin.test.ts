import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { wanderingTrace } from '../../../../tests/bench/engine';
import { thinSeries } from './thin';
import { celsiusOf } from './trace';

const minute = 60_000;
const trace = wanderingTrace(20_000);
const celsius = celsiusOf(trace);

describe('a thinned series', () => {
	it('is the series itself where it fits', () => {
		const times = Float64Array.of(0, 10 * minute, 20 * minute);
		const drawn = thinSeries(times, Float64Array.of(4, 5, 6), 10);
		expect(drawn.times).toEqual([0, 10 * minute, 20 * minute]);
		expect(drawn.celsius).toEqual([4, 5, 6]);
		expect([...drawn.indexes]).toEqual([0, 1, 2]);
	});

	it('is empty of an empty one', () => {
		expect(thinSeries(new Float64Array(), new Float64Array(), 100).times).toEqual([]);
	});

	it.each([50, 400, 1440])('has at most %d points, in order, first and last among them', (most) => {
		const drawn = thinSeries(trace.times, celsius, most);
		expect(drawn.times.length).toBeLessThanOrEqual(most);
		expect(drawn.times.length).toBeGreaterThan(most / 3);
		expect(drawn.indexes[0]).toBe(0);
		expect(drawn.indexes[drawn.indexes.length - 1]).toBe(19_999);
		for (let i = 1; i < drawn.times.length; i++)
			expect(drawn.times[i]).toBeGreaterThan(drawn.times[i - 1] ?? NaN);
	});

	it('keeps the coldest and the warmest, however short they lasted', () => {
		const spiked = celsius.slice();
		spiked[7777] = 25;
		spiked[7778] = -25;
		const drawn = thinSeries(trace.times, spiked, 100);
		expect(drawn.indexes).toContain(7777);
		expect(drawn.indexes).toContain(7778);
	});

	it('shows only readings there were', () => {
		const drawn = thinSeries(trace.times, celsius, 300);
		drawn.indexes.forEach((index, at) => expect(drawn.celsius[at]).toBe(celsius[index]));
	});

	it('breaks the line at a gap and keeps both its ends', () => {
		const times = trace.times.map((time, i) => (i < 5000 ? time : time + 300 * minute));
		const drawn = thinSeries(times, celsius, 200);
		const breaks = [...drawn.indexes.keys()].filter((at) => drawn.indexes[at] === -1);
		expect(breaks).toHaveLength(1);
		const at = breaks[0] ?? NaN;
		expect([drawn.indexes[at - 1], drawn.indexes[at + 1]]).toEqual([4999, 5000]);
		expect(drawn.celsius[at]).toBeNull();
		expect(drawn.times[at]).toBe(((times[4999] ?? NaN) + (times[5000] ?? NaN)) / 2);
	});

	it('never has more points than asked, whatever the gaps', () => {
		const steps = fc.array(fc.constantFrom(10, 10, 10, 10, 45, 600), { minLength: 2, maxLength: 400 });
		fc.assert(
			fc.property(steps, fc.integer({ min: 24, max: 200 }), (minutes, most) => {
				let time = 0;
				const times = Float64Array.from(minutes, (step) => (time += step * minute));
				const drawn = thinSeries(
					times,
					Float64Array.from(minutes, (_, i) => i % 7),
					most
				);
				expect(drawn.times.length).toBeLessThanOrEqual(most);
			})
		);
	});
});
