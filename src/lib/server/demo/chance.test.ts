import { describe, expect, it } from 'vitest';
import { chanceOf } from './chance';

describe('chance', () => {
	it('is the same for the same name and another for another', () => {
		const row = (name: string) => {
			const chance = chanceOf(name);
			return Array.from({ length: 20 }, () => chance.next());
		};
		expect(row('door left open')).toEqual(row('door left open'));
		expect(row('door left open')).not.toEqual(row('door left ajar'));
	});

	it('reaches both ends of a range and nothing beyond, evenly', () => {
		const chance = chanceOf('ends');
		const thrown = Array.from({ length: 4000 }, () => chance.whole(0, 3));
		expect(thrown.every((one) => [0, 1, 2, 3].includes(one))).toBe(true);
		const counts = [0, 1, 2, 3].map((one) => thrown.filter((other) => other === one).length);
		for (const count of counts) expect(Math.abs(count - 1000)).toBeLessThan(150);
	});

	it('picks every item sooner or later', () => {
		const chance = chanceOf('pick');
		expect(new Set(Array.from({ length: 60 }, () => chance.pick(['a', 'b', 'c'])))).toEqual(
			new Set(['a', 'b', 'c'])
		);
	});
});
