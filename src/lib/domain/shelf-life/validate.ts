import type { LifePoint, Limit, Q10Band, RateModel, Spec } from './spec';

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
	'more-than-full-life'
] as const;
export type SpecFaultCode = (typeof specFaultCodes)[number];

const absoluteZeroCelsius = -273.15;

type Check = (faults: SpecFault[], spec: Spec) => void;

/** Every fault of the spec, in the order of its fields; none means that it can be assessed with. */
export function validateSpec(spec: Spec): SpecFault[] {
	const faults: SpecFault[] = [];
	for (const check of checks) check(faults, spec);
	return faults;
}

const checks: readonly Check[] = [
	(faults, spec) => {
		temperature(faults, spec.referenceCelsius, 'referenceCelsius');
		positive(faults, spec.fullLifeHours, 'fullLifeHours');
		notNegative(faults, spec.fullLifeUncertaintyHours, 'fullLifeUncertaintyHours');
		notNegative(faults, spec.neededHours, 'neededHours');
		notNegative(faults, spec.openingDefaultHours, 'openingDefaultHours');
		if (spec.neededHours > spec.fullLifeHours) fault(faults, 'more-than-full-life', 'neededHours');
	},
	(faults, spec) => modelFaults(faults, spec.model),
	(faults, spec) => {
		temperature(faults, spec.validFromCelsius, 'validFromCelsius');
		temperature(faults, spec.validToCelsius, 'validToCelsius');
		if (spec.validFromCelsius >= spec.validToCelsius) fault(faults, 'range-upside-down', 'validToCelsius');
	},
	referenceFaults,
	limitFaults,
	(faults, { mkt }) => {
		if (mkt.activationEnergyKilojoulesPerMole !== null) {
			positive(faults, mkt.activationEnergyKilojoulesPerMole, 'mkt.activationEnergyKilojoulesPerMole');
		}
		if (mkt.windowHours !== null) positive(faults, mkt.windowHours, 'mkt.windowHours');
		if (mkt.limitCelsius !== null) temperature(faults, mkt.limitCelsius, 'mkt.limitCelsius');
	}
];

function modelFaults(faults: SpecFault[], model: RateModel): void {
	switch (model.kind) {
		case 'constant-q10':
			return q10(faults, model.q10, 'model.q10');
		case 'two-lives':
			return pointFaults(faults, [model.lower, model.upper], ['model.lower', 'model.upper']);
		case 'life-table':
			return pointFaults(
				faults,
				model.points,
				model.points.map((_, i) => `model.points.${i}`)
			);
		case 'banded-q10':
			return bandFaults(faults, model.bands);
		case 'arrhenius':
			return positive(
				faults,
				model.activationEnergyKilojoulesPerMole,
				'model.activationEnergyKilojoulesPerMole'
			);
		case 'square-root':
			return temperature(faults, model.minCelsius, 'model.minCelsius');
	}
}

function pointFaults(faults: SpecFault[], points: readonly LifePoint[], fields: readonly string[]): void {
	if (points.length < 2) fault(faults, 'points-too-few', 'model.points');
	points.forEach((point, i) => {
		const before = points[i - 1];
		temperature(faults, point.celsius, `${fields[i]}.celsius`);
		positive(faults, point.lifeHours, `${fields[i]}.lifeHours`);
		if (before === undefined) return;
		if (point.celsius <= before.celsius) fault(faults, 'points-unsorted', `${fields[i]}.celsius`);
		else if (point.lifeHours > before.lifeHours)
			fault(faults, 'life-longer-when-warmer', `${fields[i]}.lifeHours`);
	});
}

