import { describe, expect, it } from 'vitest';
import {
	buildHandover,
	buildInput,
	buildSpec,
	buildTrace,
	hourMs,
	minuteMs,
	startMs,
	traceAt
} from '../../../../tests/accuracy/build';
import { assess, AssessmentRefusal, remainingOf } from './assess';
import type { AssessInput, OpeningBalance } from './assessment';
import { engineVersion } from './engine-version';

const spec = buildSpec({ fullLifeHours: 100 });
const tenHours = buildTrace([0, 0], 600);
const at = (minutes: number) => startMs + minutes * minuteMs;

function refusalOf(input: AssessInput): AssessmentRefusal | null {
	try {
		assess(input);
		return null;
	} catch (error) {
		if (error instanceof AssessmentRefusal) return error;
		throw error;
	}
}

describe('what is left', () => {
	it('is full life less the opening balance less what was used', () => {
		const opening: OpeningBalance = {
			kind: 'declared',
			hours: 20,
			plusMinusHours: 5,
			basis: 'pre-cooling log'
		};
		const { remainingHours, openingHours, usedHours, fullLifeHours } = assess(
			buildInput(tenHours, spec, { opening })
		);
		expect(fullLifeHours).toBe(100);
		expect(openingHours).toEqual({ value: 20, low: 15, high: 25 });
		expect(usedHours).toEqual({ value: 10, low: 10, high: 10 });
		expect(remainingHours).toEqual({ value: 70, low: 65, high: 75 });
	});

	it('stacks every bound on the unlucky side for the low', () => {
		const uncertain = buildSpec({ fullLifeHours: 100, fullLifeUncertaintyHours: 8 });
		const opening: OpeningBalance = {
			kind: 'declared',
			hours: 20,
			plusMinusHours: 5,
			basis: 'pre-cooling log'
		};
		const input = buildInput(tenHours, uncertain, { opening, accuracyCelsius: 10 });
		const { remainingHours } = assess(input);
		// Ten degrees more at a Q10 of 3: three times as fast; ten less: a third.
		expect(remainingHours.low).toBeCloseTo(100 - 8 - 25 - 30, 9);
		expect(remainingHours.high).toBeCloseTo(100 + 8 - 15 - 10 / 3, 9);
		expect(remainingHours.value).toBe(70);
	});

	it('is exactly nothing after the whole life at the reference temperature', () => {
		expect(assess(buildInput(buildTrace([0, 0], 6000), spec)).remainingHours.value).toBe(0);
	});

	it('goes below nothing when over-consumed, and is not clipped', () => {
		expect(assess(buildInput(buildTrace([0, 0], 7200), spec)).remainingHours.value).toBe(-20);
		expect(remainingOf(10, 0, { value: 0, low: 0, high: 0 }, { value: 15, low: 14, high: 16 })).toEqual({
			value: -5,
			low: -6,
			high: -4
		});
	});
});

describe('the opening balance', () => {
	const openingOf = (opening: OpeningBalance, openingDefaultHours = 48) =>
		assess(buildInput(tenHours, buildSpec({ openingDefaultHours }), { opening })).openingHours;

	it('declared is never less than nothing', () => {
		expect(openingOf({ kind: 'declared', hours: 2, plusMinusHours: 5, basis: 'harvest note' })).toEqual({
			value: 2,
			low: 0,
			high: 7
		});
	});

	it('computed counts from harvest to the first reading at the assumed temperature', () => {
		const sinceMs = startMs - 6 * hourMs;
		const computed = openingOf({
			kind: 'computed',
			sinceMs,
			celsius: 10,
			plusMinusCelsius: 10,
			basis: 'field heat'
		});
		expect(computed.value).toBeCloseTo(18, 12);
		expect(computed.low).toBeCloseTo(6, 12);
		expect(computed.high).toBeCloseTo(54, 12);
	});

	it('computed is nothing where harvest is said to be after the first reading', () => {
		const late = openingOf({
			kind: 'computed',
			sinceMs: at(5),
			celsius: 10,
			plusMinusCelsius: 0,
			basis: 'mistake'
		});
		expect(late.value).toBe(0);
	});

	it('undeclared is never kinder than an honest declaration', () => {
		const undeclared = openingOf({ kind: 'undeclared' });
		expect(undeclared).toEqual({ value: 48, low: 0, high: 48 });
		for (const hours of [0, 10, 48]) {
			const honest = openingOf({ kind: 'declared', hours, plusMinusHours: 0, basis: 'harvest note' });
			expect(undeclared.value).toBeGreaterThanOrEqual(honest.value);
			expect(undeclared.high).toBeGreaterThanOrEqual(honest.high);
		}
	});
});

