import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import { q10FromTwoLives } from '../../src/lib/domain/shelf-life/rate-q10';
import { rateAt } from '../../src/lib/domain/shelf-life/rate-curve';
import { buildInput, buildSpec, buildTrace, dayHours } from './build';

// Source: UC Davis Postharvest Center, "Broccoli: recommendations for maintaining postharvest quality":
// 0 °C 21–28 d, 5 °C 14 d, 10 °C about 5 d.
const broccoliPoints = [
	{ celsius: 0, lifeHours: 28 * dayHours },
	{ celsius: 5, lifeHours: 14 * dayHours },
	{ celsius: 10, lifeHours: 5 * dayHours }
];
const broccoli = buildSpec({
	model: { kind: 'life-table', points: broccoliPoints },
	fullLifeHours: 28 * dayHours
});
// Source: UC Davis Postharvest Center, "Lettuce, crisphead": 0 °C 21–28 d, 5 °C 14 d.
const lettuce = buildSpec({
	model: { kind: 'life-table', points: broccoliPoints.slice(0, 2) },
	fullLifeHours: 28 * dayHours
});

const lifeDaysAt = (celsius: number) => 28 / rateAt(broccoli, celsius);

describe('the broccoli life table', () => {
	it('gives its own points', () => {
		expect(lifeDaysAt(0)).toBe(28);
		expect(lifeDaysAt(5)).toBeCloseTo(14, 12);
		expect(lifeDaysAt(10)).toBeCloseTo(5, 12);
	});

	it('is straight in the logarithm of life between them', () => {
		// Source: 28 × (14/28)^(T/5) and 14 × (5/14)^((T−5)/5).
		expect(lifeDaysAt(2.5)).toBeCloseTo(19.799, 3);
		expect(lifeDaysAt(3)).toBeCloseTo(18.473, 3);
		expect(lifeDaysAt(7.5)).toBeCloseTo(8.3666, 4);
		expect(lifeDaysAt(8)).toBeCloseTo(7.548, 3);
	});

	it('implies a Q10 of 4.00 below 5 °C, 7.84 above, 5.60 over all', () => {
		const [zero, five, ten] = broccoliPoints as [
			(typeof broccoliPoints)[0],
			(typeof broccoliPoints)[0],
			(typeof broccoliPoints)[0]
		];
		expect(q10FromTwoLives(zero, five)).toBeCloseTo(4, 12);
		expect(q10FromTwoLives(five, ten)).toBeCloseTo(7.84, 12);
		expect(q10FromTwoLives(zero, ten)).toBeCloseTo(5.6, 12);
	});

	it('does not reach beyond its ends, and reports the time there', () => {
		expect(lifeDaysAt(-1)).toBe(28);
		expect(lifeDaysAt(15)).toBeCloseTo(5, 12);
		const { aboveModelHours, belowModelHours, usedHours } = assess(
			buildInput(buildTrace([12, 12, 12, -1, -1], 60), broccoli)
		);
		// 2 h above, then 13° down in an hour: 2° of them above, 1° below; then an hour below.
		expect(aboveModelHours).toBeCloseTo(2 + 2 / 13, 12);
		expect(belowModelHours).toBeCloseTo(1 + 1 / 13, 12);
		expect(usedHours.value).toBeGreaterThan(2 * 5.6);
	});

	it('counts a held temperature by its life there', () => {
		// 14 d at 5 °C are the whole life, whichever way they are read.
		const { remainingHours } = assess(buildInput(buildTrace([5, 5], 14 * 24 * 60), broccoli));
		expect(remainingHours.value).toBeCloseTo(0, 9);
	});
});

describe('the lettuce life table', () => {
	it('halves life from 0 to 5 °C', () => {
		expect(rateAt(lettuce, 5)).toBeCloseTo(2, 12);
	});

	it('may be read at a reference between its points', () => {
		const atTwo = buildSpec({ model: lettuce.model, referenceCelsius: 2 });
		expect(rateAt(atTwo, 2)).toBeCloseTo(1, 12);
		expect(rateAt(atTwo, 5) / rateAt(atTwo, 0)).toBeCloseTo(2, 12);
	});

	it('doubles twice as fast by the rule of thumb', () => {
		// Source: Cheyne, Kasmire, Morris 1979: 10 → 5 °C about doubles life (Q10 4), 5 → 2.5 °C doubles it again (16).
		expect(q10FromTwoLives({ celsius: 5, lifeHours: 2 }, { celsius: 10, lifeHours: 1 })).toBeCloseTo(4, 12);
		expect(q10FromTwoLives({ celsius: 2.5, lifeHours: 2 }, { celsius: 5, lifeHours: 1 })).toBeCloseTo(16, 11);
	});
});
