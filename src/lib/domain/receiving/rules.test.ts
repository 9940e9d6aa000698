import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildInput, buildLimit, buildSpec, buildTrace, hourMs } from '../../../../tests/accuracy/build';
import { assess } from './assess';
import type { Assessment, Excursion, StopHit } from './assessment';
import type { Evidence } from './evidence';
import { allowedIntervalMinutes } from './gate-reasons';
import { recommend } from './recommend';
import { settableGrades, type Grade, type ReasonCode } from './recommendation';
import { rules } from './rules';
import { settableFindings } from './settable-findings';

const mkt = { activationEnergyKilojoulesPerMole: null, windowHours: null, limitCelsius: 8 };
const spec = buildSpec({ upper: buildLimit(4), neededHours: 264, mkt });
/** Four hours at 1 °C, a reading every 5 min. */
const quiet = assess(buildInput(buildTrace(new Array<number>(49).fill(1), 5), spec));

const calm: Evidence = {
	spec,
	assessment: quiet,
	accuracyCelsius: 0.5,
	openingKind: 'declared',
	neededHours: 264,
	seal: { text: '0093187', isIntact: true },
	pulp: [{ celsius: 1.2, position: 'tail' }],
	cases: { advised: 100, received: 100 },
	calibrations: [{ serial: 'A-118', dueOn: '2026-08-01' }],
	arrivedOn: '2026-04-03',
	disagreement: null,
	journeyStartMs: quiet.windowFromMs,
	journeyEndMs: quiet.windowToMs,
	plannedJourneyMs: 4 * hourMs,
	startDelayMinutes: 0,
	isLoggerRequired: true,
	unit: { setPointCelsius: 1, agreedCelsius: 1, returnAirCelsius: 2 },
	printedDate: { bestBeforeOn: '2026-04-20', neededDays: 10, lastBestBeforeOn: '2026-04-20' }
};

const excursion: Excursion = {
	kind: 'too-warm',
	severity: 'minor',
	limitCelsius: 4,
	fromMs: 0,
	toMs: hourMs,
	minutes: 60,
	extremeCelsius: 8,
	extremeAtMs: 5,
	meanCelsius: 6,
	degreeMinutes: 120,
	costHours: 1.7,
	legs: [2],
	isInDoubt: false,
	isOpen: false
};
const stop: StopHit = {
	kind: 'ceiling',
	stopCelsius: 8,
	extremeCelsius: 9,
	firstAtMs: 5,
	minutes: 10,
	isInDoubt: false
};
const gap = { fromMs: 0, toMs: hourMs, usedHours: { value: 1, low: 1, high: 1 } };
const life = (low: number, value: number, high: number) => ({ remainingHours: { low, value, high } });
const dated = (bestBeforeOn: string | null, lastBestBeforeOn: string | null = null) => ({
	printedDate: { bestBeforeOn, neededDays: 10, lastBestBeforeOn }
});

interface Row {
	code: ReasonCode;
	grade: Grade;
	/** What a product or lane may not change. */
	isFixed?: true;
	trace?: Partial<Assessment>;
	door?: Partial<Evidence>;
}

