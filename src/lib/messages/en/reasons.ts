import type { Reason, ReasonCode } from '../../domain/receiving/recommendation';
import type { TemperatureUnit } from '../../domain/units';
import {
	count,
	decimal,
	duration,
	lifeDays,
	lifeHours,
	temperature,
	temperatureSign,
	temperatureSpan
} from '../../format';
import { calendarDay, dayTime } from '../../format-time';

/** How the reader wants figures: nothing is taken from the machine. */
export interface ReasonContext {
	readonly unit: TemperatureUnit;
	/** IANA zone of the site. */
	readonly zone: string;
	/** Life-hours are hours at this temperature. */
	readonly referenceCelsius: number;
	readonly locale?: string;
}

type Figures = ReturnType<typeof figuresIn>;
type Sentences = {
	readonly [Code in ReasonCode]: (reason: Extract<Reason, { code: Code }>, figures: Figures) => string;
};

/** Figures with their units, as a sentence has them. */
function figuresIn({ unit, zone, referenceCelsius, locale = 'en' }: ReasonContext) {
	const sign = temperatureSign(unit);
	const degrees = (celsius: number) => `${temperature(celsius, unit, locale)} ${sign}`;
	return {
		degrees,
		degreesApart: (celsius: number) => `${temperatureSpan(celsius, unit, locale)} ${sign}`,
		degreesPlusMinus: (celsius: number, accuracy: number) =>
			`${temperature(celsius, unit, locale)} ±${temperatureSpan(accuracy, unit, locale)} ${sign}`,
		days: (hours: number) => `${lifeDays(hours, locale)} d`,
		life: (hours: number) => `${lifeHours(hours, locale)} h at ${degrees(referenceCelsius)}`,
		hours: (hours: number) => `${decimal(hours, 1, locale)} h`,
		lasting: (minutes: number) => duration(Math.round(minutes) * 60_000),
		number: (figure: number) => count(figure, locale),
		instant: (ms: number) => dayTime(ms, zone, locale),
		day: (on: string) => calendarDay(on, locale)
	};
}

