import type { AssessmentView, SeriesView } from '$lib/schemas/docket';
import { legs } from './sample';

/* Three loggers of the invented docket: a drawing, not a check value. */
const minute = 60_000;
const startMs = Date.parse('2026-03-30T06:10:00Z');
const at = (iso: string) => Date.parse(`${iso}+02:00`);

/** Straight lines between what happened at the door ends, the nose of the load and between. */
const shapes: Record<string, [string, number][]> = {
	L3: [
		['2026-03-30T07:40', 1.6],
		['2026-03-30T08:40', 2.1],
		['2026-03-30T11:00', 1.2],
		['2026-03-30T19:50', 0.8],
		['2026-03-30T20:30', 1.6],
		['2026-03-30T20:50', 4.4],
		['2026-03-30T21:10', 4.6],
		['2026-03-30T21:50', 3.4],
		['2026-03-31T01:00', 1.5],
		['2026-03-31T05:00', 0.8],
		['2026-04-02T04:30', 0.6],
		['2026-04-02T05:20', 1.4],
		['2026-04-02T05:50', 4.2],
		['2026-04-02T08:00', 9.2],
		['2026-04-02T11:00', 11.3],
		['2026-04-02T12:40', 10.8],
		['2026-04-02T15:00', 5.4],
		['2026-04-02T16:10', 3.6],
		['2026-04-02T20:00', 1.4],
		['2026-04-02T23:00', 0.3],
		['2026-04-03T00:30', -0.4],
		['2026-04-03T02:40', -1.1],
		['2026-04-03T03:40', -0.4],
		['2026-04-03T05:30', 0.6],
		['2026-04-03T07:00', 3.2],
		['2026-04-03T07:40', 5.0]
	]
};

function shapeAt(ms: number, points: readonly [string, number][]): number {
	for (let index = 1; index < points.length; index++) {
		const [from, low] = points[index - 1] ?? ['', 0];
		const [to, high] = points[index] ?? ['', 0];
		if (ms <= at(to)) return low + ((high - low) * (ms - at(from))) / (at(to) - at(from));
	}
	return points.at(-1)?.[1] ?? 0;
}

/** A small saw-tooth stands for the unit's cycles. */
function ripple(index: number): number {
	return ((((index * 7919) % 23) - 11) / 11) * 0.16 + (index % 36 < 6 ? 0.15 : 0);
}

const gap = { fromMs: at('2026-04-01T02:10'), toMs: at('2026-04-01T04:20') };

function seriesOf(label: string, share: number): SeriesView {
	const times: number[] = [];
	const celsius: (number | null)[] = [];
	const remaining: number[] = [];
	let left = 432 - 48.7;
	for (let index = -3; index <= 574; index++) {
		const ms = startMs + index * 10 * minute;
		const warm = shapeAt(ms, shapes.L3 ?? []);
		const value =
			Math.round((warm > 1 ? 1 + (warm - 1) * share : warm * share) * 10 + ripple(index + 50) * 10) / 10;
		const isUnread = label === 'L3' && ms > gap.fromMs && ms < gap.toMs;
		left -= (1 / 6) * 4.83 ** (Math.max(0, warm) / 10);
		times.push(ms);
		celsius.push(isUnread ? null : value);
		remaining.push(left);
	}
	const isGoverning = label === 'L3';
	const spread = (at: number) => (at / 578) * 9.6;
	return {
		traceId: label,
		label,
		isGoverning,
		fromAt: new Date(times[0] ?? 0).toISOString(),
		toAt: new Date(times.at(-1) ?? 0).toISOString(),
		times,
		celsius,
		remainingHours: isGoverning ? remaining : null,
		remainingLowHours: isGoverning ? remaining.map((hours, at) => hours - spread(at)) : null,
		remainingHighHours: isGoverning ? remaining.map((hours, at) => hours + spread(at)) : null,
		totalReadings: times.length
	};
}

export const series = [seriesOf('L1', 0.24), seriesOf('L2', 0.55), seriesOf('L3', 1)];

const excursion = { meanCelsius: 0, degreeMinutes: 0, legs: [], isInDoubt: false, isOpen: false };
const handovers = [
	'03-30T08:10',
	'03-30T20:40',
	'03-31T05:15',
	'04-02T03:30',
	'04-02T14:50',
	'04-03T05:52',
	'04-03T07:10'
];

export const assessment: AssessmentView = {
	id: 'a3',
	lineId: '3',
	traceId: 'L3',
	logger: 'L3',
	isGoverning: true,
	engineVersion: '1.4.2',
	specId: 'blueberry',
	specName: 'Blueberry, fresh',
	specVersion: 7,
	windowFromAt: '2026-03-30T06:10:00Z',
	windowToAt: '2026-04-03T05:10:00Z',
	openingHours: { low: 44, value: 48.7, high: 53 },
	openingBasis: 'declared: 6 h 30 min at 15 °C, harvest to pre-cool',
	openingKind: 'declared',
	usedHours: { low: 131, value: 140.9, high: 150 },
	remainingHours: { low: 232.8, value: 242.4, high: 252 },
	neededHours: 264,
	fullLifeHours: 432,
	accuracyCelsius: 0.5,
	upperCelsius: 4,
	lowerCelsius: -0.5,
	freezingCelsius: -1.3,
	ceilingCelsius: null,
	meanCelsius: 1.9,
	mktCelsius: 2.4,
	minCelsius: -1.1,
	maxCelsius: 11.3,
	gaps: [
		{ fromAt: new Date(gap.fromMs).toISOString(), toAt: new Date(gap.toMs).toISOString(), usedHours: 2.2 }
	],
	unobservedHours: 2.2,
	unobservedUsedHours: 2.2,
	belowModelHours: 4.2,
	aboveModelHours: 0,
	chilledHours: 0,
	trimmedHours: 1,
	excursions: [
		{
			...excursion,
			kind: 'too-warm',
			severity: 'minor',
			limitCelsius: 4,
			fromMs: at('2026-03-30T20:44'),
			toMs: at('2026-03-30T21:36'),
			minutes: 52,
			extremeCelsius: 4.6,
			extremeAtMs: at('2026-03-30T21:10'),
			costHours: 1.7
		},
		{
			...excursion,
			kind: 'too-warm',
			severity: 'critical',
			limitCelsius: 4,
			fromMs: at('2026-04-02T05:46'),
			toMs: at('2026-04-02T15:50'),
			minutes: 603,
			extremeCelsius: 11.3,
			extremeAtMs: at('2026-04-02T11:00'),
			costHours: 41.2
		},
		{
			...excursion,
			kind: 'too-cold',
			severity: 'major',
			limitCelsius: -0.5,
			fromMs: at('2026-04-03T01:00'),
			toMs: at('2026-04-03T03:20'),
			minutes: 140,
			extremeCelsius: -1.1,
			extremeAtMs: at('2026-04-03T02:40'),
			costHours: 2.3
		}
	],
	stops: [],
	legs: legs.map((leg, index) => ({
		ordinal: index + 1,
		handoverId: `h${index}`,
		holder: leg.holder,
		place: leg.place,
		fromMs: at(`2026-${handovers[index]}`),
		toMs: at(`2026-${handovers[index + 1]}`),
		plannedMinutes: leg.planned,
		tookMinutes: leg.took,
		setPointCelsius: 0.5,
		allowedHours: leg.allowed,
		usedHours: leg.used,
		overHours: leg.warm + leg.late,
		tooWarmHours: leg.warm,
		tooLateHours: leg.late,
		shareOfUsed: leg.used / 140.9,
		butForRemainingHours: null,
		coveredFraction: 1
	}))
};
