import { DateTime } from 'luxon';
import { hoursPerDay, type TemperatureUnit } from '../../../domain/units';

const signs = { celsius: '°C', fahrenheit: '°F', kelvin: 'K' } as const;
const degreesPerCelsius = { celsius: 1, fahrenheit: 1.8, kelvin: 1 } as const;
const atZeroCelsius = { celsius: 0, fahrenheit: 32, kelvin: 273.15 } as const;

/** A number with fixed decimals, thousands set off, a true minus and never a negative nought. */
export function decimal(value: number, decimals: number): string {
	const text = Math.abs(value).toFixed(decimals);
	const [whole = '0', fraction] = text.split('.');
	const grouped = whole.replace(/\B(?=(\d{3})+$)/gu, ',');
	const sign = value < 0 && Number(text) !== 0 ? '−' : '';
	return `${sign}${grouped}${fraction === undefined ? '' : `.${fraction}`}`;
}

/** Life as days, one decimal. */
export function days(hours: number): string {
	return decimal(hours / hoursPerDay, 1);
}

/** An en dash between bounds, but "to" where a minus stands beside it. */
export function span(low: string, high: string): string {
	return low.startsWith('−') || high.startsWith('−') ? `${low} to ${high}` : `${low}–${high}`;
}

/** Minutes as h:min, as tables print durations. */
export function hoursMinutes(minutes: number): string {
	const whole = Math.round(Math.abs(minutes));
	const sign = minutes < 0 && whole !== 0 ? '−' : '';
	return `${sign}${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
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
	const degrees = degreesPerCelsius[unit];
	const value = (celsius: number) => celsius * degrees + atZeroCelsius[unit];
	return {
		sign: signs[unit],
		value,
		celsius: (shown: number) => (shown - atZeroCelsius[unit]) / degrees,
		reading: (celsius: number) => decimal(value(celsius), 1),
		difference: (celsius: number, decimals = 1) => decimal(celsius * degrees, decimals)
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
