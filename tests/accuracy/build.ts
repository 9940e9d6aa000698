import type { AssessInput, Handover } from '../../src/lib/domain/receiving/assessment';
import type { Limit, Spec } from '../../src/lib/domain/shelf-life/spec';
import type { Trace } from '../../src/lib/domain/trace/trace';

export const minuteMs = 60_000;
export const hourMs = 3_600_000;
export const dayHours = 24;
/** An instant on a whole hour, long after 1970: sums of minutes must not lose digits there. */
export const startMs = Date.UTC(2026, 2, 30, 6);

/** A spec with every figure set and no rule beyond the model: tests say what they add. */
export function buildSpec(overrides: Partial<Spec> = {}): Spec {
	return {
		referenceCelsius: 0,
		fullLifeHours: 14 * dayHours,
		fullLifeUncertaintyHours: 0,
		model: { kind: 'constant-q10', q10: 3 },
		validFromCelsius: -60,
		validToCelsius: 60,
		chillingCelsius: null,
		freezingCelsius: null,
		ceilingCelsius: null,
		upper: null,
		lower: null,
		neededHours: 0,
		openingDefaultHours: 0,
		mkt: { activationEnergyKilojoulesPerMole: null, windowHours: null, limitCelsius: null },
		sources: [],
		caution: null,
		...overrides
	};
}

/** A limit without grace or hysteresis; every event is minor. */
export function buildLimit(celsius: number, overrides: Partial<Limit> = {}): Limit {
	return {
		celsius,
		graceMinutes: 0,
		graceMinutesInAll: 0,
		hysteresisCelsius: 0,
		majorMinutes: 100_000,
		criticalMinutes: 100_000,
		...overrides
	};
}

/** A trace in °C with two decimals, one reading every `everyMinutes`. */
export function buildTrace(celsius: readonly number[], everyMinutes = 10, fromMs = startMs): Trace {
	return traceAt(
		celsius.map((_, i) => fromMs + i * everyMinutes * minuteMs),
		celsius
	);
}

/** A trace in °C with two decimals at the given instants. */
export function traceAt(times: readonly number[], celsius: readonly number[]): Trace {
	return {
		unit: 'celsius',
		decimals: 2,
		times: Float64Array.from(times),
		scaled: Int32Array.from(celsius, (reading) => Math.round(reading * 100))
	};
}

export function buildHandover(
	id: string,
	actualMs: number | null,
	overrides: Partial<Handover> = {}
): Handover {
	return {
		id,
		holder: `holder ${id}`,
		place: `place ${id}`,
		plannedMs: null,
		actualMs,
		plusMinusMinutes: 0,
		setPointCelsius: null,
		allowedHours: null,
		...overrides
	};
}

/** An exact instrument in the product, nothing used before: tests say what they add. */
export function buildInput(trace: Trace, spec: Spec, overrides: Partial<AssessInput> = {}): AssessInput {
	return {
		spec,
		trace,
		accuracyCelsius: 0,
		placement: 'in-product',
		opening: { kind: 'declared', hours: 0, plusMinusHours: 0, basis: 'harvested into the load' },
		handovers: [],
		trims: [],
		neededHours: null,
		...overrides
	};
}

/** Temperature held for each stretch: two readings a stretch, a millisecond apart where they jump. */
export function heldTrace(stretches: readonly (readonly [hours: number, celsius: number])[]): Trace {
	const times: number[] = [];
	const celsius: number[] = [];
	let ms = startMs;
	for (const [hours, held] of stretches) {
		times.push(ms + (times.length === 0 ? 0 : 1), ms + hours * hourMs);
		celsius.push(held, held);
		ms += hours * hourMs;
	}
	return traceAt(times, celsius);
}
