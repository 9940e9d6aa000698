import type { TemperatureUnit } from './domain/units';

/*
 * Every number and date to text. Rounding happens here and nowhere else; locale, unit and time zone are always
 * given, never taken from the machine. What comes back is the figure alone: the unit stands beside it, in its own type.
 */

/** Currencies whose minor unit is not a hundredth. Source: ISO 4217:2015, list one, amendment 177. */
const minorDigits: Record<string, number> = {
	...Object.fromEntries(
		'BIF CLP DJF GNF ISK JPY KMF KRW PYG RWF UGX UYI VND VUV XAF XOF XPF'.split(' ').map((code) => [code, 0])
	),
	...Object.fromEntries('BHD IQD JOD KWD LYD OMR TND'.split(' ').map((code) => [code, 3])),
	CLF: 4,
	UYW: 4
};

const kelvinOffset = 273.15;
const formatters = new Map<string, Intl.NumberFormat>();

function numberFormat(locale: string, digits: number): Intl.NumberFormat {
	const key = `${locale} ${digits}`;
	const known = formatters.get(key);
	if (known) return known;
	const made = new Intl.NumberFormat(locale, {
		minimumFractionDigits: digits,
		maximumFractionDigits: digits,
		roundingMode: 'halfExpand',
		signDisplay: 'negative'
	});
	formatters.set(key, made);
	return made;
}

/** A figure with a fixed number of decimals, thousands grouped, a true minus, and never a minus zero. */
export function decimal(value: number, digits: number, locale: string): string {
	return numberFormat(locale, digits).format(value).replace('-', '−');
}

/** A count of cases, rows or readings: `1,120`. */
export function count(value: number, locale: string): string {
	return decimal(value, 0, locale);
}

/** A count with its noun: `1 gap`, `2 gaps`. */
export function counted(value: number, one: string, many = `${one}s`, locale = 'en'): string {
	return `${count(value, locale)} ${value === 1 ? one : many}`;
}

/** As `decimal`, with a plus before what is not negative. */
export function signed(value: number, digits: number, locale: string): string {
	const text = decimal(value, digits, locale);
	return text.startsWith('−') ? text : `+${text}`;
}

/** A share of one: `76.8` of `0.768`; the per cent sign is the unit. */
export function percent(fraction: number, digits: number, locale: string): string {
	return decimal(fraction * 100, digits, locale);
}

/** The figure in the reader's unit, not rounded: for axes and sums. */
export function inUnit(celsius: number, unit: TemperatureUnit): number {
	if (unit === 'fahrenheit') return (celsius * 9) / 5 + 32;
	return unit === 'kelvin' ? celsius + kelvinOffset : celsius;
}

/** A temperature in the reader's unit, one decimal. */
export function temperature(celsius: number, unit: TemperatureUnit, locale: string): string {
	return decimal(inUnit(celsius, unit), 1, locale);
}

/** An accuracy or a difference: scaled to the unit, not shifted. */
export function temperatureSpan(celsius: number, unit: TemperatureUnit, locale: string): string {
	return decimal(unit === 'fahrenheit' ? (celsius * 9) / 5 : celsius, 1, locale);
}

export function temperatureSign(unit: TemperatureUnit): string {
	return { celsius: '°C', fahrenheit: '°F', kelvin: 'K' }[unit];
}

/** Life in days, one decimal. */
export function lifeDays(hours: number, locale: string): string {
	return decimal(hours / 24, 1, locale);
}

/** A twelfth of a year of 365.25 days. */
const daysAMonth = 30.4375;
const daysTellEnough = 90;

/** "6 months", "4.5 months": how a long life is printed by its source; null of one that days tell well enough. */
export function lifeMonths(hours: number, locale: string): string | null {
	const days = hours / 24;
	if (days < daysTellEnough) return null;
	const months = Math.round((days / daysAMonth) * 2) / 2;
	return `${decimal(months, Number.isInteger(months) ? 0 : 1, locale)} months`;
}

