import type { Oddity, ReadContext } from '../ingestion';
import { msPerDay } from '../times/calendar';
import { blocksOf, isOneRecording, type Block, type Run } from './clock-blocks';
import type { Gathered } from './gathered';
import { oddityOf } from './oddities';
import type { AxisOrOpen, TimeAxis } from './open-times';

/** A step forward that is longer than a week and than fifty usual steps is no gap that a journey has. */
const jumpMs = 7 * msPerDay;
const jumpSteps = 50;
/** So many rows with a wrong date between rows that run on are a slip of the clock, not a restart. */
const longestSlip = 3;
/** More steps back than this, and than two in a hundred rows, are rows out of order. */
const mostRestarts = 3;

/** Rows in the order in which they were logged, without those that have no time. */
function runOf({ ms }: TimeAxis, gathered: Gathered): Run {
	const rows: number[] = [];
	let [up, down] = [0, 0];
	let last = NaN;
	for (let i = 0; i < gathered.count; i++) {
		const at = ms[i] ?? NaN;
		if (Number.isNaN(at)) continue;
		if (at > last) up++;
		else if (at < last) down++;
		last = at;
		rows.push(i);
	}
	if (down > up) rows.reverse();
	const times = new Float64Array(rows.length);
	for (let k = 0; k < times.length; k++) times[k] = ms[rows[k] ?? 0] ?? NaN;
	return { rows, times, usualMs: NaN };
}

function usualStep(times: Float64Array): number {
	const counts = new Map<number, number>();
	for (let i = 1; i < times.length; i++) {
		const step = (times[i] ?? 0) - (times[i - 1] ?? 0);
		if (step > 0) counts.set(step, (counts.get(step) ?? 0) + 1);
	}
	let [usual, most] = [0, 0];
	for (const [step, count] of counts) if (count > most) [usual, most] = [step, count];
	return usual;
}

/** True where time runs on without a step against its way or a leap: nearly all files. Rows without a time are none. */
function runsOn(ms: Float64Array, count: number): boolean {
	let last = NaN;
	let way = 0;
	for (let i = 0; i < count; i++) {
		const at = ms[i] ?? NaN;
		if (at !== at) continue;
		const step = at - last;
		last = at;
		if (step > 0 ? way < 0 || step > msPerDay : step < 0 && (way > 0 || step < -msPerDay)) return false;
		if (way === 0 && step !== 0 && step === step) way = step;
	}
	return true;
}

/** Whether rows follow each other at their usual step, more or less; those that were shuffled do not. */
function isSteady({ times, usualMs }: Run): boolean {
	let steady = 0;
	for (let i = 1; i < times.length; i++) {
		const step = (times[i] ?? 0) - (times[i - 1] ?? 0);
		if (Math.abs(step - usualMs) <= usualMs / 10) steady++;
	}
	return steady * 2 >= times.length - 1;
}

/** Places in a run of rows whose date slipped: far from the row before, which the row after them continues. */
function slipsIn({ times, usualMs }: Run): Set<number> {
	const slips = new Set<number>();
	const farMs = Math.max(msPerDay, 20 * usualMs);
	for (let k = 1; k < times.length - 1; k++) {
		const last = times[k - 1] ?? 0;
		if (Math.abs((times[k] ?? 0) - last) <= farMs) continue;
		for (let length = 1; length <= longestSlip && k + length < times.length; length++) {
			const after = (times[k + length] ?? 0) - last;
			if (after <= 0 || after > (length + 2) * usualMs) continue;
			for (let i = 0; i < length; i++) slips.add(k + i);
			k += length;
			break;
		}
	}
	return slips;
}

function without({ rows, times, usualMs }: Run, places: ReadonlySet<number>): Run {
	if (places.size === 0) return { rows, times, usualMs };
	return {
		rows: rows.filter((_, k) => !places.has(k)),
		times: times.filter((_, k) => !places.has(k)),
		usualMs
	};
}

function jumpsIn({ rows, times, usualMs }: Run): number[] {
	const limit = Math.max(jumpMs, jumpSteps * usualMs);
	return rows.filter((_, k) => k > 0 && (times[k] ?? 0) - (times[k - 1] ?? 0) > limit);
}

/** The times with only the rows of the first block, or with each later block moved to follow the one before. */
function settled(
	ms: Float64Array,
	{ rows, usualMs }: Run,
	blocks: readonly Block[],
	part: 'before' | 'joined'
): Float64Array {
	const out = ms.slice();
	let end = blocks[0]?.lastMs ?? 0;
	for (const block of blocks.slice(1)) {
		const shift = end + usualMs - block.firstMs;
		for (let k = block.from; k < block.to; k++) {
			const row = rows[k] ?? 0;
			out[row] = part === 'before' ? NaN : (out[row] ?? NaN) + shift;
		}
		end = block.lastMs + shift;
	}
	return out;
}

function told(axis: TimeAxis, more: readonly (Oddity | null)[]): readonly Oddity[] {
	return [...(axis.oddities ?? []), ...more.filter((oddity) => oddity !== null)];
}

/**
 * Looks at the clock over the whole file: a date that slipped for a row or three is set aside, a leap ahead is told, and
 * where the clock fell back and ran on the dock is asked whether to keep what stood before or to join both.
 */
export function settleClock(axis: TimeAxis, gathered: Gathered, context: ReadContext): AxisOrOpen {
	if (runsOn(axis.ms, gathered.count)) return axis;
	const whole = runOf(axis, gathered);
	const run: Run = { ...whole, usualMs: usualStep(whole.times) };
	const slips = slipsIn(run);
	const slipped = [...slips].map((k) => run.rows[k] ?? 0);
	const ms = axis.ms.slice();
	for (const row of slipped) ms[row] = NaN;
	const clean = without(run, slips);
	const lineOf = (row: number): number => gathered.lines[row] ?? 0;
	const lines = [...slipped, ...jumpsIn(clean)].map(lineOf).sort((a, b) => a - b);
	const jumps = oddityOf('clock-jump', lines, slipped.length > 0 ? String(slipped.length) : null);
	const base: TimeAxis = { ...axis, ms, setAside: new Set(slipped), oddities: told(axis, [jumps]) };
	const blocks = blocksOf(clean);
	const isShuffled = blocks.length - 1 > Math.max(mostRestarts, clean.rows.length / 50) || !isSteady(clean);
	if (blocks.length < 2 || isShuffled || isOneRecording(clean, blocks, gathered)) return base;
	return restarted(base, clean, blocks, context, lineOf);
}

function restarted(
	base: TimeAxis,
	run: Run,
	blocks: readonly Block[],
	{ answers }: ReadContext,
	lineOf: (row: number) => number
): AxisOrOpen {
	const { part } = answers;
	if (part === undefined) {
		const options = (['before', 'joined'] as const).map((choice) => ({
			answer: { part: choice },
			label: choice,
			ms: settled(base.ms, run, blocks, choice)
		}));
		return { code: 'part', why: 'clock-restarts', options };
	}
	// A section's name answers another question: what stands before the restart is certain.
	const chosen = part === 'joined' ? 'joined' : 'before';
	const later = run.rows.slice(blocks[1]?.from ?? run.rows.length);
	const oddity = oddityOf('clock-restart', later.map(lineOf), chosen);
	return {
		...base,
		ms: settled(base.ms, run, blocks, chosen),
		setAside: new Set([...(base.setAside ?? []), ...(chosen === 'before' ? later : [])]),
		oddities: told(base, [oddity]),
		decisions: [...(base.decisions ?? []), { field: 'part', value: chosen, because: 'answer', detail: null }]
	};
}
