import { describe, expect, it } from 'vitest';
import { reportInput } from '../../../../../../tests/helpers/report-fixture';
import { draftOf, type Chapter } from '../draft';
import { frameOf, niceTicks } from './frame';
import { textElement } from './svg';
import { traceChart } from './trace-chart';
import { apart, fitting, stacked } from './words-room';

const draft = draftOf(reportInput());
const [lead] = draft.chapters;

function drawn(change: (chapter: Chapter) => Chapter = (chapter) => chapter): string {
	if (lead === undefined) throw new Error('the fixture has an assessment');
	return String(traceChart(draft, change(lead)).svg);
}

describe('the trace chart', () => {
	it('is of the line that stands worst against its need', () => {
		expect(lead?.lines.map((line) => line.ordinal)).toEqual([3]);
		expect(lead?.others.map((other) => other.label)).toEqual(['L1', 'L2']);
	});

	it('names limits, excursions, the gap, the need and what is left', () => {
		const svg = drawn();
		for (const word of [
			'upper',
			'lower',
			'freezing',
			'E1',
			'E2 critical',
			'E3',
			'gap 2:12',
			'd needed',
			'd left',
			'opening balance'
		]) {
			expect(svg).toContain(word);
		}
	});

	it('never asks for anything outside itself', () => {
		expect(drawn()).not.toMatch(/<image|href|url\(/u);
	});

	it('escapes what people typed', () => {
		const hostile = '</text><image href="http://x"/>';
		const svg = drawn((chapter) => ({
			...chapter,
			assessment: {
				...chapter.assessment,
				legs: chapter.assessment.legs.map((leg) => ({ ...leg, holder: hostile }))
			}
		}));
		expect(svg).not.toContain('<image');
		expect(textElement(0, 0, hostile, { family: 'Barlow', size: 8, color: '#000' })).toContain(
			'&lt;image href=&quot;'
		);
	});

	it('holds finite coordinates only, also for one reading and for a flat trace', () => {
		const flat = drawn((chapter) => ({
			...chapter,
			others: [],
			series: chapter.series && { ...chapter.series, times: chapter.series.times.slice(0, 1), celsius: [4] },
			assessment: {
				...chapter.assessment,
				excursions: [],
				gaps: [],
				upperCelsius: 4,
				lowerCelsius: null,
				freezingCelsius: null,
				minCelsius: 4,
				maxCelsius: 4
			}
		}));
		expect(flat).not.toMatch(/NaN|Infinity|undefined/u);
		expect(drawn()).not.toMatch(/NaN|Infinity|undefined/u);
	});

	it('keeps the life panel at zero when life is overdrawn', () => {
		if (lead === undefined) throw new Error('the fixture has an assessment');
		const frame = frameOf(draft, lead);
		expect(frame.lifeY(-50)).toBe(frame.lifeBottom);
		expect(frame.lifeTicks[0]).toBe(0);
	});
});

describe('room on the chart', () => {
	it('is ticked in round steps that enclose both ends', () => {
		expect(niceTicks(-1.3, 11.4, 8)).toEqual([-2, 0, 2, 4, 6, 8, 10, 12]);
		expect(niceTicks(0, 18, 3)).toEqual([0, 6, 12, 18]);
		expect(niceTicks(5, 5, 8).length).toBeGreaterThan(1);
	});

	it('leaves out a label that would touch its neighbour', () => {
		const labels = [0, 4, 30].map((at) => ({ item: at, at }));
		expect(apart(labels, () => 10, 2).map(({ item }) => item)).toEqual([0, 30]);
	});

	it('moves gutter labels down until they clear each other', () => {
		expect(
			stacked(
				[10, 12, 40].map((at) => ({ item: at, at })),
				9
			).map(({ at }) => at)
		).toEqual([10, 19, 40]);
	});

	it('cuts words to the room there is, or leaves them out', () => {
		expect(fitting('Merrow Line', 'Semi', 8, 100)).toBe('Merrow Line');
		expect(fitting('Merrow Line', 'Semi', 8, 32)).toBe('Merrow…');
		expect(fitting('Merrow Line', 'Semi', 8, 8)).toBeNull();
	});
});
