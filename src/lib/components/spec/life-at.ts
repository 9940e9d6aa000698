import { rateAt, rateCurve } from '../../domain/shelf-life/rate-curve';
import type { Spec } from '../../domain/shelf-life/spec';
import type { TemperatureUnit } from '../../domain/units';
import { celsiusFromFahrenheit } from '../../domain/units';

/** One row of the table of lives at common temperatures. */
export interface LifeRow {
	celsius: number;
	lifeHours: number;
	rate: number;
}

/** Temperatures people ask about, in their own unit; the chilled ones first, then the frozen and the warm. */
const commonCelsius = [-24, -18, -12, -1, 0, 2, 4, 5, 7, 10, 15, 20, 25, 30, 37];
const commonFahrenheit = [-10, 0, 10, 30, 32, 34, 36, 38, 41, 45, 50, 59, 68, 77, 86, 99];
const mostRows = 7;

/** Life of fresh goods held at one temperature; null where the rate is nothing and life has no end. */
export function lifeHoursAt(spec: Spec, celsius: number): number | null {
	const rate = rateAt(spec, celsius);
	return rate > 0 ? spec.fullLifeHours / rate : null;
}

/** Temperatures the model speaks for, after its range of validity and the chilling threshold. */
export function spokenFor(spec: Spec): { fromCelsius: number; toCelsius: number } {
	const { fromCelsius, toCelsius } = rateCurve(spec);
	return { fromCelsius: Math.max(fromCelsius, spec.chillingCelsius ?? -Infinity), toCelsius };
}

/** Life and rate at the common temperatures within the model, the reference among them. */
export function lifeRows(spec: Spec, unit: TemperatureUnit): LifeRow[] {
	const { fromCelsius, toCelsius } = spokenFor(spec);
	const common =
		unit === 'fahrenheit' ? commonFahrenheit.map((degrees) => celsiusFromFahrenheit(degrees)) : commonCelsius;
	const within = common.filter((celsius) => celsius > fromCelsius + 0.05 && celsius < toCelsius - 0.05);
	const known = [fromCelsius, spec.referenceCelsius, toCelsius];
	const others = within.filter((celsius) => known.every((one) => Math.abs(one - celsius) > 0.3));
	return [...new Set([...known, ...others.slice(0, mostRows - known.length + 1)])]
		.sort((a, b) => a - b)
		.flatMap((celsius) => {
			const lifeHours = lifeHoursAt(spec, celsius);
			return lifeHours === null ? [] : [{ celsius, lifeHours, rate: rateAt(spec, celsius) }];
		});
}

/** Where versions are compared: 2 °C, a common set-point, for what is referred to colder and modelled there; else the reference. */
export function comparedAtCelsius(spec: Spec): number {
	const { fromCelsius, toCelsius } = spokenFor(spec);
	return spec.referenceCelsius <= 2 && fromCelsius <= 2 && toCelsius >= 2 ? 2 : spec.referenceCelsius;
}