const sentences: Sentences = {
	'life-suffices': (reason, { days }) =>
		`${days(reason.valueHours)} left, ${days(reason.lowHours)} on the low; the order needs ${days(reason.neededHours)}.`,
	'life-low-short': (reason, { days }) =>
		`${days(reason.valueHours)} left meets the need of ${days(reason.neededHours)}; its low, ${days(reason.lowHours)}, does not.`,
	'life-short': (reason, { days }) =>
		reason.highHours < reason.neededHours
			? `${days(reason.valueHours)} left, ${days(reason.highHours)} on the high; the order needs ${days(reason.neededHours)}.`
			: `${days(reason.valueHours)} left; the order needs ${days(reason.neededHours)}, which only the high, ${days(reason.highHours)}, meets.`,
	'customer-life-short': (reason, { days, degrees, life }) =>
		`The customer needs ${days(reason.customerHours)} at ${degrees(reason.customerCelsius)}, worth ${life(reason.neededHours)}; the low, ${days(reason.lowHours)}, is less before any onward trip.`,
	'life-not-known': () => 'No trace for this line: life left is not known.',
	'stop-reached': stopReached,
	'stop-in-doubt': (reason, { degrees, degreesPlusMinus }) => {
		const read = degreesPlusMinus(reason.extremeCelsius, reason.accuracyCelsius);
		const stop = degrees(reason.stopCelsius);
		return reason.stop === 'freezing'
			? `Coldest ${read}; the freezing stop is ${stop}: freezing is neither shown nor excluded.`
			: `Warmest ${read}; the ceiling is ${stop}: passing it is neither shown nor excluded.`;
	},
	excursion: excursionText,
	unobserved: (reason, { hours, life }) =>
		`${reason.gaps === 1 ? '1 gap' : `${reason.gaps} gaps`}, ${hours(reason.hours)} not observed, bridged linearly: ${life(reason.usedHours)} of the life used.`,
	'logger-stopped-early': (reason, { hours }) =>
		`The readings end ${hours(reason.missingHours)} before the journey; that time is not in the life used.`,
	'opening-undeclared': (reason, { life }) =>
		`No opening balance was declared: ${life(reason.assumedHours)} are taken as used before the first reading.`,
	'loggers-disagree': (reason, { degreesApart }) =>
		`Loggers ${reason.serials.join(' and ')} differ by ${degreesApart(reason.differenceCelsius)} on average; their accuracies allow ${degreesApart(reason.allowedCelsius)}.`,
	'calibration-overdue': (reason, { day }) =>
		`Calibration of logger ${reason.serial} was due ${day(reason.dueOn)}.`,
	'seal-broken': (reason) =>
		reason.seal === '' ? 'The seal was not intact.' : `Seal ${reason.seal} was not intact.`,
	'pulp-above-limit': (reason, { degrees }) =>
		`Pulp at ${reason.position}: ${degrees(reason.pulpCelsius)}, above the limit of ${degrees(reason.limitCelsius)}.`,
	'pulp-against-air': (reason, { degrees }) =>
		`Pulp ${degrees(reason.pulpCelsius)} against ${degrees(reason.traceCelsius)} at the last reading.`,
	'cases-differ': (reason, { number }) =>
		`${number(reason.received)} cases received, ${number(reason.advised)} advised.`,
	'mkt-over-limit': (reason, { degrees, number }) => {
		const over =
			reason.windowHours === null ? 'over the journey' : `in the worst ${number(reason.windowHours)} h`;
		return `Mean kinetic temperature ${over} ${degrees(reason.mktCelsius)}; the limit is ${degrees(reason.limitCelsius)}.`;
	},
	'outside-model': (reason, { hours, degrees }) =>
		`${hours(reason.hours)} outside the model's ${degrees(reason.fromCelsius)} to ${degrees(reason.toCelsius)}; the rate is held there.`,
	'evidence-incomplete': () => 'Neither a trace nor a pulp reading speaks for this line.',
	'logger-missing': () => 'A logger is required on this lane; none was read for this line.',
	'logger-started-late': (reason, { hours, lasting }) =>
		`The readings begin ${hours(reason.missingHours)} after custody did; that time is not in the life used.` +
		(reason.startDelayMinutes > 0
			? ` The logger has a start delay of ${lasting(reason.startDelayMinutes)}.`
			: ''),
	'transit-late': (reason, { hours }) =>
		`The journey took ${hours(reason.tookHours)}; ${hours(reason.plannedHours)} were planned.`,
	'unit-set-point-differs': (reason, { degrees }) =>
		`The unit was set to ${degrees(reason.setPointCelsius)}; ${degrees(reason.agreedCelsius)} were agreed.`,
	'unit-return-air-warm': (reason, { degrees }) =>
		`The unit's return air read ${degrees(reason.returnAirCelsius)}; the limit is ${degrees(reason.limitCelsius)}.`,
	'interval-too-long': (reason, { lasting, hours }) =>
		`A reading every ${lasting(reason.everyMinutes)} on a journey of ${hours(reason.journeyHours)}; EN 12830 has ${lasting(reason.allowedMinutes)} at most.`,
	'date-passed': (reason, { day }) => `The printed date, ${day(reason.bestBeforeOn)}, has passed.`,
	'date-short': (reason, { day, number }) =>
		`${number(reason.days)} d to the printed date, ${day(reason.bestBeforeOn)}; the customer asks for ${number(reason.neededDays)} d.`,
	'date-missing': () => 'No printed date is written down; the customer has a rule for it.',
	'older-than-last': (reason, { day }) =>
		`The printed date, ${day(reason.bestBeforeOn)}, is before that last received, ${day(reason.lastBestBeforeOn)}.`
};

function stopReached(reason: Extract<Reason, { code: 'stop-reached' }>, figures: Figures): string {
	const { degrees, instant, lasting } = figures;
	const extreme = degrees(reason.extremeCelsius);
	const since = `from ${instant(reason.atMs)} for ${lasting(reason.minutes)}`;
	return reason.stop === 'freezing'
		? `${extreme}, at or below the freezing stop of ${degrees(reason.stopCelsius)} ${since}.`
		: `${extreme}, above the ceiling of ${degrees(reason.stopCelsius)} ${since}.`;
}

function excursionText(reason: Extract<Reason, { code: 'excursion' }>, figures: Figures): string {
	const { degrees, lasting, life } = figures;
	const beyond = reason.kind === 'too-warm' ? 'above' : 'below';
	const where = reason.holders.length === 0 ? '' : `, with ${reason.holders.join(' and ')}`;
	const cost = reason.costHours > 0 ? `; it cost ${life(reason.costHours)}` : '';
	return (
		`E${reason.ordinal} is ${reason.severity}: ${degrees(reason.extremeCelsius)} and ` +
		`${lasting(reason.minutes)} ${beyond} ${degrees(reason.limitCelsius)}${where}${cost}.`
	);
}

/** One exact sentence for a reason, with the figures it rests on and nothing else. */
export function reasonText(reason: Reason, context: ReasonContext): string {
	// A code and its sentence share the type parameter, which an index of a union cannot express.
	const sentence = sentences[reason.code] as (reason: Reason, figures: Figures) => string;
	return sentence(reason, figuresIn(context));
}
