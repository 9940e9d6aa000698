import { describe, expect, it } from 'vitest';
import type { Reason } from '../../domain/receiving/recommendation';
import { reasonText } from './reasons';

const inCelsius = { unit: 'celsius', zone: 'Europe/Amsterdam', referenceCelsius: 0 } as const;
const inFahrenheit = { unit: 'fahrenheit', zone: 'America/Chicago', referenceCelsius: 0 } as const;
const atMs = Date.UTC(2026, 3, 2, 3, 46);

const cases: readonly (readonly [Reason, string])[] = [
	[
		{ code: 'life-suffices', grade: 'inform', lowHours: 290.4, valueHours: 297.6, neededHours: 264 },
		'12.4 d left, 12.1 d on the low; the order needs 11.0 d.'
	],
	[
		{ code: 'life-low-short', grade: 'hold', lowHours: 261.6, valueHours: 271.2, neededHours: 264 },
		'11.3 d left meets the need of 11.0 d; its low, 10.9 d, does not.'
	],
	[
		{
			code: 'life-short',
			grade: 'reject',
			lowHours: 232.8,
			highHours: 252,
			valueHours: 242.4,
			neededHours: 264
		},
		'10.1 d left, 10.5 d on the high; the order needs 11.0 d.'
	],
	[
		{
			code: 'life-short',
			grade: 'hold',
			lowHours: 232.8,
			highHours: 268.8,
			valueHours: 259.2,
			neededHours: 264
		},
		'10.8 d left; the order needs 11.0 d, which only the high, 11.2 d, meets.'
	],
	[{ code: 'life-not-known', grade: 'note' }, 'No trace for this line: life left is not known.'],
	[
		{
			code: 'stop-reached',
			grade: 'reject',
			stop: 'freezing',
			stopCelsius: -1.3,
			extremeCelsius: -2,
			atMs,
			minutes: 140
		},
		'−2.0 °C, at or below the freezing stop of −1.3 °C from Thu 2 Apr 05:46 for 2 h 20 min.'
	],
	[
		{
			code: 'stop-reached',
			grade: 'reject',
			stop: 'ceiling',
			stopCelsius: 10,
			extremeCelsius: 11.3,
			atMs,
			minutes: 9
		},
		'11.3 °C, above the ceiling of 10.0 °C from Thu 2 Apr 05:46 for 9 min.'
	],
	[
		{
			code: 'stop-in-doubt',
			grade: 'hold',
			stop: 'freezing',
			stopCelsius: -1.3,
			extremeCelsius: -1.1,
			accuracyCelsius: 0.5
		},
		'Coldest −1.1 ±0.5 °C; the freezing stop is −1.3 °C: freezing is neither shown nor excluded.'
	],
	[
		{
			code: 'stop-in-doubt',
			grade: 'hold',
			stop: 'ceiling',
			stopCelsius: 10,
			extremeCelsius: 9.7,
			accuracyCelsius: 0.5
		},
		'Warmest 9.7 ±0.5 °C; the ceiling is 10.0 °C: passing it is neither shown nor excluded.'
	],
	[
		{
			code: 'excursion',
			grade: 'hold',
			kind: 'too-warm',
			severity: 'critical',
			ordinal: 2,
			extremeCelsius: 11.3,
			limitCelsius: 4,
			minutes: 603,
			costHours: 41.2,
			holders: ['Sarn Quay', 'Anselm']
		},
		'E2 is critical: 11.3 °C and 10 h 3 min above 4.0 °C, with Sarn Quay and Anselm; it cost 41.2 h at 0.0 °C.'
	],
	[
		{
			code: 'excursion',
			grade: 'note',
			kind: 'too-cold',
			severity: 'major',
			ordinal: 3,
			extremeCelsius: -1.1,
			limitCelsius: -0.5,
			minutes: 140,
			costHours: 0,
			holders: []
		},
		'E3 is major: −1.1 °C and 2 h 20 min below −0.5 °C.'
	],
	[
		{ code: 'unobserved', grade: 'note', hours: 2.17, usedHours: 2.2, gaps: 1 },
		'1 gap, 2.2 h not observed, bridged linearly: 2.2 h at 0.0 °C of the life used.'
	],
	[
		{ code: 'unobserved', grade: 'hold', hours: 30, usedHours: 41, gaps: 3 },
		'3 gaps, 30.0 h not observed, bridged linearly: 41.0 h at 0.0 °C of the life used.'
	],
	[
		{ code: 'logger-stopped-early', grade: 'note', missingHours: 3.5 },
		'The readings end 3.5 h before the journey; that time is not in the life used.'
	],
	[
		{ code: 'opening-undeclared', grade: 'note', assumedHours: 48 },
		'No opening balance was declared: 48.0 h at 0.0 °C are taken as used before the first reading.'
	],
	[
		{
			code: 'loggers-disagree',
			grade: 'hold',
			differenceCelsius: 1.84,
			allowedCelsius: 1,
			serials: ['A-118', 'A-122']
		},
		'Loggers A-118 and A-122 differ by 1.8 °C on average; their accuracies allow 1.0 °C.'
	],
	[
		{ code: 'calibration-overdue', grade: 'note', serial: 'A-118', dueOn: '2026-03-01' },
		'Calibration of logger A-118 was due Sun 1 Mar 2026.'
	],
	[{ code: 'seal-broken', grade: 'hold', seal: '0093187' }, 'Seal 0093187 was not intact.'],
	[{ code: 'seal-broken', grade: 'hold', seal: '' }, 'The seal was not intact.'],
	[
		{ code: 'pulp-above-limit', grade: 'hold', pulpCelsius: 5.2, limitCelsius: 4, position: 'tail' },
		'Pulp at tail: 5.2 °C, above the limit of 4.0 °C.'
	],
	[
		{ code: 'pulp-against-air', grade: 'note', pulpCelsius: 5.2, traceCelsius: 1.2 },
		'Pulp 5.2 °C against 1.2 °C at the last reading.'
	],
	[
		{ code: 'cases-differ', grade: 'note', advised: 1120, received: 1098 },
		'1,098 cases received, 1,120 advised.'
	],
	[
		{ code: 'mkt-over-limit', grade: 'hold', mktCelsius: 8.2852, limitCelsius: 8, windowHours: 24 },
		'Mean kinetic temperature in the worst 24 h 8.3 °C; the limit is 8.0 °C.'
	],
	[
		{ code: 'mkt-over-limit', grade: 'hold', mktCelsius: 26.26, limitCelsius: 25, windowHours: null },
		'Mean kinetic temperature over the journey 26.3 °C; the limit is 25.0 °C.'
	],
	[
		{ code: 'outside-model', grade: 'note', hours: 4.17, fromCelsius: 0, toCelsius: 10 },
		"4.2 h outside the model's 0.0 °C to 10.0 °C; the rate is held there."
	],
	[
		{ code: 'evidence-incomplete', grade: 'hold' },
		'Neither a trace nor a pulp reading speaks for this line.'
	],
	[
		{ code: 'logger-missing', grade: 'note' },
		'A logger is required on this lane; none was read for this line.'
	],
	[
		{ code: 'logger-started-late', grade: 'note', missingHours: 2.5, startDelayMinutes: 30 },
		'The readings begin 2.5 h after custody did; that time is not in the life used. The logger has a start delay of 30 min.'
	],
	[
		{ code: 'logger-started-late', grade: 'note', missingHours: 2.5, startDelayMinutes: 0 },
		'The readings begin 2.5 h after custody did; that time is not in the life used.'
	],
	[
		{ code: 'transit-late', grade: 'note', tookHours: 61.5, plannedHours: 48 },
		'The journey took 61.5 h; 48.0 h were planned.'
	],
	[
		{ code: 'unit-set-point-differs', grade: 'note', setPointCelsius: 4, agreedCelsius: 1 },
		'The unit was set to 4.0 °C; 1.0 °C were agreed.'
	],
	[
		{ code: 'unit-return-air-warm', grade: 'note', returnAirCelsius: 9.2, limitCelsius: 4 },
		"The unit's return air read 9.2 °C; the limit is 4.0 °C."
	],
	[
		{ code: 'interval-too-long', grade: 'note', everyMinutes: 10, allowedMinutes: 5, journeyHours: 20 },
		'A reading every 10 min on a journey of 20.0 h; EN 12830 has 5 min at most.'
	],
	[
		{ code: 'date-passed', grade: 'hold', bestBeforeOn: '2026-04-02' },
		'The printed date, Thu 2 Apr 2026, has passed.'
	],
	[
		{ code: 'date-short', grade: 'hold', bestBeforeOn: '2026-04-10', days: 7, neededDays: 9 },
		'7 d to the printed date, Fri 10 Apr 2026; the customer asks for 9 d.'
	],
	[
		{
			code: 'customer-life-short',
			grade: 'hold',
			lowHours: 230,
			neededHours: 240,
			customerHours: 120,
			customerCelsius: 5
		},
		'The customer needs 5.0 d at 5.0 °C, worth 240.0 h at 0.0 °C; the low, 9.6 d, is less before any onward trip.'
	],
	[
		{ code: 'date-missing', grade: 'note' },
		'No printed date is written down; the customer has a rule for it.'
	],
	[
		{
			code: 'older-than-last',
			grade: 'hold',
			bestBeforeOn: '2026-04-09',
			lastBestBeforeOn: '2026-04-10'
		},
		'The printed date, Thu 9 Apr 2026, is before that last received, Fri 10 Apr 2026.'
	]
];

describe('a reason in English', () => {
	it.each(cases)('is one exact sentence: %o, %s', (reason, sentence) => {
		expect(reasonText(reason, inCelsius)).toBe(sentence);
	});

	it('has a sentence for every code', () => {
		expect(new Set(cases.map(([reason]) => reason.code)).size).toBe(30);
	});

	it('speaks in the reader’s unit, a span scaled and not shifted', () => {
		const [doubt] = cases.find(([reason]) => reason.code === 'stop-in-doubt') ?? [];
		expect(doubt && reasonText(doubt, inFahrenheit)).toBe(
			'Coldest 30.0 ±0.9 °F; the freezing stop is 29.7 °F: freezing is neither shown nor excluded.'
		);
	});

	it('speaks in the site’s zone', () => {
		const [stop] = cases.find(([reason]) => reason.code === 'stop-reached') ?? [];
		expect(stop && reasonText(stop, inFahrenheit)).toContain('Wed 1 Apr 22:46');
	});

	it('names no holder as at fault and calls nothing safe', () => {
		for (const [, sentence] of cases) expect(sentence).not.toMatch(/\b(safe|unsafe|fault|blame|caused)\b/i);
	});
});
