import { describe, expect, it } from 'vitest';
import type { FrozenDocket } from '../../schemas/docket';
import { amendedLines } from './amended-lines';

type Line = FrozenDocket['docket']['lines'][number];

const group = (outcome: 'accept' | 'reject' | 'hold', cases: number) => ({
	...{ outcome, cases, pallets: 1, condition: null, reason: null }
});
const line = (ordinal: number, ...groups: ReturnType<typeof group>[]) =>
	({
		id: `${ordinal}`,
		ordinal,
		outcome: groups[0],
		groups: groups.length > 1 ? groups : undefined
	}) as unknown as Line;

describe('what an amendment changes', () => {
	it('is said line by line, what stays as it was left out', () => {
		const before = [line(1, group('accept', 96)), line(2, group('reject', 1640))];
		const after = [line(1, group('accept', 96)), line(2, group('accept', 1600), group('hold', 40))];
		expect(amendedLines(before, after)).toEqual([
			'Line 2: 1,640 cases refused, now 1,600 cases accepted, 40 cases held.'
		]);
		expect(amendedLines(before, before)).toEqual([]);
	});
});
