import type { Decision, DecisionReason, ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import { msPerDay } from '../times/calendar';
import { monthsMeant, twofoldMonths } from '../times/month-names';
import type { Gathered } from './gathered';
import { instantsOf, localTimes, momentMs } from './instants';
import { endsOf, type OpenTimes } from './open-times';

interface Reading {
	readonly name: 'croatian' | 'polish-czech';
	readonly gathered: Gathered;
	readonly local: Float64Array;
}

/** The rows with settled months, and what settled them. */
export interface SettledMonths {
	readonly gathered: Gathered;
	readonly decisions: readonly Decision[];
}

function readAs(gathered: Gathered, name: Reading['name']): Reading {
	const months = gathered.times.b.slice();
	for (let i = 0; i < gathered.count; i++) {
		const meant = gathered.times.isSettled[i] === 2 ? monthsMeant(months[i] ?? 0) : null;
		if (meant !== null) months[i] = meant[name === 'croatian' ? 1 : 0];
	}
	const settled = { ...gathered, times: { ...gathered.times, b: months } };
	return { name, gathered: settled, local: localTimes(settled, null) };
}

function largestStep({ local }: Reading): number {
	let [most, last] = [0, NaN];
	for (const at of local) {
		if (Number.isNaN(at)) continue;
		if (!Number.isNaN(last)) most = Math.max(most, Math.abs(at - last));
		last = at;
	}
	return most;
}

/** A month against a few days passes easily. */
const stepRatio = 5;

/** There is no 31st of November. */
function withFewestGaps(readings: readonly Reading[]): readonly Reading[] {
	const lost = readings.map(({ local }) => local.reduce((rows, at) => rows + (Number.isNaN(at) ? 1 : 0), 0));
	return readings.filter((_, i) => lost[i] === Math.min(...lost));
}

function byContinuity(all: readonly Reading[]): readonly Reading[] {
	const readings = withFewestGaps(all);
	const steps = readings.map(largestStep);
	const least = Math.min(...steps);
	return readings.filter((_, i) => (steps[i] ?? 0) <= Math.max(least * stepRatio, least + 2 * msPerDay));
}

function byDeclared(readings: readonly Reading[], stated: Stated): readonly Reading[] {
	const edges = [stated.startText, stated.stopText].map((text) => momentMs(text, null, 'UTC'));
	const near = readings.filter(({ local }) => {
		const { firstMs, lastMs } = endsOf(local);
		return edges.some((at) => at !== null && at >= firstMs - 2 * msPerDay && at <= lastMs + 2 * msPerDay);
	});
	return near.length > 0 ? near : readings;
}

function byUpload(readings: readonly Reading[], { uploadedMs }: ReadContext): readonly Reading[] {
	const past = readings.filter(({ local }) => endsOf(local).lastMs <= uploadedMs + msPerDay);
	return past.length > 0 ? past : readings;
}

/** The twofold names that the rows hold. */
function namesIn({ times, count }: Gathered): ReadonlySet<number> {
	const seen = new Set<number>();
	for (let i = 0; i < count; i++)
		if (times.isSettled[i] === 2 && (times.b[i] ?? 0) > 12) seen.add(times.b[i] ?? 0);
	return seen;
}

/**
 * Settles names that are one month in Croatian and another elsewhere: by the file's other months, its words, its
 * declared start, the upload; else the dock is asked by the moment at which the file would begin.
 */
export function settleMonths(
	gathered: Gathered,
	stated: Stated,
	context: ReadContext,
	zone: string
): SettledMonths | OpenTimes {
	const names = namesIn(gathered);
	if (names.size === 0) return { gathered, decisions: [] };
	// No other language has these two together.
	const areBothThere = names.has(twofoldMonths.lip) && names.has(twofoldMonths.srp);
	const readings = [readAs(gathered, 'polish-czech'), readAs(gathered, 'croatian')];
	const steps: readonly [DecisionReason, (left: readonly Reading[]) => readonly Reading[]][] = [
		[
			'continuity',
			(left) => (areBothThere ? left.filter(({ name }) => name === 'croatian') : byContinuity(left))
		],
		[
			'head',
			(left) =>
				left.filter(({ name }) => stated.isCroatian === null || stated.isCroatian === (name === 'croatian'))
		],
		['declared', (left) => byDeclared(left, stated)],
		['upload', (left) => byUpload(left, context)]
	];
	const settled = (reading: Reading, because: DecisionReason): SettledMonths => ({
		gathered: reading.gathered,
		decisions: [{ field: 'time', value: reading.name, because, detail: null }]
	});
	let left: readonly Reading[] = readings;
	for (const [because, narrow] of steps) {
		left = narrow(left);
		const [only] = left;
		if (left.length === 1 && only !== undefined) return settled(only, because);
	}
	const options = left.map((reading) => {
		const { ms } = instantsOf(reading.gathered, null, zone);
		return { reading, option: { answer: { startMs: endsOf(ms).firstMs }, label: reading.name, ms } };
	});
	const { startMs } = context.answers;
	const answered = options.find(({ option }) => option.answer.startMs === startMs);
	return answered === undefined
		? { code: 'start', why: 'two-languages', options: options.map(({ option }) => option) }
		: {
				gathered: answered.reading.gathered,
				decisions: [
					{ field: 'time', value: answered.reading.name, because: 'answer', detail: null },
					{ field: 'start', value: new Date(startMs ?? 0).toISOString(), because: 'answer', detail: null }
				]
			};
}
