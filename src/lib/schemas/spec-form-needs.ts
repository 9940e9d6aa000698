import { needWorthHours } from '../domain/shelf-life/need';
import type { LifeNeed, RateModel, Spec } from '../domain/shelf-life/spec';
import { validateSpec } from '../domain/shelf-life/validate';
import type { FieldReader } from './spec-form-reader';

/** Which field each figure of a need came from. */
export const needFields = {
	neededHours: 'needed',
	'neededAtDock.hours': 'needed',
	'neededAtDock.celsius': 'neededDegrees',
	'neededAtCustomer.hours': 'customerNeeded',
	'neededAtCustomer.celsius': 'customerDegrees'
} as const;

type Needs = Pick<Spec, 'neededHours' | 'neededAtDock' | 'neededAtCustomer'>;

/** Life needed at receipt and at the customer, as it was stated: so many days at a temperature. */
export function readNeeds(reader: FieldReader): Needs {
	const hours = reader.hoursOfDays('needed');
	const dock = reader.optional('neededDegrees', reader.degrees);
	const customer = readCustomer(reader);
	return {
		neededHours: hours,
		...(dock === null ? {} : { neededAtDock: { hours, celsius: dock } }),
		...(customer === null ? {} : { neededAtCustomer: customer })
	};
}

/** Days and temperature, or neither. */
function readCustomer(reader: FieldReader): LifeNeed | null {
	if (!reader.has('customerNeeded') && !reader.has('customerDegrees')) return null;
	return { hours: reader.hoursOfDays('customerNeeded'), celsius: reader.degrees('customerDegrees') };
}

/** The ± of the model's own figure; a table has none, and what stands in the field is left as it is. */
export function readSensitivity(
	reader: FieldReader,
	model: RateModel | null
): Pick<Spec, 'sensitivityPlusMinus'> {
	if (!reader.has('sensitivity') || model?.kind === 'life-table') return {};
	const isDegrees = model?.kind === 'square-root';
	return { sensitivityPlusMinus: isDegrees ? reader.span('sensitivity') : reader.number('sensitivity') };
}

/** The spec with its need at the dock counted at the reference temperature, once the rest of it makes sense. */
export function withWorth(spec: Spec): Spec {
	const { neededAtDock: need, ...rest } = spec;
	if (!need || validateSpec({ ...rest, neededHours: 0 }).length > 0) return spec;
	return { ...spec, neededHours: needWorthHours(spec, need) };
}