/** Every finding with evidence that fires it, alone, and its grade unless set. */
const table: readonly Row[] = [
	{ code: 'life-low-short', grade: 'hold', isFixed: true, trace: life(263, 280, 290) },
	{ code: 'life-short', grade: 'hold', isFixed: true, trace: life(240, 260, 270) },
	{ code: 'life-short', grade: 'reject', isFixed: true, trace: life(240, 250, 263) },
	{
		code: 'customer-life-short',
		grade: 'hold',
		// 288 h at 0 °C of a low of 287; a need at 10 °C would be worth three times as much at a Q10 of 3.
		trace: life(287, 300, 310),
		door: { spec: { ...spec, neededAtCustomer: { hours: 288, celsius: 0 } } }
	},
	{ code: 'stop-reached', grade: 'reject', isFixed: true, trace: { stops: [stop] } },
	{
		code: 'stop-in-doubt',
		grade: 'hold',
		isFixed: true,
		trace: { stops: [{ ...stop, isInDoubt: true }] }
	},
	{ code: 'excursion', grade: 'inform', trace: { excursions: [excursion] } },
	{ code: 'excursion', grade: 'note', trace: { excursions: [{ ...excursion, severity: 'major' }] } },
	{ code: 'excursion', grade: 'hold', trace: { excursions: [{ ...excursion, severity: 'critical' }] } },
	{
		code: 'excursion',
		grade: 'note',
		trace: { excursions: [{ ...excursion, severity: 'critical', isInDoubt: true }] }
	},
	{ code: 'unobserved', grade: 'note', trace: { gaps: [gap], unobservedHours: 1 } },
	{ code: 'unobserved', grade: 'hold', trace: { gaps: [gap], unobservedHours: 1.01 } },
	{ code: 'mkt-over-limit', grade: 'hold', trace: { mktCelsius: 8.01 } },
	{ code: 'outside-model', grade: 'note', trace: { aboveModelHours: 1 } },
	{ code: 'logger-stopped-early', grade: 'note', door: { journeyEndMs: quiet.windowToMs + 4 * hourMs } },
	{ code: 'logger-stopped-early', grade: 'hold', door: { journeyEndMs: quiet.windowToMs + 4.1 * hourMs } },
	{ code: 'logger-started-late', grade: 'note', door: { journeyStartMs: quiet.windowFromMs - hourMs } },
	{ code: 'interval-too-long', grade: 'note', trace: { usualIntervalMs: 301_000 } },
	{ code: 'opening-undeclared', grade: 'note', door: { openingKind: 'undeclared' } },
	{ code: 'loggers-disagree', grade: 'hold', door: disagreement(1.1) },
	{
		code: 'calibration-overdue',
		grade: 'note',
		door: { calibrations: [{ serial: 'A-118', dueOn: '2026-04-02' }] }
	},
	{ code: 'seal-broken', grade: 'hold', door: { seal: { text: '17', isIntact: false } } },
	{
		code: 'pulp-against-air',
		grade: 'note',
		door: { pulp: [{ celsius: 2.6, position: 'nose' }] }
	},
	{ code: 'cases-differ', grade: 'note', door: { cases: { advised: 100, received: 99 } } },
	{
		code: 'unit-set-point-differs',
		grade: 'note',
		door: { unit: { setPointCelsius: 2, agreedCelsius: 1, returnAirCelsius: null } }
	},
	{
		code: 'unit-return-air-warm',
		grade: 'note',
		door: { unit: { setPointCelsius: null, agreedCelsius: null, returnAirCelsius: 4.1 } }
	},
	{ code: 'date-passed', grade: 'hold', door: dated('2026-04-02') },
	{ code: 'date-short', grade: 'hold', door: dated('2026-04-12') },
	{ code: 'older-than-last', grade: 'hold', door: dated('2026-04-19', '2026-04-20') },
	{ code: 'date-missing', grade: 'note', door: dated(null) }
];

/** What speaks where no trace does. */
const traceless: readonly Row[] = [
	{ code: 'evidence-incomplete', grade: 'hold', door: { pulp: [] } },
	{ code: 'logger-missing', grade: 'note', door: {} },
	{ code: 'transit-late', grade: 'note', door: { plannedJourneyMs: 3.9 * hourMs } },
	{ code: 'pulp-above-limit', grade: 'hold', door: { pulp: [{ celsius: 4.1, position: 'tail' }] } },
	{ code: 'seal-broken', grade: 'hold', door: { seal: { text: '17', isIntact: false } } }
];

function disagreement(differenceCelsius: number): Partial<Evidence> {
	return { disagreement: { differenceCelsius, allowedCelsius: 1, serials: ['a', 'b'] } };
}

function evidenceOf(rows: readonly Row[]): Evidence {
	const assessment = rows.reduce<Assessment>((sum, row) => ({ ...sum, ...row.trace }), quiet);
	return rows.reduce<Evidence>((sum, row) => ({ ...sum, ...row.door }), { ...calm, assessment });
}

const strictest: Readonly<Record<Grade, 'accept' | 'hold' | 'reject'>> = {
	inform: 'accept',
	note: 'accept',
	hold: 'hold',
	reject: 'reject'
};
const foundBy = (evidence: Evidence, code: ReasonCode) =>
	recommend(evidence).reasons.filter((reason) => reason.code === code);

