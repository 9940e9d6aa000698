// @vitest-environment node
import { describe, expect, it } from 'vitest';
import type { Handover } from '$lib/domain/receiving/assessment';
import { packTrace } from '$lib/domain/trace/pack';
import type { AssessedBasis, TraceBasis } from '$lib/schemas/trace-basis';
import { buildLimit, buildSpec } from '../../../../../../tests/accuracy/build';
import { foretell, overlapsTrim } from './foretell';
import { readingRow } from './reading-row';
import { assessWhole, indexAt, pointsOfWhole, wholeTraceOf } from './whole-trace';

const hour = 3_600_000;
/** At 10 °C an hour uses three at 0 °C, so every figure here is worked out by hand. Limit 12 °C, so that 10 °C is within. */
const spec = buildSpec({
	referenceCelsius: 0,
	fullLifeHours: 100,
	fullLifeUncertaintyHours: 0,
	model: { kind: 'constant-q10', q10: 3 },
	upper: buildLimit(12),
	lower: null,
	freezingCelsius: null,
	ceilingCelsius: null,
	chillingCelsius: null
});

const handover = (id: string, holder: string, hours: number): Handover => ({
	...{
		id,
		holder,
		place: 'P',
		plannedMs: null,
		plusMinusMinutes: 0,
		setPointCelsius: null,
		allowedHours: null
	},
	actualMs: hours * hour
});

const line = (more: Partial<AssessedBasis> = {}): AssessedBasis => ({
	...{ assessmentId: 'a1', lineId: 'l1', line: 1, lot: 'OB-1', isGoverning: true, spec },
	...{ accuracyCelsius: 0, placement: 'between-cases', trims: [], neededHours: 60 },
	opening: { kind: 'declared', hours: 10, plusMinusHours: 0, basis: 'said' },
	handovers: [handover('x', 'Packhouse', 2), handover('y', 'Carrier', 10), handover('z', 'Dock', 20)],
	...more
});

/** One reading an hour from 0 to 22 h; at the hours named another temperature than 0 °C. */
function whole(
	lines: AssessedBasis[],
	warm: Record<number, number> = {},
	clockShiftMs = 0,
	without: number[] = []
) {
	const hours = Array.from({ length: 23 }, (_, i) => i).filter((at) => !without.includes(at));
	const packed = packTrace({
		unit: 'celsius',
		decimals: 1,
		times: Float64Array.from(hours, (at) => at * hour - clockShiftMs),
		scaled: Int32Array.from(hours, (at) => (warm[at] ?? 0) * 10)
	});
	const basis: TraceBasis = {
		traceId: 't1',
		packed: Buffer.from(packed).toString('base64'),
		clockShiftMs,
		assessed: lines
	};
	return wholeTraceOf(basis);
}

function assessed(trace: ReturnType<typeof whole>) {
	const [basis] = trace.assessed;
	const assessment = basis && assessWhole(trace, basis);
	if (!basis || !assessment || typeof assessment === 'string') throw new Error('not assessed');
	return { assessment, basis };
}

describe('a trace that has arrived', () => {
	it('has its clock put right and every reading', () => {
		const { trace, celsius } = whole([line()], { 5: 10 }, -2 * hour);
		expect([...trace.times.slice(0, 2)]).toEqual([0, hour]);
		expect([trace.times.length, celsius[5], celsius[6]]).toEqual([23, 10, 0]);
	});

	it.each([
		[0, 0],
		[5, 5],
		[2.5, -1],
		[-1, -1],
		[23, -1]
	])('has at hour %d the reading %d', (at, index) => {
		expect(indexAt(whole([line()]).trace.times, at * hour)).toBe(index);
	});

	it('says why it cannot be assessed', () => {
		const far = line({ handovers: [handover('x', 'A', 500), handover('y', 'B', 600)] });
		const trace = whole([far]);
		expect(assessWhole(trace, far)).toBe('no-readings-in-window');
		expect(readingRow(trace, null, 3)).toMatchObject({
			counting: 'not-assessed',
			leftHours: null,
			celsius: 0
		});
	});

	it('is read at the crosshair to the reading, with the life left then', () => {
		const trace = whole([line()]);
		const points = pointsOfWhole(trace, assessed(trace));
		expect(points.times).toHaveLength(23);
		// 100 h, 10 before, and one an hour since the first handover at hour 2.
		expect(points.at(12)).toMatchObject({ ms: 12 * hour, celsius: 0, leftHours: 80, leftLowHours: 80 });
		expect(points.at(1)).toMatchObject({ celsius: 0, leftHours: null });
		expect(pointsOfWhole(trace, null).at(12)).toMatchObject({ celsius: 0, leftHours: null });
	});
});

