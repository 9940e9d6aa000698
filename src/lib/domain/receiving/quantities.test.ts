import { describe, expect, it } from 'vitest';
import { partQuantities } from './quantities';

const line = (outcome: 'accept' | 'conditions' | 'reject', cases: number, pallets: number) => ({
	outcome: { outcome, cases, pallets }
});

describe('the quantities of a partly taken load', () => {
	it('are pallets where every line has some', () => {
		const lines = [line('accept', 960, 5), line('conditions', 1120, 7), line('reject', 640, 4)];
		expect(partQuantities(lines)).toEqual({ unit: 'pallets', taken: 12, refused: 4 });
	});

	it('are cases as soon as one line has no whole pallet', () => {
		const lines = [line('accept', 960, 5), line('reject', 12, 0)];
		expect(partQuantities(lines)).toEqual({ unit: 'cases', taken: 960, refused: 12 });
	});

	it('leave out what nobody decided', () => {
		expect(partQuantities([{ outcome: null }, line('reject', 8, 1)])).toEqual({
			unit: 'pallets',
			taken: 0,
			refused: 1
		});
	});
});
