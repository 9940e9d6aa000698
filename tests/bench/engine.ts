import { assess } from '../../src/lib/domain/receiving/assess';
import type { RateModel } from '../../src/lib/domain/shelf-life/spec';
import { packTrace } from '../../src/lib/domain/trace/pack';
import type { Trace } from '../../src/lib/domain/trace/trace';
import { buildHandover, buildInput, buildLimit, buildSpec, minuteMs, startMs } from '../accuracy/build';

/** What an engine run cost, as ratios that mean the same on any machine. */
export interface EngineRatios {
	readonly readings: number;
	/** Seconds to assess the whole trace, by model. */
	readonly seconds: Readonly<Record<string, number>>;
	/** Time a reading against one Math.exp, by model: how many exponentials a reading is worth. */
	readonly exponentialsPerReading: Readonly<Record<string, number>>;
	readonly packedBytesPerReading: number;
}

const models: Readonly<Record<string, RateModel>> = {
	'constant-q10': { kind: 'constant-q10', q10: 3 },
	'life-table': {
		kind: 'life-table',
		points: [
			{ celsius: -5, lifeHours: 900 },
			{ celsius: 0, lifeHours: 672 },
			{ celsius: 5, lifeHours: 336 },
			{ celsius: 15, lifeHours: 60 }
		]
	},
	arrhenius: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 },
	'square-root': { kind: 'square-root', minCelsius: -10 }
};

/** A regular minute-by-minute trace at 0.1° steps that wanders between about −1 and 9 °C, the same every time. */
export function wanderingTrace(readings: number): Trace {
	const scaled = new Int32Array(readings);
	let state = 12_345;
	let value = 40;
	for (let i = 0; i < readings; i++) {
		// Source: Numerical Recipes, 7.1, the quick and dirty generator of 32 bits; its high bits are the good ones.
		state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
		const step = [0, 0, 0, 0, 0, 1, -1, 0][state >>> 29] ?? 0;
		value = Math.min(90, Math.max(-10, value + step));
		scaled[i] = value;
	}
	const times = Float64Array.from(scaled, (_, i) => startMs + i * minuteMs);
	return { unit: 'celsius', decimals: 1, times, scaled };
}

const minutesADay = 1440;
/** Every other day the doors stand open: minutes into the event and degrees above the set-point, tenths. */
const doorMinutes = 60;
const doorTenths = 55;

/**
 * A minute-by-minute log of a cold room at 0.1° steps: it hunts about 2 °C, and every other day an event of an hour
 * takes it to 7.5 °C and back. The same every time.
 */
export function coldRoomTrace(readings: number): Trace {
	const scaled = new Int32Array(readings);
	let state = 12_345;
	let value = 20;
	for (let i = 0; i < readings; i++) {
		// Source: Numerical Recipes, 7.1, the quick and dirty generator of 32 bits; its high bits are the good ones.
		state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
		const pull = Math.sign(20 - value);
		value += [0, 0, 0, 0, 0, 1, -1, pull][state >>> 29] ?? 0;
		const intoEvent = i % (2 * minutesADay);
		const isOpen = intoEvent < doorMinutes;
		scaled[i] = value + (isOpen ? Math.round(doorTenths * Math.sin((Math.PI * intoEvent) / doorMinutes)) : 0);
	}
	const times = Float64Array.from(scaled, (_, i) => startMs + i * minuteMs);
	return { unit: 'celsius', decimals: 1, times, scaled };
}

/** Assesses one long trace by every model, with limits, handovers and a rolling window, and measures it. */
export function measureEngine(readings: number, nowMs: () => number): EngineRatios {
	const trace = coldRoomTrace(readings);
	const exponentialMs = timeOf(nowMs, () => {
		let sum = 0;
		for (let i = 0; i < readings; i++) sum += Math.exp((trace.scaled[i] as number) / 100);
		return sum;
	});
	const seconds: Record<string, number> = {};
	const exponentialsPerReading: Record<string, number> = {};
	for (const [name, model] of Object.entries(models)) {
		const ms = timeOf(nowMs, () => assess(inputOf(trace, model)));
		seconds[name] = ms / 1000;
		exponentialsPerReading[name] = ms / exponentialMs;
	}
	const packedBytesPerReading = packTrace(trace).length / readings;
	return { readings, seconds, exponentialsPerReading, packedBytesPerReading };
}

export function inputOf(trace: Trace, model: RateModel) {
	const mkt = { activationEnergyKilojoulesPerMole: null, windowHours: 24, limitCelsius: 8 };
	const upper = buildLimit(6, { graceMinutes: 30, graceMinutesInAll: 90, hysteresisCelsius: 0.5 });
	const spec = buildSpec({
		model,
		mkt,
		upper,
		lower: buildLimit(0),
		freezingCelsius: -0.5,
		ceilingCelsius: 8
	});
	const endMs = trace.times[trace.times.length - 1] as number;
	const handovers = [0, 0.2, 0.5, 0.9, 1].map((part, i) =>
		buildHandover(`H${i}`, Math.round(startMs + part * (endMs - startMs)))
	);
	return buildInput(trace, spec, { accuracyCelsius: 0.5, handovers });
}

/** Best of three: the rest is the machine's other work. */
function timeOf(nowMs: () => number, work: () => unknown): number {
	let best = Infinity;
	for (let run = 0; run < 3; run++) {
		const from = nowMs();
		work();
		best = Math.min(best, nowMs() - from);
	}
	return best;
}
