import { describe, expect, it } from 'vitest';
import { actOfKey } from './keys';

describe('keys on the chart', () => {
	it('step a reading by arrow and a leg with Shift', () => {
		expect(actOfKey('ArrowRight', false, false)).toEqual({ kind: 'step', direction: 1 });
		expect(actOfKey('ArrowLeft', true, false)).toEqual({ kind: 'leg', direction: -1 });
		expect(actOfKey('Home', false, false)).toEqual({ kind: 'end', direction: -1 });
	});

	it('zoom by plus and minus, on any keyboard', () => {
		expect(['+', '='].map((key) => actOfKey(key, false, false))).toEqual(
			Array(2).fill({ kind: 'zoom', factor: 0.5 })
		);
		expect(actOfKey('-', false, true)).toEqual({ kind: 'zoom', factor: 2 });
	});

	it('leave everything else to the browser, Escape too where nothing is zoomed', () => {
		expect(actOfKey('Escape', false, true)).toEqual({ kind: 'whole' });
		expect(actOfKey('Escape', false, false)).toBeNull();
		expect(actOfKey('Tab', false, true)).toBeNull();
	});
});
