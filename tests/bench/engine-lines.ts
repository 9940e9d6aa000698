import { assess } from '../../src/lib/domain/receiving/assess';
import { coldRoomTrace, inputOf, measureEngine, type Stopwatch } from './engine';
import { measureNumpy } from './numpy';
import { measureStored } from './stored';

const whatIfReadings = 50_000;
const whatIfRounds = 40;

/** Milliseconds of the processor, its system's share included: what a shared machine leaves comparable. */
const processorTime: Stopwatch = (work) => {
	const from = process.cpuUsage();
	work();
	const { user, system } = process.cpuUsage(from);
	return (user + system) / 1000;
};

const times = (ratio: number) => `${ratio.toFixed(1)} ×`;
const million = (figure: number) => `${(figure / 1e6).toFixed(1)} million`;

/** The engine against a bare exponential a reading and against numpy, by processor time in one run. */
export function engineLines(readings: number): string[] {
	const { exponentialMs, lifeAloneMs, modelMs, packedBytesPerReading } = measureEngine(
		readings,
		processorTime
	);
	const numpy = measureNumpy(readings);
	return [
		`Assessing ${readings.toLocaleString('en')} readings, every figure (target: 3 × one Math.exp a reading,`,
		'but for arrhenius; one exponential a reading took ' + `${exponentialMs.toFixed(1)} ms):`,
		...Object.entries(modelMs).map(
			([model, ms]) => `  ${model.padEnd(14)} ${ms.toFixed(1)} ms, ${times(ms / exponentialMs)}`
		),
		numpy === null
			? 'Against numpy: left out, python3-numpy is not installed'
			: `Cumulative life alone: ${lifeAloneMs.toFixed(1)} ms, numpy ${numpy.ms.toFixed(1)} ms: ` +
				`${times(lifeAloneMs / numpy.ms)} (target: 1 at most)`,
		`Packed: ${packedBytesPerReading.toFixed(3)} bytes a reading`
	];
}

/** A what-if moves one figure and assesses anew: the middle of many runs, in memory of its own each time. */
export function whatIfLines(): string[] {
	const trace = coldRoomTrace(whatIfReadings);
	const input = inputOf(trace, { kind: 'constant-q10', q10: 3 });
	const taken = Array.from({ length: whatIfRounds }, (_, round) =>
		processorTime(() => assess({ ...input, accuracyCelsius: 0.1 + round / 100 }))
	).sort((a, b) => a - b);
	const middle = taken[whatIfRounds / 2] ?? NaN;
	const slow = taken[Math.floor(whatIfRounds * 0.9)] ?? NaN;
	return [
		`What-if on ${whatIfReadings.toLocaleString('en')} readings: ${middle.toFixed(1)} ms, ` +
			`one in ten over ${slow.toFixed(1)} ms of the processor (target: under 16 ms)`
	];
}

/** Stored assessments recomputed to the last digit, the database included. */
export async function storedLines(shipments = 2_000, readingsEach = 5_000): Promise<string[]> {
	const { readings, seconds, processorSeconds, threads, isSound } = await measureStored(
		shipments,
		readingsEach
	);
	return [
		`Reassessing ${shipments.toLocaleString('en')} stored shipments of ${readingsEach.toLocaleString('en')} ` +
			`readings: ${seconds.toFixed(2)} s, ${million(readings / seconds)} readings a second on ${threads} ` +
			`threads (target: 5 million), ${processorSeconds.toFixed(2)} s of the processor; ${isSound ? 'every digit the same' : 'DIGITS DIFFER'}`
	];
}
