import { describe, expect, it } from 'vitest';
import type { DocketView } from '$lib/schemas/docket';
import { addedUp, askedGroups, beginningGroups, groupFields, mostGroups, withGroups } from './groups';

const line = {
	...{ ordinal: 1, casesReceived: 96, casesAdvised: 100, pallets: 4, outcome: null },
	recommendation: { recommended: 'accept', reasons: [] }
} as unknown as DocketView['lines'][number];
const part = { outcome: 'reject', condition: null, reason: 'Warm', cases: 6, pallets: 0 } as const;

describe('the groups a signing page begins with', () => {
	it('are those signed, the recommendation, or nothing chosen', () => {
		expect(beginningGroups(line, '')).toMatchObject([{ outcome: 'accept', whereabouts: '', cases: '' }]);
		const held = { ...line, recommendation: { recommended: 'hold' as const, reasons: [] } };
		expect(beginningGroups(held, '')).toMatchObject([{ outcome: '', whereabouts: '' }]);
		const signed = { ...line, outcome: part, groups: [part, { ...part, outcome: 'accept' as const }] };
		expect(beginningGroups(signed, '')).toMatchObject([
			{ outcome: 'reject', reason: 'Warm', cases: '6', pallets: '0' },
			{ outcome: 'accept' }
		]);
	});
});

describe('splitting a line without a script', () => {
	it.each([
		[null, []],
		['1.3', [[1, 3]]],
		[
			'1.3-2.2',
			[
				[1, 3],
				[2, 2]
			]
		],
		['1.99', [[1, mostGroups]]],
		['1.0', [[1, 1]]],
		['nonsense', []]
	])('%s', (split, asked) => {
		expect([...askedGroups(split)]).toEqual(asked);
	});

	it('keeps what was chosen and begins further groups empty', () => {
		const first = groupFields({ outcome: 'accept' });
		expect(withGroups([first], 3).map(({ outcome }) => outcome)).toEqual(['accept', '', '']);
		expect(withGroups([first, groupFields({})], 1)).toEqual([first]);
	});
});

describe('the sum under the groups', () => {
	it('is of what was received', () => {
		const groups = [groupFields({ cases: 90, pallets: 4 }), groupFields({ cases: 'six' })];
		expect(addedUp(line, groups)).toEqual({ text: '90 of 96 cases, 4 of 4 pallets', isEqual: false });
		expect(addedUp(line, [groupFields({ cases: 96, pallets: 4 })]).isEqual).toBe(true);
	});
});
