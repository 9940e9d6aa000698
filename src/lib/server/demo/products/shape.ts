import type { Limit, LifePoint, MktRule, Spec, SpecSource } from '../../../domain/shelf-life/spec';
import { hoursPerDay } from '../../../domain/units';

/** A product of the demo, as the catalogue takes it. */
export interface DemoProduct {
	name: string;
	family: string;
	countUnit: string;
	variety?: string;
	spec: Spec;
	/** Why this version was signed. */
	reason: string;
}

const daysPerMonth = 365.25 / 12;

export const days = (count: number): number => count * hoursPerDay;
export const months = (count: number): number => count * daysPerMonth * hoursPerDay;

export const at = (celsius: number, lifeHours: number): LifePoint => ({ celsius, lifeHours });

/** A published figure; `high` where the source prints a range. */
export function source(text: string, point: LifePoint | null = null, high: number | null = null): SpecSource {
	return { text, point, lifeHoursHigh: high };
}

/** Customary grace at a produce dock; each product says what differs. */
export function limit(celsius: number, overrides: Partial<Limit> = {}): Limit {
	return {
		celsius,
		graceMinutes: 30,
		graceMinutesInAll: 120,
		hysteresisCelsius: 0.5,
		majorMinutes: 120,
		criticalMinutes: 360,
		airGraceMinutes: 60,
		airGraceMinutesInAll: 240,
		...overrides
	};
}

/** A cold limit: shorter grace, and back by less. */
export function lowLimit(celsius: number, overrides: Partial<Limit> = {}): Limit {
	return limit(celsius, {
		graceMinutesInAll: 60,
		hysteresisCelsius: 0.1,
		majorMinutes: 60,
		criticalMinutes: 240,
		airGraceMinutesInAll: 120,
		...overrides
	});
}

export const customaryMkt: MktRule = {
	activationEnergyKilojoulesPerMole: null,
	windowHours: null,
	limitCelsius: null
};

export const qualityOnly =
	'Quality estimate only; it does not assess safety. Ethylene, humidity, atmosphere, bruising and starting quality are not measured.';
