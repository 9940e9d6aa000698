import { assess } from '../../src/lib/domain/receiving/assess';
import type { RateModel } from '../../src/lib/domain/shelf-life/spec';
import { lifeSides } from '../../src/lib/domain/receiving/life-sides';
import { courseOf } from '../../src/lib/domain/shelf-life/course';
import { passagesOf } from '../../src/lib/domain/shelf-life/passages';
import { rateCurve } from '../../src/lib/domain/shelf-life/rate-curve';
import { packTrace } from '../../src/lib/domain/trace/pack';
import { SharedRoom } from '../../src/lib/domain/trace/room';
import type { Trace } from '../../src/lib/domain/trace/trace';
import { buildHandover, buildInput, buildLimit, buildSpec, minuteMs, startMs } from '../accuracy/build';

/** What an engine run cost, in the milliseconds of one run: only their ratios mean the same on any machine. */
export interface EngineRatios {
	readonly readings: number;
	/** A bare loop of one Math.exp a reading. */
	readonly exponentialMs: number;
	/** Cumulative life used by a constant Q10, without the other figures. */
	readonly lifeAloneMs: number;
	/** The whole assessment, by model. */
	readonly modelMs: Readonly<Record<string, number>>;
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
export function coldRoomTrace(readings: number, seed = 12_345): Trace {
	const scaled = new Int32Array(readings);
	let state = seed;
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

/** So many rounds, each model in each; the fastest counts, since the rest is the machine's other work. */
const rounds = 12;

/** Measures one piece of work in milliseconds; by the processor's time a busy machine does not count. */
export type Stopwatch = (work: () => unknown) => number;

/** Assesses one long trace by every model, with limits, handovers and a rolling window, and measures it. */
export function measureEngine(readings: number, stopwatch: Stopwatch): EngineRatios {
	const trace = coldRoomTrace(readings);
	const room = new SharedRoom();
	const works: Record<string, () => unknown> = {
		exponential: () => exponentials(trace),
		'life-alone': () => lifeAlone(trace, room)
	};
	for (const [name, model] of Object.entries(models)) {
		const input = inputOf(trace, model);
		works[name] = () => assess(input, room);
	}
	const best: Record<string, number> = {};
	for (let round = 0; round < rounds; round++) {
		for (const [name, work] of Object.entries(works)) {
			best[name] = Math.min(best[name] ?? Infinity, stopwatch(work));
		}
	}
	const { exponential = NaN, 'life-alone': lifeAloneMs = NaN, ...modelMs } = best;
	return {
		readings,
		exponentialMs: exponential,
		lifeAloneMs,
		modelMs,
		packedBytesPerReading: packTrace(trace).length / readings
	};
}

function exponentials({ scaled }: Trace): number {
	let sum = 0;
	for (let i = 0; i < scaled.length; i++) sum += Math.exp((scaled[i] as number) / 100);
	return sum;
}

/** Cumulative life used at every reading and nothing else. */
function lifeAlone(trace: Trace, room: SharedRoom): number {
	const curve = rateCurve(buildSpec({ model: { kind: 'constant-q10', q10: 3 } }));
	const course = courseOf(trace, null, [], room);
	const { value } = lifeSides(course, passagesOf(course, room), { curve, accuracyCelsius: 0.5 }, room);
	return value.usedHours[value.usedHours.length - 1] as number;
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
