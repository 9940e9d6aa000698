import { celsiusFromFahrenheit, type TemperatureUnit } from '$lib/domain/units';

/** A leg of the onward trip as it is typed. */
export interface TypedLeg {
	hours: string;
	degrees: string;
	plusMinus: string;
}

/** A figure as people type it: either decimal mark, a true minus; null of anything else. */
export function typedFigure(text: string): number | null {
	const plain = text.trim().replace('−', '-').replace(',', '.');
	return /^[+-]?(\d{1,6}(\.\d{0,6})?|\.\d{1,6})$/.test(plain) ? Number(plain) : null;
}

/** A temperature that exists, from the reader's unit; null of nonsense. */
export function typedCelsius(text: string, unit: TemperatureUnit): number | null {
	const degrees = typedFigure(text);
	if (degrees === null) return null;
	const celsius = unit === 'fahrenheit' ? celsiusFromFahrenheit(degrees) : degrees;
	return celsius >= coldestCelsius && celsius <= warmestCelsius ? celsius : null;
}

/** A difference of temperatures, 0 or more; nothing typed is none. */
export function typedSpan(text: string, unit: TemperatureUnit): number | null {
	if (text.trim() === '') return 0;
	const degrees = typedFigure(text);
	if (degrees === null || degrees < 0 || degrees > widestSpan) return null;
	return unit === 'fahrenheit' ? (degrees * 5) / 9 : degrees;
}

/** Food travels between these; beyond them a unit or a sign was mistaken. */
const coldestCelsius = -90;
const warmestCelsius = 60;
const widestSpan = 30;

/** The legs that are filled in; null where one of them is nonsense. */
export function typedLegs(legs: readonly TypedLeg[], unit: TemperatureUnit) {
	const read = legs
		.filter(({ hours, degrees }) => hours.trim() !== '' || degrees.trim() !== '')
		.map(({ hours, degrees, plusMinus }) => ({
			hours: typedFigure(hours),
			celsius: typedCelsius(degrees, unit),
			plusMinusCelsius: typedSpan(plusMinus, unit)
		}));
	const whole = read.flatMap(({ hours, celsius, plusMinusCelsius }) =>
		hours === null || hours < 0 || celsius === null || plusMinusCelsius === null
			? []
			: [{ hours, celsius, plusMinusCelsius }]
	);
	return whole.length === read.length ? whole : null;
}