describe('the window', () => {
	const trace = buildTrace([20, 20, 0, 0, 0, 0, 20, 20], 60);
	const handovers = [buildHandover('a', at(120)), buildHandover('b', at(300))];

	it('is first to last handover: what the logger saw in the office does not count', () => {
		const assessment = assess(buildInput(trace, spec, { handovers }));
		expect(assessment.readings).toBe(4);
		expect([assessment.windowFromMs, assessment.windowToMs]).toEqual([at(120), at(300)]);
		expect(assessment.usedHours.value).toBe(3);
		expect(assessment.maxCelsius).toBe(0);
		expect(assessment.meanCelsius).toBe(0);
		expect(assessment.mktCelsius).toBeCloseTo(0, 9);
	});

	it('is all readings without handovers, less what was trimmed', () => {
		expect(assess(buildInput(trace, spec)).readings).toBe(8);
		const trims = [
			{ fromMs: at(0), toMs: at(60) },
			{ fromMs: at(360), toMs: at(420) }
		];
		const trimmed = assess(buildInput(trace, spec, { trims }));
		expect(trimmed.readings).toBe(4);
		expect(trimmed.usedHours.value).toBe(3);
	});

	it('keeps what had been used at every reading', () => {
		const { series } = assess(buildInput(trace, spec, { handovers, accuracyCelsius: 0.5 }));
		expect([...series.usedHours]).toEqual([0, 1, 2, 3]);
		expect([...series.celsius]).toEqual([0, 0, 0, 0]);
		expect(series.usedLowHours[3]).toBeLessThan(3);
		expect(series.usedHighHours[3]).toBeGreaterThan(3);
		expect(series.usedLowHours).toHaveLength(4);
	});
});

describe('gaps', () => {
	const gapped = traceAt([at(0), at(10), at(20), at(140), at(150)], [0, 0, 0, 10, 10]);
	const assessment = assess(buildInput(gapped, spec));

	it('are listed with their hours and what they used, bracketed', () => {
		expect(assessment.gaps).toHaveLength(1);
		expect(assessment.unobservedHours).toBe(2);
		const [gap] = assessment.gaps;
		expect([gap?.fromMs, gap?.toMs]).toEqual([at(20), at(140)]);
		expect(gap?.usedHours.low).toBeCloseTo(2, 12);
		expect(gap?.usedHours.value).toBeCloseTo(4 / Math.log(3), 12);
		expect(gap?.usedHours.high).toBeCloseTo(6, 12);
		expect(assessment.unobservedUsedHours).toEqual(gap?.usedHours);
	});

	it('widen what is left', () => {
		expect(assessment.remainingHours.low).toBeLessThan(assessment.remainingHours.value);
		expect(assessment.remainingHours.high).toBeGreaterThan(assessment.remainingHours.value);
	});

	it('are none in a regular trace', () => {
		const { gaps, unobservedHours, unobservedUsedHours } = assess(buildInput(tenHours, spec));
		expect({ gaps, unobservedHours, unobservedUsedHours }).toEqual({
			gaps: [],
			unobservedHours: 0,
			unobservedUsedHours: { value: 0, low: 0, high: 0 }
		});
	});
});

describe('an assessment', () => {
	it('names the engine, the need and the usual interval', () => {
		const assessment = assess(buildInput(tenHours, buildSpec({ neededHours: 48 }), { neededHours: null }));
		expect(assessment.engineVersion).toBe(engineVersion);
		expect(assessment.neededHours).toBe(48);
		expect(assessment.usualIntervalMs).toBe(600 * minuteMs);
		expect(assess(buildInput(tenHours, spec, { neededHours: 72 })).neededHours).toBe(72);
	});

	it('reports time below the chilling threshold, which earned nothing', () => {
		const banana = buildSpec({ referenceCelsius: 14, chillingCelsius: 13 });
		const cold = assess(buildInput(buildTrace([5, 5, 5], 60), banana));
		const atThreshold = assess(buildInput(buildTrace([13, 13, 13], 60), banana));
		expect(cold.chilledHours).toBe(2);
		expect(cold.usedHours.value).toBe(atThreshold.usedHours.value);
		expect(atThreshold.chilledHours).toBe(0);
	});

	it('leaves its input as it was', () => {
		const trace = buildTrace([1, 2, 3], 60);
		const input = Object.freeze(buildInput(trace, Object.freeze(buildSpec())));
		const before = [...trace.scaled, ...trace.times];
		assess(input);
		expect([...trace.scaled, ...trace.times]).toEqual(before);
	});

	it('gives the same digits each time', () => {
		const input = buildInput(buildTrace([1, 7, 3, 2.5], 60), spec, { accuracyCelsius: 0.3 });
		expect(assess(input)).toEqual(assess(input));
	});
});

describe('what cannot be assessed', () => {
	it('is refused with its reason', () => {
		expect(refusalOf(buildInput(traceAt([], []), spec))?.code).toBe('no-readings-in-window');
		expect(refusalOf(buildInput(buildTrace([4]), spec))?.code).toBe('one-reading-in-window');
		const handovers = [buildHandover('a', at(9000)), buildHandover('b', at(9600))];
		expect(refusalOf(buildInput(tenHours, spec, { handovers }))?.code).toBe('no-readings-in-window');
	});

	it('is refused with every fault of the spec', () => {
		const refusal = refusalOf(
			buildInput(tenHours, buildSpec({ fullLifeHours: -1, model: { kind: 'constant-q10', q10: 0 } }))
		);
		expect(refusal?.code).toBe('spec-faulty');
		expect(refusal?.specFaults.map((fault) => fault.field)).toEqual(
			expect.arrayContaining(['fullLifeHours', 'model.q10'])
		);
	});
});
