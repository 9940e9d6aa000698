import { describe, expect, it } from 'vitest';
import { lineStyle, primaryStyle } from './line-style';

describe('the lines of loggers', () => {
	it('are told apart without colour: twelve differ in dash or width', () => {
		const looks = Array.from({ length: 12 }, (_, at) => lineStyle(at));
		expect(new Set(looks.map(({ dash, widthPx }) => `${dash.join()} ${widthPx}`)).size).toBe(12);
	});

	it('keep their look by place, and begin again after twelve', () => {
		expect(lineStyle(3)).toEqual(lineStyle(3));
		expect(lineStyle(12)).toEqual(lineStyle(0));
	});

	it('never look like the primary one, which alone is in ink', () => {
		expect(primaryStyle).toMatchObject({ isInk: true, dash: [] });
		for (let at = 0; at < 24; at++) {
			expect(lineStyle(at).isInk).toBe(false);
			expect(lineStyle(at).widthPx).not.toBe(primaryStyle.widthPx);
		}
	});
});
