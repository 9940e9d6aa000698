import { describe, expect, it } from 'vitest';
import { buildInput, buildLimit, buildSpec, buildTrace, hourMs } from '../../../../tests/accuracy/build';
import { assess } from './assess';
import type { Assessment, Excursion, Range, StopHit } from './assessment';
import type { Evidence } from './evidence';
import { recommend } from './recommend';
import type { ReasonCode } from './recommendation';

const spec = buildSpec({ upper: buildLimit(4), neededHours: 264 });
const quiet = assess(buildInput(buildTrace(new Array<number>(37).fill(1), 5), spec));

function assessmentWith(overrides: Partial<Assessment>): Assessment {
	return { ...quiet, ...overrides };
}

function evidenceWith(overrides: Partial<Evidence> = {}): Evidence {
	return {
		spec,
		assessment: quiet,
		accuracyCelsius: 0.5,
		openingKind: 'declared',
		neededHours: 264,
		seal: { text: '0093187', isIntact: true },
		pulp: [],
		cases: { advised: 100, received: 100 },
		calibrations: [{ serial: 'A-118', dueOn: '2026-08-01' }],
		arrivedOn: '2026-04-03',
		disagreement: null,
		journeyEndMs: null,
		...overrides
	};
}

const withLife = (remainingHours: Range) => evidenceWith({ assessment: assessmentWith({ remainingHours }) });
const verdict = (evidence: Evidence) => recommend(evidence).recommended;
const gradesOf = (evidence: Evidence): Partial<Record<ReasonCode, string>> =>
	Object.fromEntries(recommend(evidence).reasons.map((reason) => [reason.code, reason.grade]));

describe('life against the need of 264 h', () => {
	it.each([
		[{ low: 270, value: 280, high: 290 }, 'accept', 'life-suffices', 'inform'],
		[{ low: 264, value: 264, high: 264 }, 'accept', 'life-suffices', 'inform'],
		[{ low: 263.9, value: 280, high: 290 }, 'hold', 'life-low-short', 'hold'],
		[{ low: 250, value: 264, high: 290 }, 'hold', 'life-low-short', 'hold'],
		[{ low: 250, value: 263.9, high: 264 }, 'hold', 'life-short', 'hold'],
		[{ low: 250, value: 255, high: 263.9 }, 'reject', 'life-short', 'reject'],
		[{ low: -30, value: -10, high: -5 }, 'reject', 'life-short', 'reject']
	] as const)('%o: %s', (life, recommended, code, grade) => {
		const found = recommend(withLife(life));
		expect(found.recommended).toBe(recommended);
		expect(found.reasons).toEqual([expect.objectContaining({ code, grade })]);
	});

	it('carries its figures', () => {
		expect(recommend(withLife({ low: 232.8, value: 242.4, high: 252 })).reasons[0]).toEqual({
			code: 'life-short',
			grade: 'reject',
			lowHours: 232.8,
			highHours: 252,
			valueHours: 242.4,
			neededHours: 264
		});
	});

	it('that is not known never holds by itself', () => {
		const found = recommend(evidenceWith({ assessment: null }));
		expect(found).toEqual({ recommended: 'accept', reasons: [{ code: 'life-not-known', grade: 'note' }] });
	});
});

describe('stops', () => {
	const hit: StopHit = {
		kind: 'freezing',
		stopCelsius: -1.3,
		extremeCelsius: -2,
		firstAtMs: 5,
		minutes: 140,
		isInDoubt: false
	};

	it('reject when reached and hold when in doubt', () => {
		expect(verdict(evidenceWith({ assessment: assessmentWith({ stops: [hit] }) }))).toBe('reject');
		const doubtful = evidenceWith({ assessment: assessmentWith({ stops: [{ ...hit, isInDoubt: true }] }) });
		expect(verdict(doubtful)).toBe('hold');
		expect(recommend(doubtful).reasons[0]).toMatchObject({ code: 'stop-in-doubt', accuracyCelsius: 0.5 });
	});
});

describe('excursions', () => {
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
	const withExcursion = (overrides: Partial<Excursion>) =>
		evidenceWith({ assessment: assessmentWith({ excursions: [{ ...excursion, ...overrides }] }) });

	it.each([
		['minor', false, 'inform', 'accept'],
		['major', false, 'note', 'accept'],
		['critical', false, 'hold', 'hold'],
		['critical', true, 'note', 'accept'],
		['minor', true, 'inform', 'accept']
	] as const)('%s, in doubt %s: %s, %s', (severity, isInDoubt, grade, recommended) => {
		expect(gradesOf(withExcursion({ severity, isInDoubt })).excursion).toBe(grade);
		expect(verdict(withExcursion({ severity, isInDoubt }))).toBe(recommended);
	});

	it('are numbered as on the docket and name the holders of their legs', () => {
		const leg = { ordinal: 2, holder: 'road' };
		const assessment = assessmentWith({ excursions: [excursion, { ...excursion, legs: [] }] });
		const legs = [{ ...leg }, { ...leg, ordinal: 1, holder: 'packhouse' }];
		const found = recommend(evidenceWith({ assessment: { ...assessment, legs: legs as never } }));
		const excursions = found.reasons.filter((reason) => reason.code === 'excursion');
		expect(excursions.map((reason) => [reason.ordinal, reason.holders])).toEqual([
			[1, ['road']],
			[2, []]
		]);
	});
});