describe('a row of the table', () => {
	it.each([
		[1, { counting: 'before-custody', leg: null, usedHours: null, leftHours: null }],
		[2, { counting: 'counted', leg: { ordinal: 1, holder: 'Packhouse' }, usedHours: 0, leftHours: 90 }],
		[9, { counting: 'counted', leg: { ordinal: 1, holder: 'Packhouse' }, usedHours: 7, leftHours: 83 }],
		[10, { counting: 'counted', leg: { ordinal: 2, holder: 'Carrier' }, usedHours: 8, leftHours: 82 }],
		[20, { counting: 'counted', leg: { ordinal: 2, holder: 'Carrier' }, usedHours: 18, leftHours: 72 }],
		[21, { counting: 'after-custody', leg: null, usedHours: null, leftHours: null }]
	])('at hour %d says whose hands it was in and what life was left', (at, expected) => {
		const trace = whole([line()]);
		expect(readingRow(trace, assessed(trace), at)).toMatchObject({ ms: at * hour, celsius: 0, ...expected });
	});

	it('names the excursion it is in, as the docket numbers them', () => {
		const strict = line({
			spec: { ...spec, upper: { ...buildLimit(4), graceMinutes: 0, graceMinutesInAll: 0 } }
		});
		const trace = whole([strict], { 5: 10, 6: 10, 14: 10, 15: 10 });
		const said = [4, 5, 6, 8, 14].map(
			(at) => readingRow(trace, assessed(trace), at).excursion?.number ?? null
		);
		expect(said).toEqual([null, 1, 1, null, 2]);
		expect(readingRow(trace, assessed(trace), 5).excursion?.kind).toBe('too-warm');
	});

	it('says what was left out by a person, and what follows a gap', () => {
		const trimmed = line({ trims: [{ fromMs: 17 * hour, toMs: 20 * hour }] });
		const trace = whole([trimmed], {}, 0, [6, 7, 8, 9]);
		const row = (at: number) => readingRow(trace, assessed(trace), indexAt(trace.trace.times, at * hour));
		expect([16, 17, 20, 21].map((at) => row(at).counting)).toEqual([
			'counted',
			'trimmed',
			'trimmed',
			'after-custody'
		]);
		expect([row(10).gapMinutes, row(11).gapMinutes]).toEqual([300, null]);
	});
});

describe('what a trim would make of the figure', () => {
	/** Three hours in a warm hand at the end: a ramp up over an hour, two hours at 10 °C. */
	const warmEnd = { 18: 10, 19: 10, 20: 10 };

	it('is told for each line before it is sent', () => {
		const trace = whole(
			[line(), line({ assessmentId: 'a2', line: 2, lot: 'OB-2', neededHours: 10 })],
			warmEnd
		);
		const stretch = { fromMs: 17.5 * hour, toMs: 20 * hour };
		const [first, second] = foretell(trace, stretch);
		// Left out from 17:30: 15 h at 0 °C since hour 2 are used, and 75 of 100 are left.
		expect(first?.then?.usedHours).toBeCloseTo(15, 9);
		expect(first?.then?.remainingHours.value).toBeCloseTo(75, 9);
		// Before: the 15 h, two hours at three times the speed, and the ramp's log-mean of (3 − 1) / ln 3.
		expect(first?.now.usedHours).toBeCloseTo(15 + 6 + 2 / Math.log(3), 9);
		expect(second).toMatchObject({ line: 2, lot: 'OB-2', isNeedCrossed: false });
	});

	it('says so where the need is crossed, in either direction', () => {
		const need = (neededHours: number) =>
			foretell(whole([line({ neededHours })], warmEnd), { fromMs: 17.5 * hour, toMs: 20 * hour })[0]
				?.isNeedCrossed;
		expect([need(60), need(70), need(76)]).toEqual([false, true, false]);
	});

	it('is nothing where too little would be left, or nothing was assessed', () => {
		expect(foretell(whole([line()]), { fromMs: 0, toMs: 19.5 * hour })[0]?.then).toBeNull();
		expect(foretell(whole([]), { fromMs: 0, toMs: hour })).toEqual([]);
	});

	it.each([
		[10, 12, false],
		[12, 13, false],
		[12, 14, true],
		[13.5, 14.5, true],
		[15, 16, false]
	])('from %d to %d h lies over another trim: %s', (from, to, expected) => {
		const trace = whole([line({ trims: [{ fromMs: 13 * hour, toMs: 15 * hour }] })]);
		expect(overlapsTrim(trace, { fromMs: from * hour, toMs: to * hour })).toBe(expected);
	});
});
