import type { LifePoint, Spec, SpecSource } from '../shelf-life/spec';
import { hoursPerDay } from '../units';

/** What only the receiver can say: what is needed, what the pessimist assumes, where limits lie. */
type OwnFigures =
	'neededHours' | 'openingDefaultHours' | 'upper' | 'lower' | 'neededAtDock' | 'neededAtCustomer';

/** A product's published figures, for a quality manager to copy and adapt; no load is ever assessed with it as it is. */
export interface StartingSpec {
	readonly key: string;
	readonly product: string;
	readonly family: string;
	readonly figures: Omit<Spec, OwnFigures> & { readonly caution: string };
}

/** A whole spec of published figures and the receiver's own. */
export function specFromStarting(starting: StartingSpec, own: Pick<Spec, OwnFigures>): Spec {
	return { ...starting.figures, ...own };
}

const daysPerMonth = 365.25 / 12;
export const days = (count: number): number => count * hoursPerDay;
export const months = (count: number): number => days(count * daysPerMonth);
export const at = (celsius: number, lifeHours: number): LifePoint => ({ celsius, lifeHours });

/** A published figure; `high` where the source prints a range. */
export function source(text: string, point: LifePoint | null = null, high: number | null = null): SpecSource {
	return { text, point, lifeHoursHigh: high };
}

/** What no published table settles stays empty; the customary ΔH of the mean kinetic temperature. */
export const unsettled = {
	chillingCelsius: null,
	freezingCelsius: null,
	ceilingCelsius: null,
	mkt: { activationEnergyKilojoulesPerMole: null, windowHours: null, limitCelsius: null }
} as const;

export const qualityOnly =
	'Quality estimate only; it does not assess safety. Check it against your own goods before signing.';