describe('findings at the door', () => {
	it.each([
		['seal-broken', { seal: { text: '17', isIntact: false } }, 'hold'],
		['pulp-above-limit', { pulp: [{ celsius: 4.1, position: 'tail' }] }, 'hold'],
		[
			'loggers-disagree',
			{ disagreement: { differenceCelsius: 1.1, allowedCelsius: 1, serials: ['a', 'b'] } },
			'hold'
		],
		['cases-differ', { cases: { advised: 100, received: 99 } }, 'accept'],
		['calibration-overdue', { calibrations: [{ serial: 'A-118', dueOn: '2026-04-02' }] }, 'accept'],
		['pulp-against-air', { pulp: [{ celsius: 2.6, position: 'nose' }] }, 'accept'],
		['opening-undeclared', { openingKind: 'undeclared' }, 'accept'],
		['logger-stopped-early', { journeyEndMs: quiet.windowToMs + 4 * hourMs }, 'accept'],
		['logger-stopped-early', { journeyEndMs: quiet.windowToMs + 4 * hourMs + 1 }, 'hold']
	] as const)('%s by %o: %s', (code, overrides, recommended) => {
		const evidence = evidenceWith(overrides as Partial<Evidence>);
		expect(gradesOf(evidence)[code]).toBe(recommended === 'hold' ? 'hold' : 'note');
		expect(verdict(evidence)).toBe(recommended);
	});

	it.each([
		{ seal: null },
		{ cases: null },
		{ pulp: [{ celsius: 1.5, position: 'nose' }] },
		{ disagreement: { differenceCelsius: 1, allowedCelsius: 1, serials: ['a', 'b'] } },
		{ calibrations: [{ serial: 'A-118', dueOn: '2026-04-03' }] },
		{ calibrations: [{ serial: 'A-118', dueOn: null }] },
		{ journeyEndMs: quiet.windowToMs + hourMs / 6 }
	])('%o say nothing', (overrides) => {
		expect(Object.keys(gradesOf(evidenceWith(overrides)))).toEqual(['life-suffices']);
	});

	it('hold pulp against the ceiling where the spec sets no limit', () => {
		const bare = buildSpec({ ceilingCelsius: 5 });
		const pulp = [{ celsius: 5.1, position: 'tail' }];
		expect(gradesOf(evidenceWith({ spec: bare, pulp }))['pulp-above-limit']).toBe('hold');
		expect(gradesOf(evidenceWith({ spec: buildSpec(), pulp }))['pulp-above-limit']).toBeUndefined();
	});
});

describe('findings in the trace', () => {
	const gap = { fromMs: 0, toMs: hourMs, usedHours: { value: 1, low: 1, high: 1 } };

	it('note time not observed, and hold more than a quarter of the window', () => {
		const withGap = (unobservedHours: number) =>
			evidenceWith({ assessment: assessmentWith({ gaps: [gap], unobservedHours }) });
		// The window is three hours.
		expect(gradesOf(withGap(0.75)).unobserved).toBe('note');
		expect(gradesOf(withGap(0.76)).unobserved).toBe('hold');
	});

	it('note time outside the model, with the range the model has', () => {
		const points = [
			{ celsius: 0, lifeHours: 9 },
			{ celsius: 10, lifeHours: 4 }
		];
		const table = buildSpec({ model: { kind: 'life-table', points } });
		const assessment = assessmentWith({ aboveModelHours: 2, belowModelHours: 1 });
		expect(recommend(evidenceWith({ spec: table, assessment })).reasons).toContainEqual({
			code: 'outside-model',
			grade: 'note',
			hours: 3,
			fromCelsius: 0,
			toCelsius: 10
		});
	});

	it('hold a mean kinetic temperature over its limit, by the worst window where there is one', () => {
		const mkt = { activationEnergyKilojoulesPerMole: null, windowHours: 24, limitCelsius: 8 };
		const limited = buildSpec({ mkt });
		const at = (mktCelsius: number, worstWindowMktCelsius: number | null) =>
			evidenceWith({ spec: limited, assessment: assessmentWith({ mktCelsius, worstWindowMktCelsius }) });
		expect(verdict(at(7, 8.2852))).toBe('hold');
		expect(verdict(at(7, 5.6463))).toBe('accept');
		expect(verdict(at(8, null))).toBe('accept');
		expect(verdict(at(8.01, null))).toBe('hold');
	});
});

describe('a recommendation', () => {
	it('follows its strictest reason and shows the gravest first', () => {
		const found = recommend(
			evidenceWith({
				assessment: assessmentWith({ remainingHours: { low: 1, value: 2, high: 3 } }),
				openingKind: 'undeclared',
				seal: { text: '17', isIntact: false }
			})
		);
		expect(found.recommended).toBe('reject');
		expect(found.reasons.map((reason) => reason.grade)).toEqual(['reject', 'hold', 'note']);
	});

	it('is the same for the same evidence', () => {
		expect(recommend(evidenceWith())).toEqual(recommend(evidenceWith()));
	});
});
