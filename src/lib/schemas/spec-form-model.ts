import type { LifePoint, RateModel } from '../domain/shelf-life/spec';
import type { FieldReader } from './spec-form-reader';
import { filledRows, type SpecFormValues } from './spec-form-values';

/** A model read from its fields, and which field each of its figures came from. */
export interface ReadModel {
	model: RateModel | null;
	fieldOf: Record<string, string>;
	/** Temperatures the entered lives or bands reach; the range of validity where none is entered. */
	cover: readonly [number, number] | null;
}

interface Life extends LifePoint {
	fields: readonly [string, string];
}

/** Reads the chosen model's own fields; the others are left as they are. */
export function readModel(reader: FieldReader, values: SpecFormValues, reference: Life): ReadModel {
	switch (values.model) {
		case 'constant-q10':
			return simple({ kind: 'constant-q10', q10: reader.number('q10') }, 'model.q10', 'q10');
		case 'arrhenius': {
			const activationEnergyKilojoulesPerMole = reader.number('energy');
			const path = 'model.activationEnergyKilojoulesPerMole';
			return simple({ kind: 'arrhenius', activationEnergyKilojoulesPerMole }, path, 'energy');
		}
		case 'square-root':
			return simple({ kind: 'square-root', minCelsius: reader.degrees('tmin') }, 'model.minCelsius', 'tmin');
		case 'two-lives':
			return twoLives(reader, reference);
		case 'life-table':
			return lifeTable(reader, values, reference);
		case 'banded-q10':
			return banded(reader, values);
		default:
			reader.note('model', 'missing');
			return { model: null, fieldOf: {}, cover: null };
	}
}

function simple(model: RateModel, path: string, field: string): ReadModel {
	return { model, fieldOf: { [path]: field }, cover: null };
}

function readLife(reader: FieldReader, degreesField: string, lifeField: string): Life {
	return {
		celsius: reader.degrees(degreesField),
		lifeHours: reader.hoursOfDays(lifeField),
		fields: [degreesField, lifeField]
	};
}

const pointOf = ({ celsius, lifeHours }: Life): LifePoint => ({ celsius, lifeHours });

function coldestFirst(lives: Life[]): Life[] {
	return lives.sort((a, b) => a.celsius - b.celsius);
}

function twoLives(reader: FieldReader, reference: Life): ReadModel {
	const other = readLife(reader, 'otherDegrees', 'otherLife');
	// The reference's own fields are read and checked already: a fault of either belongs to the other life.
	const [lower, upper] = other.celsius < reference.celsius ? [other, reference] : [reference, other];
	return {
		model: { kind: 'two-lives', lower: pointOf(lower), upper: pointOf(upper) },
		fieldOf: lifeFields({ 'model.lower': other, 'model.upper': other }),
		cover: [lower.celsius, upper.celsius]
	};
}

function lifeFields(lives: Record<string, Life>): Record<string, string> {
	return Object.fromEntries(
		Object.entries(lives).flatMap(([path, { fields }]) => [
			[`${path}.celsius`, fields[0]],
			[`${path}.lifeHours`, fields[1]]
		])
	);
}

/** The reference is a point of its table; the rows hold the others, in any order. */
function lifeTable(reader: FieldReader, values: SpecFormValues, reference: Life): ReadModel {
	const lives = [reference];
	for (let at = 0; at < filledRows(values, 'point'); at++) {
		if (!reader.has(`point${at}Degrees`) && !reader.has(`point${at}Life`)) continue;
		lives.push(readLife(reader, `point${at}Degrees`, `point${at}Life`));
	}
	const points = coldestFirst(lives);
	return {
		model: { kind: 'life-table', points: points.map(pointOf) },
		fieldOf: {
			'model.points': 'point0Degrees',
			...lifeFields(Object.fromEntries(points.map((life, at) => [`model.points.${at}`, life])))
		},
		cover: [points[0]?.celsius ?? 0, points[points.length - 1]?.celsius ?? 0]
	};
}

function banded(reader: FieldReader, values: SpecFormValues): ReadModel {
	const bands = [];
	const fieldOf: Record<string, string> = { 'model.bands': 'band0From' };
	for (let at = 0; at < filledRows(values, 'band'); at++) {
		const [from, to, q10] = [`band${at}From`, `band${at}To`, `band${at}Q10`];
		if (![from, to, q10].some((field) => reader.has(field))) continue;
		const path = `model.bands.${bands.length}`;
		Object.assign(fieldOf, {
			[`${path}.fromCelsius`]: from,
			[`${path}.toCelsius`]: to,
			[`${path}.q10`]: q10
		});
		bands.push({
			fromCelsius: reader.degrees(from),
			toCelsius: reader.degrees(to),
			q10: reader.number(q10)
		});
	}
	return {
		model: { kind: 'banded-q10', bands },
		fieldOf,
		cover: [bands[0]?.fromCelsius ?? 0, bands[bands.length - 1]?.toCelsius ?? 0]
	};
}
