import { describe, expect, it } from 'vitest';
import {
	countFault,
	decidedGroups,
	gravestOutcome,
	groupCounts,
	isPlaceAgainst,
	usualWhereabouts,
	whereaboutsKinds
} from './line-groups';

const line = { cases: 96, pallets: 4 };

describe('the groups of a line', () => {
	it.each([
		['the whole line, its counts not written', line, [{}], null],
		['the whole line, its counts written', line, [{ cases: 96, pallets: 4 }], null],
		[
			'two that add up',
			line,
			[
				{ cases: 72, pallets: 3 },
				{ cases: 24, pallets: 1 }
			],
			null
		],
		[
			'loose cases off a pallet that stays in the other group',
			line,
			[
				{ cases: 90, pallets: 4 },
				{ cases: 6, pallets: 0 }
			],
			null
		],
		['a line without pallets by cases alone', { cases: 10, pallets: 0 }, [{ cases: 4 }, { cases: 6 }], null],
		[
			'a case too few',
			line,
			[
				{ cases: 71, pallets: 3 },
				{ cases: 24, pallets: 1 }
			],
			{ code: 'counts-differ', unit: 'cases', grouped: 95, received: 96 }
		],
		[
			'a pallet too many',
			line,
			[
				{ cases: 72, pallets: 4 },
				{ cases: 24, pallets: 1 }
			],
			{ code: 'counts-differ', unit: 'pallets', grouped: 5, received: 4 }
		],
		[
			'one group that is not the whole line',
			line,
			[{ cases: 90 }],
			{ code: 'counts-differ', unit: 'cases', grouped: 90, received: 96 }
		],
		[
			'one without its cases',
			line,
			[{ cases: 96, pallets: 3 }, { pallets: 1 }],
			{ code: 'count-missing', group: 2, unit: 'cases' }
		],
		[
			'one without its pallets',
			line,
			[{ cases: 72 }, { cases: 24, pallets: 1 }],
			{ code: 'count-missing', group: 1, unit: 'pallets' }
		],
		[
			'an empty one',
			line,
			[
				{ cases: 96, pallets: 4 },
				{ cases: 0, pallets: 0 }
			],
			{ code: 'group-empty', group: 2 }
		]
	] as const)('%s', (_what, received, groups, fault) => {
		expect(countFault(received, groups)).toEqual(fault);
	});

	it('take the whole line’s counts where they are the whole line, and nobody’s otherwise', () => {
		expect(groupCounts(line, [{}])).toEqual([line]);
		expect(groupCounts(line, [{ cases: 96 }])).toEqual([line]);
		expect(groupCounts(line, [{ cases: 90, pallets: 4 }, { cases: 6 }])).toEqual([
			{ cases: 90, pallets: 4 },
			{ cases: 6, pallets: 0 }
		]);
	});
});

describe('a line whose groups end differently', () => {
	it.each([
		[['accept', 'reject', 'hold'], 'reject'],
		[['accept', 'hold'], 'hold'],
		[['accept', 'conditions'], 'conditions'],
		[['accept', 'accept'], 'accept'],
		[[], 'hold']
	] as const)('%j is called %s', (outcomes, word) => {
		expect(gravestOutcome(outcomes)).toBe(word);
	});

	it('is read by its groups, and by its one outcome where it has none', () => {
		const whole = { outcome: 'accept' };
		expect(decidedGroups({ outcome: whole, groups: [] })).toEqual([whole]);
		expect(decidedGroups({ outcome: whole })).toEqual([whole]);
		expect(decidedGroups({ outcome: whole, groups: [{ outcome: 'a' }, { outcome: 'b' }] })).toHaveLength(2);
		expect(decidedGroups({ outcome: null })).toEqual([]);
	});
});

describe('where goods go', () => {
	it.each([
		['accept', ['returned', 'dumped']],
		['conditions', ['returned', 'dumped']],
		['hold', ['returned', 'dumped']],
		['reject', ['store']]
	] as const)('%s contradicts %j alone', (outcome, against) => {
		expect(whereaboutsKinds.filter((kind) => isPlaceAgainst(outcome, kind))).toEqual(against);
		expect(isPlaceAgainst(outcome, usualWhereabouts(outcome))).toBe(false);
	});
});
