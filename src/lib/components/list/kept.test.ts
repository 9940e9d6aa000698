import { describe, expect, it } from 'vitest';
import { keptText, keptTick } from './kept';

describe('a form that was refused', () => {
	const answer = {
		values: { name: 'typed', opening: { mon: { from: '04:00' } }, isStore: 'on', roles: ['qa'], one: 'dock' }
	};

	it('keeps what was typed, also where that is nothing', () => {
		expect(keptText(answer, 'name', 'stored')).toBe('typed');
		expect(keptText(answer, 'opening.mon.from', '05:00')).toBe('04:00');
		expect(keptText(answer, 'opening.tue.from', '05:00')).toBe('');
		expect(keptText(null, 'name', 'stored')).toBe('stored');
		expect(keptText({ issues: { form: 'no' } }, 'name', 'stored')).toBe('stored');
	});

	it('keeps ticks, single ones and several of one name', () => {
		expect(keptTick(answer, 'isStore', false)).toBe(true);
		expect(keptTick(answer, 'isCarrier', true)).toBe(false);
		expect(keptTick(answer, 'roles', false, 'qa')).toBe(true);
		expect(keptTick(answer, 'roles', true, 'dock')).toBe(false);
		expect(keptTick(answer, 'one', false, 'dock')).toBe(true);
		expect(keptTick(undefined, 'roles', true, 'dock')).toBe(true);
	});
});