describe('the table of rules', () => {
	it('finds nothing against a calm load whose low suffices', () => {
		const found = recommend(calm);
		expect(found.recommended).toBe('accept');
		expect(found.reasons.map(({ code }) => code)).toEqual(['life-suffices']);
	});

	it.each(table)('$code is $grade: and alone it decides so', (row) => {
		const evidence = evidenceOf([row]);
		expect(foundBy(evidence, row.code)).toEqual([expect.objectContaining({ grade: row.grade })]);
		expect(recommend(evidence).recommended).toBe(strictest[row.grade]);
	});

	it.each(traceless)('without a trace, $code is $grade', (row) => {
		const evidence = { ...evidenceOf([row]), assessment: null };
		expect(foundBy(evidence, row.code)).toEqual([expect.objectContaining({ grade: row.grade })]);
		expect(recommend(evidence).recommended).toBe(strictest[row.grade]);
		expect(foundBy(evidence, 'life-not-known')).toHaveLength(1);
	});

	it('without a trace holds nothing by itself', () => {
		expect(recommend({ ...calm, assessment: null }).recommended).toBe('accept');
		expect(recommend({ ...calm, assessment: null, pulp: [], journeyEndMs: null }).recommended).toBe('accept');
	});

	it.each([...table, ...traceless])(
		'$code ($grade) takes the grade product and lane set, or is fixed',
		(row) => {
			for (const set of settableGrades) {
				const bare = evidenceOf([row]);
				const assessment = traceless.includes(row) ? null : bare.assessment;
				const evidence = { ...bare, assessment, grades: { [row.code]: set } };
				const expected = row.isFixed ? row.grade : set;
				expect(foundBy(evidence, row.code).map(({ grade }) => grade)).toEqual([expected]);
				expect(recommend(evidence).recommended).toBe(strictest[expected]);
			}
		}
	);

	it('names every code that can be found, so that none goes untested', () => {
		const named = new Set([...table, ...traceless].map(({ code }) => code));
		const others = ['life-suffices', 'life-not-known'];
		expect([...named, ...others].toSorted()).toEqual(allCodes.toSorted());
		expect(rules.filter(({ isSettable }) => !isSettable).map(({ name }) => name)).toEqual(['life', 'stops']);
	});

	it('lets the strictest of any findings decide, and accepts only where the low suffices', () => {
		fc.assert(
			fc.property(fc.subarray([...table]), (rows) => {
				const evidence = evidenceOf(rows);
				const { recommended, reasons } = recommend(evidence);
				const has = (grade: Grade) => reasons.some((reason) => reason.grade === grade);
				expect(recommended).toBe(has('reject') ? 'reject' : has('hold') ? 'hold' : 'accept');
				if (recommended !== 'accept') return;
				expect(evidence.assessment?.remainingHours.low).toBeGreaterThanOrEqual(evidence.neededHours);
			}),
			{ numRuns: 500 }
		);
	});
});

const allCodes: ReasonCode[] = [
	'life-suffices',
	'life-low-short',
	'life-short',
	'life-not-known',
	'customer-life-short',
	'stop-reached',
	'stop-in-doubt',
	'excursion',
	'unobserved',
	'logger-stopped-early',
	'logger-started-late',
	'logger-missing',
	'opening-undeclared',
	'loggers-disagree',
	'calibration-overdue',
	'seal-broken',
	'pulp-above-limit',
	'pulp-against-air',
	'cases-differ',
	'mkt-over-limit',
	'outside-model',
	'evidence-incomplete',
	'transit-late',
	'unit-set-point-differs',
	'unit-return-air-warm',
	'interval-too-long',
	'date-passed',
	'date-short',
	'date-missing',
	'older-than-last'
];

