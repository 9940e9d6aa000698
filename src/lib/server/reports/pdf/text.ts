import { DateTime } from 'luxon';
import type { TemperatureUnit } from '../../../domain/units';
import * as format from '../../../format';

/** The report speaks English until its other languages come. */
const locale = 'en-GB';

export { hoursMinutes, range as span } from '../../../format';

/** A figure with fixed decimals, thousands set off, a true minus. */
export function decimal(value: number, digits: number): string {
	return format.decimal(value, digits, locale);
}

/** Life as days, one decimal. */
export function days(hours: number): string {
	return format.lifeDays(hours, locale);
}

/** A digest in groups of eight, broken into lines of `perLine` groups: whole on paper. */
export function hashLines(sha256: string, perLine: number): string {
	const groups = sha256.match(/.{1,8}/gu) ?? [];
	const lines: string[] = [];
	for (let i = 0; i < groups.length; i += perLine) lines.push(groups.slice(i, i + perLine).join(' '));
	return lines.join('\n');
}

/** Temperatures in the site's unit. */
export function thermometer(unit: TemperatureUnit) {
	const zero = format.inUnit(0, unit);
	const degree = format.inUnit(1, unit) - zero;
	return {
		sign: format.temperatureSign(unit),
		value: (celsius: number) => format.inUnit(celsius, unit),
		celsius: (shown: number) => (shown - zero) / degree,
		reading: (celsius: number) => format.temperature(celsius, unit, locale),
		difference: (celsius: number) => format.temperatureSpan(celsius, unit, locale),
		degreeMinutes: (celsiusMinutes: number) => decimal(celsiusMinutes * degree, 0)
	};
}

/** Instants in one zone; 24-hour times, English day and month names whatever the machine's locale. */
export function calendar(zone: string) {
	const at = (instant: string | number) =>
		(typeof instant === 'number' ? DateTime.fromMillis(instant) : DateTime.fromISO(instant))
			.setZone(zone)
			.setLocale('en-GB');
	return {
		at,
		time: (instant: string | number) => at(instant).toFormat('HH:mm'),
		timeToTheSecond: (instant: string | number) => at(instant).toFormat('HH:mm:ss'),
		day: (instant: string | number) => at(instant).toFormat('ccc d LLL'),
		date: (instant: string | number) => at(instant).toFormat('d LLL yyyy'),
		offset: (instant: string | number) => at(instant).toFormat('ZZ').replace('-', '−'),
		/** CEST, EDT …; the zone's own name where there is no letter abbreviation. */
		zoneName: (instant: string | number) => abbreviation(at(instant)) ?? zone
	};
}

function abbreviation(moment: DateTime): string | null {
	const tried = ['en-GB', 'en-US', 'en-AU'].map((locale) => moment.setLocale(locale).toFormat('ZZZZ'));
	return tried.find((name) => /^[A-Z]{3,5}$/u.test(name)) ?? null;
}

export type Thermometer = ReturnType<typeof thermometer>;
export type Calendar = ReturnType<typeof calendar>;
