/**
 * Temperatures are kept as the file wrote them: an integer number of 10^-decimals of its own unit.
 * Converting divides once, after exact integer arithmetic, so that the same temperature written in °C and in °F
 * gives the same Celsius figure wherever both are exact.
 */
export const temperatureUnits = ['celsius', 'fahrenheit', 'kelvin'] as const;
export type TemperatureUnit = (typeof temperatureUnits)[number];

/** Whether a text names one of them. */
export function isTemperatureUnit(text: string | null): text is TemperatureUnit {
	return temperatureUnits.some((unit) => unit === text);
}

/** 0 °C in kelvin, exact. Source: SI Brochure, 9th edition, 2.3.1. */
export const zeroCelsiusInKelvin = 273.15;

export const msPerHour = 3_600_000;
export const msPerMinute = 60_000;
export const hoursPerDay = 24;

/** Celsius of `scaled` × 10^-`decimals` in `unit`. Source of the °F relation: UCUM, `[degF]`, factor 5 K/9. */
export function celsiusFromScaled(scaled: number, decimals: number, unit: TemperatureUnit): number {
	const scale = 10 ** decimals;
	if (unit === 'celsius') return scaled / scale;
	if (unit === 'fahrenheit') return ((scaled - 32 * scale) * 5) / (9 * scale);
	return (scaled * 100 - 27_315 * scale) / (100 * scale);
}

export function fahrenheitFromCelsius(celsius: number): number {
	return (celsius * 9) / 5 + 32;
}

export function celsiusFromFahrenheit(fahrenheit: number): number {
	return (fahrenheit * 10 - 320) / 18;
}

export function kelvinFromCelsius(celsius: number): number {
	return celsius + zeroCelsiusInKelvin;
}

export function celsiusFromKelvin(kelvin: number): number {
	return kelvin - zeroCelsiusInKelvin;
}
