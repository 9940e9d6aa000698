import { describe, expect, it } from 'vitest';
import type { BoardRow } from '$lib/schemas/board';
import {
	clockLine,
	findingText,
	goodsText,
	groupFinding,
	isLate,
	nearestClock,
	readsText,
	verdictOf
} from './board-words';

const nowMs = Date.parse('2026-04-03T07:35:00Z');
const zone = 'Europe/Amsterdam';
const base: BoardRow = {
	...{ id: '1', number: 'PS-26-1184', version: 0, stage: 'expected', verdict: null },
	...{ dueAt: '2026-04-03T07:45:00Z', arrivedAt: null, supplier: 'Olmarisa', carrier: null, vehicle: null },
	...{ dock: 'Dock 1', goods: { product: 'Blueberries', lots: 3, cases: 2720, unit: 'case' } },
	...{
		reads: { due: 1, kept: 0, questions: 0 },
		finding: null,
		life: null,
		rejectBy: null,
		decided: null,
		part: null
	},
	next: { act: 'open', href: '/', questions: 0, isMine: false }
};
const row = (changes: Partial<BoardRow>): BoardRow => ({ ...base, ...changes });
const line = (changes: Partial<BoardRow>) => clockLine(row(changes), nowMs, '2026-04-03', zone);

describe('the words of the board', () => {
	it('say how long, until when, or who', () => {
		expect(line({})).toBe('in 10 min');
		expect(line({ dueAt: '2026-04-03T07:15:00Z' })).toBe('late by 20 min');
		expect(line({ dueAt: null })).toBe('no time given');
		const here = { arrivedAt: '2026-04-03T07:22:00Z', stage: 'at-the-door' } as const;
		expect(line(here)).toBe('13 min');
		const rejectBy = { startsAt: '2026-04-03T03:52:00Z', deadlineAt: '2026-04-03T11:52:00Z' };
		expect(line({ ...here, stage: 'on-hold', rejectBy })).toBe('reject by 13:52');
		const decided = { by: 'Ruth Calloway', at: '2026-04-03T07:02:00Z' };
		expect(line({ ...here, stage: 'done', decided })).toBe('R. Calloway 09:02');
		expect(line({ ...here, stage: 'done', decided: { ...decided, at: '2026-04-05T07:02:00Z' } })).toBe(
			'R. Calloway 5 Apr 09:02'
		);
	});

	it('put no tick over a part', () => {
		expect(
			verdictOf(
				row({ stage: 'done', verdict: 'part', part: { unit: 'pallets', taken: 12, refused: 4, held: 0 } })
			)
		).toEqual({ word: '12 in, 4 refused', mark: null });
		expect(verdictOf(row({ stage: 'done', verdict: 'rejected' })).mark).toBe('reject');
	});

	it('count reads and tell the gravest finding in the reader’s unit', () => {
		expect(readsText(base)).toBe('1 logger due');
		expect(readsText(row({ stage: 'at-the-door', reads: { due: 3, kept: 2, questions: 0 } }))).toBe(
			'2 of 3 read'
		);
		expect(readsText(row({ reads: { due: 0, kept: 0, questions: 0 } }))).toBe('no logger due');
		const finding = { kind: 'excursion', ordinal: 2, severity: 'critical', extremeCelsius: 11.3 } as const;
		expect(findingText(row({ finding }), 'celsius')).toBe('E2 critical, 11.3 °C');
		expect(findingText(row({ finding }), 'fahrenheit')).toBe('E2 critical, 52.3 °F');
		const short = { kind: 'short', lowHours: 60, neededHours: 72 } as const;
		expect(findingText(row({ finding: short }), 'celsius')).toBe('Low of 2.5 d, need 3.0 d');
		expect(findingText(row({ stage: 'at-the-door' }), 'celsius')).toBe('Open to reach loggers');
	});

	it('name goods with their own count unit', () => {
		expect(goodsText(base)).toBe('Blueberries, 3 lots, 2,720 cases');
		const boxes = { product: 'Hake', lots: 1, cases: 180, unit: 'box' };
		expect(goodsText(row({ goods: boxes }))).toBe('Hake, 180 boxes');
		expect(goodsText(row({ goods: { ...boxes, cases: 1 } }))).toBe('Hake, 1 box');
	});

	it('sum a group up in one line', () => {
		expect(groupFinding('expected', [base], nowMs)).toBe('next in 10 min, dock 1');
		const done = (['accepted', 'accepted', 'conditions', 'rejected'] as const).map((verdict) =>
			row({ stage: 'done', verdict })
		);
		expect(groupFinding('done', done, nowMs)).toBe('2 accepted, 1 with conditions, 1 rejected');
		expect(groupFinding('on-hold', [], nowMs)).toBe('');
	});

	it('find the clock that runs out first, and late arrivals', () => {
		const clock = (deadlineAt: string) => ({ rejectBy: { startsAt: deadlineAt, deadlineAt } });
		const rows = [row(clock('2026-04-03T12:00:00Z')), row({ number: 'N', ...clock('2026-04-03T11:00:00Z') })];
		expect(nearestClock(rows)?.number).toBe('N');
		expect(nearestClock([base])).toBeUndefined();
		expect(isLate(row({ arrivedAt: '2026-04-03T08:01:00Z' }))).toBe(true);
		expect(isLate(row({ arrivedAt: '2026-04-03T07:59:00Z' }))).toBe(false);
	});
});