function bandFaults(faults: SpecFault[], bands: readonly Q10Band[]): void {
	if (bands.length === 0) fault(faults, 'points-too-few', 'model.bands');
	bands.forEach((band, i) => {
		const before = bands[i - 1];
		const field = `model.bands.${i}`;
		temperature(faults, band.fromCelsius, `${field}.fromCelsius`);
		temperature(faults, band.toCelsius, `${field}.toCelsius`);
		q10(faults, band.q10, `${field}.q10`);
		if (band.fromCelsius >= band.toCelsius) fault(faults, 'range-upside-down', `${field}.toCelsius`);
		if (before && band.fromCelsius < before.fromCelsius)
			fault(faults, 'points-unsorted', `${field}.fromCelsius`);
		else if (before && band.fromCelsius !== before.toCelsius) {
			fault(faults, 'bands-not-adjoining', `${field}.fromCelsius`);
		}
	});
}

function referenceFaults(faults: SpecFault[], spec: Spec): void {
	const { model, referenceCelsius: reference } = spec;
	const [from, to] = coverOf(model);
	const isInside =
		reference >= Math.max(from, spec.validFromCelsius) && reference <= Math.min(to, spec.validToCelsius);
	if (!isInside) fault(faults, 'reference-outside-model', 'referenceCelsius');
	if (model.kind === 'square-root' && reference <= model.minCelsius) {
		fault(faults, 'reference-not-above-minimum', 'model.minCelsius');
	}
	if (spec.chillingCelsius === null) return;
	temperature(faults, spec.chillingCelsius, 'chillingCelsius');
	if (spec.chillingCelsius > reference) fault(faults, 'reference-below-chilling', 'chillingCelsius');
}

/** Temperatures the model itself knows. */
function coverOf(model: RateModel): readonly [number, number] {
	if (model.kind === 'life-table') {
		return [
			model.points[0]?.celsius ?? -Infinity,
			model.points[model.points.length - 1]?.celsius ?? Infinity
		];
	}
	if (model.kind === 'banded-q10') {
		return [
			model.bands[0]?.fromCelsius ?? -Infinity,
			model.bands[model.bands.length - 1]?.toCelsius ?? Infinity
		];
	}
	return [-Infinity, Infinity];
}

function limitFaults(faults: SpecFault[], spec: Spec): void {
	const { upper, lower, freezingCelsius: freezing, ceilingCelsius: ceiling } = spec;
	if (upper) oneLimit(faults, upper, 'upper');
	if (lower) oneLimit(faults, lower, 'lower');
	if (upper && lower && lower.celsius >= upper.celsius) fault(faults, 'limits-upside-down', 'lower.celsius');
	if (freezing !== null) temperature(faults, freezing, 'freezingCelsius');
	if (ceiling !== null) temperature(faults, ceiling, 'ceilingCelsius');
	if (freezing !== null && ceiling !== null && freezing >= ceiling) {
		fault(faults, 'stops-upside-down', 'freezingCelsius');
	}
}

function oneLimit(faults: SpecFault[], limit: Limit, field: string): void {
	temperature(faults, limit.celsius, `${field}.celsius`);
	for (const [name, figure] of Object.entries(limit)) {
		if (name !== 'celsius' && typeof figure === 'number') notNegative(faults, figure, `${field}.${name}`);
	}
	if (limit.criticalMinutes < limit.majorMinutes)
		fault(faults, 'severity-upside-down', `${field}.criticalMinutes`);
}

function fault(faults: SpecFault[], code: SpecFaultCode, field: string): void {
	faults.push({ code, field });
}

function positive(faults: SpecFault[], figure: number, field: string): void {
	if (!Number.isFinite(figure)) fault(faults, 'not-a-number', field);
	else if (figure <= 0) fault(faults, 'not-positive', field);
}

function notNegative(faults: SpecFault[], figure: number, field: string): void {
	if (!Number.isFinite(figure)) fault(faults, 'not-a-number', field);
	else if (figure < 0) fault(faults, 'negative', field);
}

function q10(faults: SpecFault[], figure: number, field: string): void {
	if (!Number.isFinite(figure)) fault(faults, 'not-a-number', field);
	else if (figure < 1) fault(faults, 'q10-below-one', field);
}

function temperature(faults: SpecFault[], celsius: number, field: string): void {
	if (!Number.isFinite(celsius)) fault(faults, 'not-a-number', field);
	else if (celsius < absoluteZeroCelsius) fault(faults, 'below-absolute-zero', field);
}
