import { describe, expect, it } from 'vitest';
import { countFaultText, groupDetails, partText } from './line-groups';

const zone = 'Europe/Amsterdam';
const group = { outcome: 'accept', condition: null, reason: null, cases: 1, pallets: 0 } as const;

describe('what a split load comes to', () => {
	it.each([
		[{ taken: 12, refused: 4, held: 0 }, '12 pallets in, 4 refused'],
		[{ taken: 12, refused: 4, held: 2 }, '12 pallets in, 4 refused, 2 on hold'],
		[{ taken: 12, refused: 0, held: 2 }, '12 pallets in, 2 on hold'],
		[{ taken: 0, refused: 4, held: 2 }, '0 pallets in, 4 refused, 2 on hold'],
		[{ taken: 0, refused: 0, held: 2 }, '2 pallets on hold']
	])('%j', (parts, text) => {
		expect(partText({ unit: 'pallets', ...parts })).toBe(text);
	});
});

describe('a group’s details', () => {
	it.each([
		[
			{
				...group,
				outcome: 'conditions' as const,
				condition: 'by Friday',
				conditionKind: 'use-first' as const,
				whereabouts: 'store' as const
			},
			'use first: by Friday; in the store'
		],
		[
			{
				...group,
				outcome: 'hold' as const,
				awaited: 'the laboratory',
				untilAt: '2026-04-03T10:00:00Z',
				whereabouts: 'quarantine' as const,
				place: 'Q2'
			},
			'awaits the laboratory until Fri 3 Apr 12:00 CEST; in quarantine, Q2'
		],
		[
			{ ...group, outcome: 'reject' as const, reason: 'Too warm', whereabouts: 'returned' as const },
			'Too warm; returned'
		],
		[group, '']
	])('%#', (shown, text) => {
		expect(groupDetails(shown, zone)).toBe(text);
	});
});

describe('counts that do not add up', () => {
	it('are said in the units of the papers', () => {
		expect(countFaultText(2, { code: 'counts-differ', unit: 'cases', grouped: 95, received: 1096 })).toBe(
			'Line 2: the groups come to 95 cases; 1,096 were received. They must add up.'
		);
		expect(countFaultText(1, { code: 'count-missing', group: 2, unit: 'pallets' })).toBe(
			'Line 1, group 2: write its pallets.'
		);
		expect(countFaultText(1, { code: 'group-empty', group: 3 })).toBe(
			'Line 1, group 3 has no cases. Leave it out, or give it some.'
		);
	});
});
