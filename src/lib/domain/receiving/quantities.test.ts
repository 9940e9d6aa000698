import { describe, expect, it } from 'vitest';
import { partQuantities } from './quantities';

const line = (outcome: 'accept' | 'conditions' | 'reject', cases: number, pallets: number) => ({
	outcome: { outcome, cases, pallets }
});

describe('the quantities of a partly taken load', () => {
	it('are pallets where every line has some', () => {
		const lines = [line('accept', 960, 5), line('conditions', 1120, 7), line('reject', 640, 4)];
		expect(partQuantities(lines)).toEqual({ unit: 'pallets', taken: 12, refused: 4, held: 0 });
	});

	it('are cases as soon as one line has no whole pallet', () => {
		const lines = [line('accept', 960, 5), line('reject', 12, 0)];
		expect(partQuantities(lines)).toEqual({ unit: 'cases', taken: 960, refused: 12, held: 0 });
	});

	it('leave out what nobody decided', () => {
		expect(partQuantities([{ outcome: null }, line('reject', 8, 1)])).toEqual({
			unit: 'pallets',
			taken: 0,
			refused: 1,
			held: 0
		});
	});

	it('count a split line by its groups, what waits apart from what is in', () => {
		const split = {
			outcome: { outcome: 'reject' as const, cases: 96, pallets: 16 },
			groups: [
				{ outcome: 'accept' as const, cases: 60, pallets: 10 },
				{ outcome: 'reject' as const, cases: 24, pallets: 4 },
				{ outcome: 'hold' as const, cases: 12, pallets: 2 }
			]
		};
		expect(partQuantities([split, line('accept', 12, 2)])).toEqual({
			unit: 'pallets',
			taken: 12,
			refused: 4,
			held: 2
		});
	});
});
