import { describe, expect, it } from 'vitest';
import { addUp } from '../../src/lib/format';
import { assess } from '../../src/lib/domain/receiving/assess';
import { buildHandover, buildInput, buildSpec, dayHours, heldTrace, hourMs, startMs } from './build';

// Cod, 14 d at 0 °C, rate (1 + 0.1 T)². Source of life and model: FAO Fisheries Technical Paper 348 (Huss 1995) 6.1;
// the days are those squares times the hours: 24 h at 0, 48 h at 4, 6 h at 10, 12 h at 2 °C.
const legs = [
	{ holder: 'vessel', hours: 24, celsius: 0, days: 1, percent: 15.1 },
	{ holder: 'road', hours: 48, celsius: 4, days: 3.92, percent: 59.0 },
	{ holder: 'dock', hours: 6, celsius: 10, days: 1, percent: 15.1 },
	{ holder: 'store', hours: 12, celsius: 2, days: 0.72, percent: 10.8 }
];
const cod = buildSpec({ model: { kind: 'square-root', minCelsius: -10 } });
/** A jump takes a millisecond between two readings: up to 2 ms × rate 4 stray into a leg. */
const strayHours = 4e-6;

function handoversOf(order: readonly { holder: string; hours: number }[]) {
	let ms = startMs;
	const handovers = order.map(({ holder, hours }) => {
		const handover = buildHandover(holder, ms, { plannedMs: ms, setPointCelsius: 0 });
		ms += hours * hourMs;
		return handover;
	});
	return [...handovers, buildHandover('receiver', ms, { plannedMs: ms })];
}

function assessed(order: typeof legs) {
	const trace = heldTrace(order.map(({ hours, celsius }) => [hours, celsius] as const));
	return assess(buildInput(trace, cod, { handovers: handoversOf(order) }));
}

describe('cod through four hands', () => {
	const { legs: uses, usedHours, remainingHours } = assessed(legs);

	it('uses 6.64 of its 14 days', () => {
		expect(usedHours.value / dayHours).toBeCloseTo(6.64, 6);
		expect(remainingHours.value / dayHours).toBeCloseTo(7.36, 6);
	});

	it('charges each leg what it used', () => {
		legs.forEach(({ holder, days }, i) => {
			expect(uses[i]?.handoverId).toBe(holder);
			expect(uses[i]?.ordinal).toBe(i + 1);
			expect(Math.abs((uses[i]?.usedHours ?? NaN) - days * dayHours)).toBeLessThan(strayHours);
		});
	});

	it('prints shares that add up to 100', () => {
		const printed = addUp(
			uses.map((use) => use.shareOfUsed * 100),
			1
		);
		expect(printed.reduce((sum, percent) => sum + percent, 0)).toBeCloseTo(100, 9);
		// 15.060, 59.036, 15.060, 10.843: each to the nearest tenth add up to 100.0 already.
		expect(printed).toEqual(legs.map((leg) => leg.percent));
	});

	it('loses 2.89 d against the plan of 0 °C, all of it by warmth', () => {
		const over = uses.map((use) => (use.overHours ?? NaN) / dayHours);
		[0, 1.92, 0.75, 0.22].forEach((days, i) => expect(over[i]).toBeCloseTo(days, 6));
		for (const use of uses) expect(use.tooLateHours).toBe(0);
	});

	it('uses the same whatever the order of the legs', () => {
		const turned = assessed([...legs].reverse());
		expect(Math.abs(turned.usedHours.value - usedHours.value)).toBeLessThan(strayHours);
	});

	it('uses the same wherever a leg is cut', () => {
		const trace = heldTrace(legs.map(({ hours, celsius }) => [hours, celsius] as const));
		const handovers = handoversOf(legs);
		for (const cutHours of [0.001, 7.3, 24.0001, 47.77, 71.9, 75]) {
			const cut = buildHandover('cut', startMs + Math.round(cutHours * hourMs));
			const again = assess(buildInput(trace, cod, { handovers: [...handovers, cut] }));
			expect(again.usedHours).toEqual(usedHours);
			const sum = again.legs.reduce((total, use) => total + use.usedHours, 0);
			expect(Math.abs(sum - usedHours.value)).toBeLessThan(1e-9);
		}
	});
});
