/** What is wrong with a spec's figures; `field` is the path of the figure to correct. */
export interface SpecFault {
	readonly code: SpecFaultCode;
	readonly field: string;
}

export const specFaultCodes = [
	'not-a-number',
	'not-positive',
	'negative',
	'below-absolute-zero',
	'range-upside-down',
	'q10-below-one',
	'life-longer-when-warmer',
	'points-unsorted',
	'points-too-few',
	'bands-not-adjoining',
	'reference-outside-model',
	'reference-below-chilling',
	'reference-not-above-minimum',
	'limits-upside-down',
	'stops-upside-down',
	'severity-upside-down',
	'more-than-full-life',
	'sensitivity-without-figure',
	'sensitivity-too-wide',
	'need-disagrees'
] as const;
export type SpecFaultCode = (typeof specFaultCodes)[number];

const absoluteZeroCelsius = -273.15;

/** Notes a fault. */
export function fault(faults: SpecFault[], code: SpecFaultCode, field: string): void {
	faults.push({ code, field });
}

/** A figure above zero. */
export function positive(faults: SpecFault[], figure: number, field: string): void {
	if (!Number.isFinite(figure)) fault(faults, 'not-a-number', field);
	else if (figure <= 0) fault(faults, 'not-positive', field);
}

/** A figure of zero or more. */
export function notNegative(faults: SpecFault[], figure: number, field: string): void {
	if (!Number.isFinite(figure)) fault(faults, 'not-a-number', field);
	else if (figure < 0) fault(faults, 'negative', field);
}

/** A Q10 under 1 would have life last longer when warmer. */
export function q10(faults: SpecFault[], figure: number, field: string): void {
	if (!Number.isFinite(figure)) fault(faults, 'not-a-number', field);
	else if (figure < 1) fault(faults, 'q10-below-one', field);
}

/** A finite temperature that exists. */
export function temperature(faults: SpecFault[], celsius: number, field: string): void {
	if (!Number.isFinite(celsius)) fault(faults, 'not-a-number', field);
	else if (celsius < absoluteZeroCelsius) fault(faults, 'below-absolute-zero', field);
}