/** Life or over-use in hours at the reference temperature, one decimal. */
export function lifeHours(hours: number, locale: string): string {
	return decimal(hours, 1, locale);
}

/** Two printed figures as a range: an en dash, but "to" where a minus would stand beside it. */
export function range(low: string, high: string, to = 'to'): string {
	if (low === high) return low;
	return low.startsWith('−') || high.startsWith('−') ? `${low} ${to} ${high}` : `${low}–${high}`;
}

/** Whole minutes for a table: `10:03`. */
export function hoursMinutes(minutes: number): string {
	const whole = Math.round(Math.abs(minutes));
	const sign = minutes < 0 && whole > 0 ? '−' : '';
	return `${sign}${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}

/** How long, for a sentence: `4 h 17 min`, `2 d 23 h` from two days on, seconds in the last ten. Cut, never rounded up. */
export function duration(ms: number): string {
	const seconds = Math.floor(Math.abs(ms) / 1000);
	if (seconds < 10) return `${seconds} s`;
	const minutes = Math.floor(seconds / 60);
	const hours = Math.floor(minutes / 60);
	if (hours >= 48) return joined(Math.floor(hours / 24), 'd', hours % 24, 'h');
	return hours > 0 ? joined(hours, 'h', minutes % 60, 'min') : `${minutes} min`;
}

function joined(large: number, largeUnit: string, small: number, smallUnit: string): string {
	return small === 0 ? `${large} ${largeUnit}` : `${large} ${largeUnit} ${small} ${smallUnit}`;
}

/** File size by thousands: `412 KB`, `5.8 MB`. */
export function fileSize(bytes: number, locale: string): string {
	if (bytes < 1000) return `${count(bytes, locale)} B`;
	const units = ['KB', 'MB', 'GB', 'TB'];
	let size = bytes / 1000;
	let at = 0;
	while (size >= 999.5 && at < units.length - 1) {
		size /= 1000;
		at++;
	}
	return `${decimal(size, size < 9.95 ? 1 : 0, locale)} ${units[at]}`;
}

/** A hash in a table: eight, an ellipsis, four. */
export function shortHash(hex: string): string {
	return hex.length > 12 ? `${hex.slice(0, 8)}…${hex.slice(-4)}` : hex;
}

/** A whole hash in groups of eight, as a person compares it. */
export function groupedHash(hex: string): string {
	return hex.match(/.{1,8}/g)?.join(' ') ?? '';
}

export function minorUnitDigits(currency: string): number {
	return minorDigits[currency.toUpperCase()] ?? 2;
}

/** An amount without its currency, with as many decimals as that currency has: `9,216.00`. */
export function money(minorUnits: number, currency: string, locale: string): string {
	const digits = minorUnitDigits(currency);
	return decimal(minorUnits / 10 ** digits, digits, locale);
}

/**
 * Rounds so that the printed rows add up to the printed total: each is cut, then the largest remainders get the
 * steps that are missing (the earlier row where two are equal).
 */
export function addUp(values: readonly number[], digits: number): number[] {
	const scale = 10 ** digits;
	// A sum of decimals carries binary dust: 0.1 + 0.2 must not count as more than 0.3.
	const scaled = values.map((value) => Number((value * scale).toPrecision(12)));
	const total = Math.round(Number(scaled.reduce((sum, value) => sum + value, 0).toPrecision(12)));
	const cut = scaled.map(Math.floor);
	const missing = total - cut.reduce((sum, value) => sum + value, 0);
	const order = scaled
		.map((value, at) => ({ at, rest: value - Math.floor(value) }))
		.sort((a, b) => b.rest - a.rest || a.at - b.at);
	for (const { at } of order.slice(0, missing)) cut[at] = (cut[at] ?? 0) + 1;
	return cut.map((value) => value / scale);
}
