import { needWorthHours } from './need';
import type { Limit, Spec } from './spec';
import { fault, notNegative, positive, temperature, type SpecFault } from './spec-fault';
import { coverOf, modelFaults } from './validate-model';

/** A need stated and its worth may differ by the rounding of a form, no more. */
const agreesTo = 1e-4;

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
	},
	sensitivityFaults,
	needFaults
];

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

function sensitivityFaults(faults: SpecFault[], spec: Spec): void {
	const { model, sensitivityPlusMinus: plusMinus, referenceCelsius } = spec;
	if (plusMinus === undefined) return;
	const field = 'sensitivityPlusMinus';
	notNegative(faults, plusMinus, field);
	if (model.kind === 'life-table') fault(faults, 'sensitivity-without-figure', field);
	if (model.kind === 'square-root' && model.minCelsius + plusMinus >= referenceCelsius)
		fault(faults, 'sensitivity-too-wide', field);
}

/** Needs are worth something only where the rest of the spec is whole. */
function needFaults(faults: SpecFault[], spec: Spec): void {
	const needs = { neededAtDock: spec.neededAtDock, neededAtCustomer: spec.neededAtCustomer };
	for (const [field, need] of Object.entries(needs)) {
		if (need === undefined) continue;
		positive(faults, need.hours, `${field}.hours`);
		temperature(faults, need.celsius, `${field}.celsius`);
		if (faults.length > 0) continue;
		const worthHours = needWorthHours(spec, need);
		if (worthHours > spec.fullLifeHours) fault(faults, 'more-than-full-life', `${field}.hours`);
		else if (field === 'neededAtDock' && Math.abs(worthHours - spec.neededHours) > worthHours * agreesTo)
			fault(faults, 'need-disagrees', 'neededHours');
	}
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
