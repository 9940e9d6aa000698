import { describe, expect, it } from 'vitest';
import { legsOfJourney } from '../../../../../tests/helpers/report-journey';
import { legFigures, overUseOf, tenthsText, totalTenths } from './leg-figures';

const legs = legsOfJourney(0, 95 * 3_600_000, 0.437);

describe('figures of legs on paper', () => {
	it('add up across each row', () => {
		for (const leg of legFigures(legs)) {
			expect(leg.overTenths).toBe((leg.tooWarmTenths ?? 0) + (leg.tooLateTenths ?? 0));
			expect(leg.usedTenths).toBe((leg.allowedTenths ?? 0) + (leg.overTenths ?? 0));
		}
	});

	it('add up down each column to the rounded total', () => {
		const warm = legs.reduce((sum, leg) => sum + (leg.tooWarmHours ?? 0), 0);
		expect(totalTenths(legFigures(legs).map((leg) => leg.tooWarmTenths))).toBe(Math.round(warm * 10));
	});

	it('stand within a tenth of what was computed', () => {
		legFigures(legs).forEach((leg, i) => {
			expect(Math.abs((leg.tooWarmTenths ?? 0) / 10 - (legs[i]?.tooWarmHours ?? 0))).toBeLessThan(0.1);
		});
	});

	it('are absent, with no total, where a leg has no allowance', () => {
		const [first, ...rest] = legs;
		if (first === undefined) throw new Error('the journey has legs');
		const open = [
			{ ...first, allowedHours: null, overHours: null, tooWarmHours: null, tooLateHours: null },
			...rest
		];
		expect(legFigures(open)[0]).toMatchObject({ allowedTenths: null, overTenths: null });
		expect(overUseOf(open)).toBeNull();
		expect(overUseOf([])).toBeNull();
	});

	it('print a dash for what is absent and a true minus', () => {
		expect(tenthsText(null)).toBe('–');
		expect(tenthsText(-12)).toBe('−1.2');
	});
});
