import { describe, expect, it } from 'vitest';
import type { DocketView } from '$lib/schemas/docket';
import type { ReviewView } from '$lib/schemas/signing';
import { addedUp, askedGroups, beginningGroups, groupFields, mostGroups, withGroups } from './groups';
import { reviewedGroups } from './reviewed-groups';

const line = {
	...{ ordinal: 1, casesReceived: 96, casesAdvised: 100, pallets: 4, outcome: null },
	recommendation: { recommended: 'accept', reasons: [] }
} as unknown as DocketView['lines'][number];
const plain = { suggestedReason: '', zone: 'Europe/Amsterdam', hold: null };
const part = { outcome: 'reject', condition: null, reason: 'Warm', cases: 6, pallets: 0 } as const;

describe('the groups a signing page begins with', () => {
	it('are those signed, the recommendation, or nothing chosen', () => {
		expect(beginningGroups(line, plain)).toMatchObject([{ outcome: 'accept', whereabouts: '', cases: '' }]);
		const held = { ...line, recommendation: { recommended: 'hold' as const, reasons: [] } };
		expect(beginningGroups(held, plain)).toMatchObject([{ outcome: '', whereabouts: '' }]);
		const signed = { ...line, outcome: part, groups: [part, { ...part, outcome: 'accept' as const }] };
		expect(beginningGroups(signed, plain)).toMatchObject([
			{ outcome: 'reject', reason: 'Warm', cases: '6', pallets: '0' },
			{ outcome: 'accept' }
		]);
	});
});

describe('a hold on the signing page', () => {
	// 12:30 UTC is 14:30 in Amsterdam in summer and 13:30 in winter (IANA tz, Europe/Amsterdam).
	const group = (untilAt: string) => ({
		...part,
		outcome: 'hold' as const,
		awaited: 'the lab’s count',
		untilAt
	});

	it.each([
		['2026-07-04T12:30:00.000Z', '2026-07-04T14:30'],
		['2026-12-04T12:30:00.000Z', '2026-12-04T13:30'],
		['2026-12-04T23:30:00.000Z', '2026-12-05T00:30']
	])('that was signed until %s is refilled with its words and the site’s time', (untilAt, until) => {
		const signed = { ...line, outcome: group(untilAt), groups: [group(untilAt), part] };
		expect(beginningGroups(signed, plain)).toMatchObject([
			{ outcome: 'hold', awaited: 'the lab’s count', until },
			{ outcome: 'reject', awaited: '', until: '' }
		]);
	});

	it('of a whole load keeps its words for the line that is held again', () => {
		const hold = {
			...{ sinceAt: '2026-07-03T09:00:00.000Z', by: 'R. Calloway', reason: 'warm' },
			...{ awaited: 'a second look', untilAt: '2026-07-04T12:30:00.000Z' }
		};
		expect(beginningGroups(line, { ...plain, hold })).toMatchObject([
			{ outcome: 'accept', awaited: 'a second look', until: '2026-07-04T14:30' }
		]);
	});
});

describe('a review before the approval', () => {
	const rows = [
		{ lineId: 'a', outcome: 'reject', condition: null, reason: 'Warm', cases: 6, name: 'tail' },
		{ lineId: 'a', outcome: 'hold', awaited: 'the lab', until: '2026-07-04T14:30', cases: 90 },
		{ lineId: 'b', outcome: 'accept', condition: null, reason: null }
	];
	const review = (changes: Partial<ReviewView> = {}): ReviewView => ({
		...{ id: 'r', by: 'R. Calloway', byId: 'u', title: 'QA', at: '2026-07-03T09:00:00.000Z', zone: 'UTC' },
		...{ reasons: '', decisionSha256: '', decision: JSON.stringify(rows), isOfThis: true },
		...changes
	});
	const signed = (signedAt: string) => [{ signedAt }] as DocketView['signatures'];

	it('fills the approver’s form with every group as it was reviewed', () => {
		const reviewed = reviewedGroups([review()], []);
		expect(reviewed?.by).toBe('R. Calloway');
		expect(reviewed?.groups.get('a')).toMatchObject([
			{ outcome: 'reject', reason: 'Warm', cases: '6', name: 'tail', until: '' },
			{ outcome: 'hold', awaited: 'the lab', until: '2026-07-04T14:30', cases: '90' }
		]);
		expect(reviewed?.groups.get('b')).toMatchObject([{ outcome: 'accept', reason: '', cases: '' }]);
	});

	it('does not where it was of other evidence, or came before the last signature', () => {
		expect(reviewedGroups([review({ isOfThis: false })], [])).toBeNull();
		expect(reviewedGroups([review()], signed('2026-07-03T10:00:00.000Z'))).toBeNull();
		expect(reviewedGroups([review()], signed('2026-07-03T08:00:00.000Z'))).not.toBeNull();
		expect(reviewedGroups([], [])).toBeNull();
	});

	it('is the last of several', () => {
		const later = review({ by: 'J. Okafor', at: '2026-07-03T11:00:00.000Z' });
		expect(reviewedGroups([review(), later], [])?.by).toBe('J. Okafor');
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
