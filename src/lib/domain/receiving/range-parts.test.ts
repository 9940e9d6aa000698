import { describe, expect, it } from 'vitest';
import { buildInput, buildSpec, minuteMs, startMs, traceAt } from '../../../../tests/accuracy/build';
import { assess } from './assess';
import type { AssessInput } from './assessment';

const times = [0, 10, 20, 140, 150].map((at) => startMs + at * minuteMs);
const gapped = traceAt(times, [0, 0, 0, 10, 10]);
const spec = buildSpec({ fullLifeUncertaintyHours: 24, openingDefaultHours: 48 });
const partsOf = (overrides: Partial<AssessInput>) => {
	const assessment = assess(buildInput(gapped, spec, overrides));
	const part = (source: string) => assessment.rangeParts.find((one) => one.source === source);
	return { assessment, part };
};

describe('what the range of remaining life includes', () => {
	it.each([
		{},
		{ accuracyCelsius: 0.5 },
		{ accuracyCelsius: 0.5, opening: { kind: 'undeclared' } as const },
		{
			accuracyCelsius: 1,
			opening: { kind: 'declared', hours: 20, plusMinusHours: 5, basis: 'harvest note' } as const
		},
		{
			opening: {
				kind: 'computed',
				sinceMs: startMs - 360 * minuteMs,
				celsius: 10,
				plusMinusCelsius: 4,
				basis: 'field heat'
			} as const
		}
	])('adds up to the distance of the low and the high: %o', (overrides) => {
		const { assessment } = partsOf(overrides);
		const { value, low, high } = assessment.remainingHours;
		const sum = (of: 'lowerHours' | 'raiseHours') =>
			assessment.rangeParts.reduce((total, part) => total + part[of], 0);
		expect(sum('lowerHours')).toBeCloseTo(value - low, 9);
		expect(sum('raiseHours')).toBeCloseTo(high - value, 9);
		for (const part of assessment.rangeParts) {
			expect(part.lowerHours).toBeGreaterThanOrEqual(-1e-12);
			expect(part.raiseHours).toBeGreaterThanOrEqual(-1e-12);
		}
	});

	it('is gaps alone with an exact instrument, an exact balance and an exact life', () => {
		const { assessment, part } = partsOf({});
		// Two hours between 0 and 10 °C at a Q10 of 3, by its definition: 2, 4/ln 3 or 6 hours.
		expect(part('gaps')?.lowerHours).toBeCloseTo(6 - 4 / Math.log(3), 12);
		expect(part('gaps')?.raiseHours).toBeCloseTo(4 / Math.log(3) - 2, 12);
		expect(part('accuracy')?.lowerHours).toBeCloseTo(0, 12);
		expect(part('accuracy')?.raiseHours).toBeCloseTo(0, 12);
		expect(part('full-life')).toMatchObject({ lowerHours: 24, raiseHours: 24 });
		expect(assessment.rangeParts.map(({ source }) => source)).toEqual([
			'accuracy',
			'gaps',
			'opening',
			'full-life'
		]);
	});

	it('takes the whole undeclared default to the kind side and none to the other', () => {
		expect(partsOf({ opening: { kind: 'undeclared' } }).part('opening')).toMatchObject({
			lowerHours: 0,
			raiseHours: 48
		});
	});

	it('is wider by the ± of the model, in what was read, in gaps and in a computed balance', () => {
		const unsure = buildSpec({ fullLifeHours: 336, sensitivityPlusMinus: 1 });
		const opening = {
			kind: 'computed',
			sinceMs: startMs - 600 * minuteMs,
			celsius: 10,
			plusMinusCelsius: 0,
			basis: 'field heat'
		} as const;
		const trace = traceAt(
			[0, 10, 20].map((at) => startMs + at * minuteMs * 6),
			[10, 10, 10]
		);
		const { usedHours, openingHours, remainingHours } = assess(buildInput(trace, unsure, { opening }));
		// Two hours at 10 °C and ten before: Q10 3 ± 1, by its definition twice to four times as fast.
		expect(usedHours.low).toBeCloseTo(4, 12);
		expect(usedHours.value).toBeCloseTo(6, 12);
		expect(usedHours.high).toBeCloseTo(8, 12);
		expect(openingHours.low).toBeCloseTo(20, 12);
		expect(openingHours.high).toBeCloseTo(40, 12);
		expect(remainingHours.low).toBeCloseTo(336 - 48, 9);
		expect(remainingHours.high).toBeCloseTo(336 - 24, 9);
	});
});
