import { describe, expect, it } from 'vitest';
import type { AssessmentView, SeriesView } from '../../schemas/docket';
import { buildModel, legLetter } from './chart-model';

function seriesOf(overrides: Partial<SeriesView>): SeriesView {
	return {
		traceId: 't1',
		label: 'L1',
		isGoverning: false,
		fromAt: '2026-04-02T00:00:00Z',
		toAt: '2026-04-02T00:20:00Z',
		times: [0, 600_000, 1_200_000],
		celsius: [0, 1, 2],
		remainingHours: null,
		remainingLowHours: null,
		remainingHighHours: null,
		totalReadings: 3,
		...overrides
	};
}

const governing = seriesOf({
	traceId: 't3',
	label: 'L3',
	isGoverning: true,
	times: [0, 1_200_000],
	celsius: [5, null],
	remainingHours: [48, 24],
	remainingLowHours: [36, 12],
	remainingHighHours: [60, null]
});

const limits = { ceilingCelsius: 60, upperCelsius: 4, lowerCelsius: -0.5, freezingCelsius: null };

function assessmentOf(overrides: Partial<AssessmentView>): AssessmentView {
	return {
		id: 'a',
		lineId: 'l',
		traceId: 't3',
		logger: 'L3',
		isGoverning: true,
		engineVersion: '1.4.2',
		specId: 's',
		specName: 'Blueberry, fresh',
		specVersion: 7,
		windowFromAt: '1970-01-01T00:00:00Z',
		windowToAt: '1970-01-01T00:20:00Z',
		openingHours: { low: 1, value: 2, high: 3 },
		openingBasis: '',
		openingKind: 'declared',
		usedHours: { low: 1, value: 2, high: 3 },
		remainingHours: { low: 1, value: 2, high: 3 },
		neededHours: 264,
		fullLifeHours: 432,
		accuracyCelsius: 0.5,
		...limits,
		meanCelsius: 1,
		mktCelsius: 1,
		minCelsius: 0,
		maxCelsius: 5,
		gaps: [],
		unobservedHours: 0,
		unobservedUsedHours: 0,
		belowModelHours: 0,
		aboveModelHours: 0,
		chilledHours: 0,
		trimmedHours: 0,
		excursions: [],
		stops: [],
		legs: [],
		...overrides
	};
}

describe('what the chart draws', () => {
	it('puts the governing trace first and aligns the others to one time axis', () => {
		const model = buildModel([seriesOf({}), governing], null, 'celsius');
		expect(model.labels).toEqual(['L3', 'L1']);
		expect(model.traces[0]).toEqual([0, 600_000, 1_200_000]);
		expect(model.traces[1]?.[0]).toBe(5);
		expect(model.traces[1]?.[1]).toBeUndefined();
		expect(model.traces[1]?.[2]).toBeNull();
	});

	it('gives temperatures in the reader’s unit and life in days', () => {
		const model = buildModel([governing], assessmentOf({}), 'fahrenheit');
		expect(model.traces[1]?.[0]).toBe(41);
		expect(model.life?.slice(1)).toEqual([
			[2, 1],
			[1.5, 0.5],
			[2.5, null]
		]);
		expect(model.neededDays).toBe(11);
		expect(model.fullDays).toBe(18);
	});

	it('draws the limits there are, and no scale is stretched to a far ceiling', () => {
		const model = buildModel([governing], assessmentOf({}), 'celsius');
		expect(model.limits.map((limit) => limit.kind)).toEqual(['ceiling', 'upper', 'lower']);
		expect(model.temperatures).toEqual({ least: -0.5, most: 5 });
	});

	it('draws a trace that nobody has assessed, and none at all', () => {
		expect(buildModel([seriesOf({})], null, 'celsius')).toMatchObject({
			life: null,
			limits: [],
			legs: [],
			window: null
		});
		expect(buildModel([], null, 'celsius').temperatures).toEqual({ least: 0, most: 10 });
	});

	it('letters the legs', () => {
		expect([0, 5, 25, 26].map(legLetter)).toEqual(['A', 'F', 'Z', 'A2']);
	});
});
