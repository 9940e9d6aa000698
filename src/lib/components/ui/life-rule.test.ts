import { describe, expect, it } from 'vitest';
import { drawLifeRule } from './life-rule';

const full = 18 * 24;

describe('the life rule', () => {
	it('is ink to the low and hollow to the high', () => {
		const drawing = drawLifeRule({
			lowHours: full / 2,
			highHours: full * 0.75,
			neededHours: full / 4,
			fullHours: full
		});
		expect(drawing.lowPercent).toBe(50);
		expect(drawing.highPercent).toBe(75);
		expect(drawing.neededPercent).toBe(25);
		expect(drawing.shortPercent).toBeNull();
	});

	it('dots what is missing from the high to the need', () => {
		const drawing = drawLifeRule({
			lowHours: 0,
			highHours: full / 4,
			neededHours: full / 2,
			fullHours: full
		});
		expect(drawing.shortPercent).toEqual({ from: 25, to: 50 });
	});

	it('has a tick a day and names every sixth of eighteen', () => {
		const { ticks } = drawLifeRule({ lowHours: 1, highHours: 2, neededHours: null, fullHours: full });
		expect(ticks).toHaveLength(19);
		expect(ticks.filter((tick) => tick.isMajor).map((tick) => tick.days)).toEqual([0, 6, 12, 18]);
	});

	it('drops the day ticks of a long life, where they would touch', () => {
		const { ticks } = drawLifeRule({ lowHours: 1, highHours: 2, neededHours: null, fullHours: 180 * 24 });
		expect(ticks.every((tick) => tick.isMajor)).toBe(true);
		expect(ticks.map((tick) => tick.days)).toEqual([0, 56, 112, 168]);
	});

	it('stays on the rule when life is overdrawn or longer than full', () => {
		const drawing = drawLifeRule({ lowHours: -30, highHours: full + 10, neededHours: null, fullHours: full });
		expect(drawing.lowPercent).toBe(0);
		expect(drawing.highPercent).toBe(100);
		expect(drawing.neededPercent).toBeNull();
	});
});