describe('the interval of recording', () => {
	// Source: EN 12830:1999, 4.9.2.2; of two classes that meet the stricter.
	it.each([
		[20, 5],
		[23.99, 5],
		[24, 5],
		[24.01, 15],
		[30, 15],
		[168, 15],
		[168.01, 60],
		[192, 60]
	])('of a journey of %d h may be %d min', (hours, minutes) => {
		expect(allowedIntervalMinutes(hours)).toBe(minutes);
	});

	it.each([
		[20, 10, 5],
		[20, 5, null],
		[30, 15, null],
		[30, 16, 15],
		[192, 60, null],
		[192, 61, 60]
	])('on a journey of %d h every %d min is checked against %j', (hours, everyMinutes, allowedMinutes) => {
		const assessment = { ...quiet, usualIntervalMs: everyMinutes * 60_000 };
		const journeyEndMs = quiet.windowFromMs + hours * hourMs;
		const found = foundBy({ ...calm, assessment, journeyEndMs }, 'interval-too-long');
		expect(found).toEqual(
			allowedMinutes === null
				? []
				: [expect.objectContaining({ everyMinutes, allowedMinutes, journeyHours: hours })]
		);
	});
});

describe('the printed date', () => {
	it.each([
		['2026-04-03', null, null, []],
		['2026-04-02', null, null, ['date-passed']],
		['2026-04-13', 10, null, []],
		['2026-04-12', 10, null, ['date-short']],
		['2026-04-20', null, '2026-04-20', []],
		['2026-04-19', null, '2026-04-20', ['older-than-last']],
		['2026-04-05', 10, '2026-04-20', ['date-short', 'older-than-last']],
		[null, null, null, []],
		[null, 10, null, ['date-missing']]
	])('%j with %j days needed after %j: %j', (bestBeforeOn, neededDays, lastBestBeforeOn, codes) => {
		const printedDate = { bestBeforeOn, neededDays, lastBestBeforeOn };
		const found = recommend({ ...calm, printedDate }).reasons.map(({ code }) => code);
		expect(found.filter((code) => code !== 'life-suffices')).toEqual(codes);
	});

	it('counts calendar days across the change of clocks', () => {
		const printedDate = { bestBeforeOn: '2026-03-30', neededDays: 2, lastBestBeforeOn: null };
		expect(foundBy({ ...calm, arrivedOn: '2026-03-28', printedDate }, 'date-short')).toEqual([]);
	});
});

describe('the findings that may be graded', () => {
	it('are those of the table that are not fixed, each with its grade unless set', () => {
		const usual = new Map<string, Set<Grade>>();
		for (const { code, grade, isFixed } of table)
			if (!isFixed) usual.set(code, (usual.get(code) ?? new Set()).add(grade));
		// Those that fire only without a trace, or beside another finding, are in no row of the table.
		for (const code of ['evidence-incomplete', 'pulp-above-limit'] as const)
			usual.set(code, new Set(['hold']));
		for (const code of ['logger-missing', 'transit-late'] as const) usual.set(code, new Set(['note']));
		expect(settableFindings.map(({ code }) => code).toSorted()).toEqual([...usual.keys()].toSorted());
		for (const { code, usualGrade } of settableFindings) {
			const grades = [...(usual.get(code) ?? [])];
			expect([code, usualGrade]).toEqual([code, grades.length === 1 ? grades[0] : null]);
		}
	});
});

describe('life at the customer', () => {
	const needing = (hours: number, celsius: number) => ({
		spec: { ...spec, neededAtCustomer: { hours, celsius } }
	});

	it.each([
		// Q10 of 3, by its definition: a day at 10 °C is worth three at the reference, one at 20 °C nine.
		[300, 300, 0, []],
		[299, 300, 0, ['customer-life-short']],
		[300, 100, 10, []],
		[299, 100, 10, ['customer-life-short']],
		[300, 34, 20, ['customer-life-short']],
		[-5, 1, 0, ['life-short', 'customer-life-short']]
	] as const)('a low of %d h against %d h at %d °C: %j', (low, hours, celsius, expected) => {
		const assessment = { ...quiet, ...life(low, 320, 330) };
		const found = rules.flatMap(({ find }) =>
			find({ ...calm, ...needing(hours, celsius), neededHours: 264, assessment })
		);
		const codes = found.map(({ code }) => code).filter((code) => /short/.test(code));
		expect(codes.filter((code) => code !== 'life-low-short')).toEqual(
			expected.filter((code) => code !== 'life-short')
		);
	});

	it('is asked of nobody who does not ask, nor of a line without a trace', () => {
		expect(foundBy(calm, 'customer-life-short')).toEqual([]);
		expect(foundBy({ ...calm, ...needing(10_000, 0), assessment: null }, 'customer-life-short')).toEqual([]);
	});
});
