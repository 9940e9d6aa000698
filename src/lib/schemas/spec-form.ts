import type { Limit, Spec, SpecSource } from '../domain/shelf-life/spec';
import { validateSpec } from '../domain/shelf-life/validate';
import { readModel } from './spec-form-model';
import { FieldReader, type FormFault } from './spec-form-reader';
import { needFields, readNeeds, readSensitivity, withWorth } from './spec-form-needs';
import { filledRows, type SpecFormValues } from './spec-form-values';
import { specSchema } from './spec';

/** A spec read from the editor, or every fault that keeps it from being one. */
export interface ReadSpec {
	spec: Spec | null;
	faults: FormFault[];
}

const limitFields = {
	celsius: 'Degrees',
	graceMinutes: 'Grace',
	graceMinutesInAll: 'GraceInAll',
	hysteresisCelsius: 'Back',
	majorMinutes: 'Major',
	criticalMinutes: 'Critical',
	airGraceMinutes: 'AirGrace',
	airGraceMinutesInAll: 'AirGraceInAll'
} as const satisfies Record<keyof Limit, string>;

const fieldOfPath: Record<string, string> = {
	referenceCelsius: 'reference',
	fullLifeHours: 'fullLife',
	fullLifeUncertaintyHours: 'uncertainty',
	validFromCelsius: 'validFrom',
	validToCelsius: 'validTo',
	chillingCelsius: 'chilling',
	freezingCelsius: 'freezing',
	ceilingCelsius: 'ceiling',
	sensitivityPlusMinus: 'sensitivity',
	...needFields,
	openingDefaultHours: 'openingDefault',
	'mkt.activationEnergyKilojoulesPerMole': 'mktEnergy',
	'mkt.windowHours': 'mktWindow',
	'mkt.limitCelsius': 'mktLimit',
	...pathsOfLimit('upper'),
	...pathsOfLimit('lower')
};

function pathsOfLimit(name: 'upper' | 'lower'): Record<string, string> {
	return Object.fromEntries(
		Object.entries(limitFields).map(([key, field]) => [`${name}.${key}`, `${name}${field}`])
	);
}

/** Reads the editor's fields into figures; faults name the field to correct. The same on server and screen. */
export function readSpecForm(values: SpecFormValues): ReadSpec {
	const reader = new FieldReader(values);
	const { spec, fieldOf } = figuresOf(reader, values);
	for (const name of ['upper', 'lower'] as const) checkGrace(reader, spec[name], name);
	if (reader.faults.length > 0 || !spec.model) return { spec: null, faults: reader.faults };
	const whole = specSchema.parse(withWorth({ ...spec, model: spec.model }));
	const faults = validateSpec(whole).map(({ code, field }) => ({
		code,
		field: fieldOf[field] ?? fieldOfPath[field] ?? field
	}));
	return { spec: faults.length === 0 ? whole : null, faults };
}

function figuresOf(reader: FieldReader, values: SpecFormValues) {
	const referenceCelsius = reader.degrees('reference');
	const fullLifeHours = reader.hoursOfDays('fullLife');
	const { model, fieldOf, cover } = readModel(reader, values, {
		celsius: referenceCelsius,
		lifeHours: fullLifeHours,
		fields: ['reference', 'fullLife']
	});
	const [coldest, warmest] = cover ?? [null, null];
	const degrees = reader.degrees.bind(reader);
	const spec = {
		referenceCelsius,
		fullLifeHours,
		fullLifeUncertaintyHours: reader.has('uncertainty') ? reader.hoursOfDays('uncertainty') : 0,
		model,
		validFromCelsius: reader.has('validFrom') ? degrees('validFrom') : (coldest ?? degrees('validFrom')),
		validToCelsius: reader.has('validTo') ? degrees('validTo') : (warmest ?? degrees('validTo')),
		chillingCelsius: reader.optional('chilling', reader.degrees),
		freezingCelsius: reader.optional('freezing', reader.degrees),
		ceilingCelsius: reader.optional('ceiling', reader.degrees),
		upper: readLimit(reader, 'upper'),
		lower: readLimit(reader, 'lower'),
		...readNeeds(reader),
		openingDefaultHours: reader.hoursOfDays('openingDefault'),
		mkt: {
			activationEnergyKilojoulesPerMole: reader.optional('mktEnergy', reader.number),
			windowHours: reader.optional('mktWindow', reader.number),
			limitCelsius: reader.optional('mktLimit', reader.degrees)
		},
		sources: readSources(reader, values),
		caution: reader.text('caution') || null,
		...readSensitivity(reader, model)
	};
	return { spec, fieldOf };
}

/** No temperature, no limit: what stands in its other fields is not looked at. */
function readLimit(reader: FieldReader, name: 'upper' | 'lower'): Limit | null {
	if (!reader.has(`${name}Degrees`)) return null;
	const airGraceMinutes = reader.optional(`${name}AirGrace`, reader.number);
	const airGraceMinutesInAll = reader.optional(`${name}AirGraceInAll`, reader.number);
	return {
		celsius: reader.degrees(`${name}Degrees`),
		graceMinutes: reader.number(`${name}Grace`),
		graceMinutesInAll: reader.number(`${name}GraceInAll`),
		hysteresisCelsius: reader.span(`${name}Back`),
		majorMinutes: reader.minutesOfClock(`${name}Major`),
		criticalMinutes: reader.minutesOfClock(`${name}Critical`),
		...(airGraceMinutes === null ? {} : { airGraceMinutes }),
		...(airGraceMinutesInAll === null ? {} : { airGraceMinutesInAll })
	};
}

/** Grace over the whole journey that is shorter than for one event would make the latter a dead letter. */
function checkGrace(reader: FieldReader, limit: Limit | null, name: 'upper' | 'lower'): void {
	if (!limit || reader.faults.some((fault) => fault.field.startsWith(name))) return;
	if (limit.graceMinutesInAll < limit.graceMinutes) reader.note(`${name}GraceInAll`, 'grace-in-all-short');
	const { airGraceMinutes: air, airGraceMinutesInAll: airInAll } = limit;
	if (air !== undefined && airInAll !== undefined && airInAll < air)
		reader.note(`${name}AirGraceInAll`, 'grace-in-all-short');
}

function readSources(reader: FieldReader, values: SpecFormValues): SpecSource[] {
	const sources: SpecSource[] = [];
	for (let at = 0; at < filledRows(values, 'source'); at++) {
		const [text, degrees] = [`source${at}Text`, `source${at}Degrees`];
		const [life, high] = [`source${at}Life`, `source${at}High`];
		if (![text, degrees, life, high].some((field) => reader.has(field))) continue;
		if (!reader.has(text)) reader.note(text, 'missing');
		const hasPoint = reader.has(degrees) || reader.has(life);
		if (!hasPoint && reader.has(high)) reader.note(life, 'row-incomplete');
		sources.push({
			text: reader.text(text),
			point: hasPoint ? { celsius: reader.degrees(degrees), lifeHours: reader.hoursOfDays(life) } : null,
			lifeHoursHigh: reader.optional(high, reader.hoursOfDays)
		});
	}
	return sources;
}
