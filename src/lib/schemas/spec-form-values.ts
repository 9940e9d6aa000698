import type { LifePoint, Limit, RateModel, Spec } from '../domain/shelf-life/spec';
import { hoursPerDay, type TemperatureUnit } from '../domain/units';

/** What stands in the fields of the spec editor, by field name; `unit` is what its temperatures are in. */
export type SpecFormValues = Record<string, string>;

/** Rows of a list the form offers; more than these are offered as they are filled. */
export const leastRows = { point: 3, band: 3, source: 3 } as const;
export type RowKind = keyof typeof leastRows;

export const rowFields: Record<RowKind, readonly string[]> = {
	point: ['Degrees', 'Life'],
	band: ['From', 'To', 'Q10'],
	source: ['Text', 'Degrees', 'Life', 'High']
};

/** As many rows of a kind as a form is read for: more points than any published table has. */
const mostRows = 120;

/** How many rows of a kind hold something. */
export function filledRows(values: SpecFormValues, kind: RowKind): number {
	let filled = 0;
	for (let at = 0; at < mostRows; at++) {
		if (rowFields[kind].some((field) => (values[`${kind}${at}${field}`] ?? '').trim() !== ''))
			filled = at + 1;
	}
	return filled;
}

/** A figure as one types it: no rounding that a spec would notice, no zeros at the end. */
function plain(value: number, decimals = 6): string {
	return String(Number(value.toFixed(decimals))).replace('-', '−');
}

/** Minutes as the table has them: `2:00`. */
function clock(minutes: number): string {
	return `${Math.floor(minutes / 60)}:${String(Math.round(minutes % 60)).padStart(2, '0')}`;
}

/** Writers of one spec's figures in the reader's unit. */
export function writer(unit: TemperatureUnit) {
	const degrees = (celsius: number) =>
		unit === 'fahrenheit' ? plain((celsius * 9) / 5 + 32, 4) : plain(celsius);
	return {
		degrees,
		span: (celsius: number) => (unit === 'fahrenheit' ? plain((celsius * 9) / 5, 4) : plain(celsius)),
		days: (hours: number) => plain(hours / hoursPerDay),
		orEmpty: (value: number | null | undefined, write: (value: number) => string = plain) =>
			value === null || value === undefined ? '' : write(value)
	};
}
export type Writer = ReturnType<typeof writer>;

/** The fields of a spec as its editor shows them first. */
export function specFormValues(spec: Spec, unit: TemperatureUnit): SpecFormValues {
	const write = writer(unit);
	const { degrees, days, orEmpty } = write;
	return {
		unit,
		model: spec.model.kind,
		reference: degrees(spec.referenceCelsius),
		fullLife: days(spec.fullLifeHours),
		uncertainty: days(spec.fullLifeUncertaintyHours),
		...modelValues(spec, write),
		validFrom: degrees(spec.validFromCelsius),
		validTo: degrees(spec.validToCelsius),
		chilling: orEmpty(spec.chillingCelsius, degrees),
		freezing: orEmpty(spec.freezingCelsius, degrees),
		ceiling: orEmpty(spec.ceilingCelsius, degrees),
		...limitValues('upper', spec.upper, write),
		...limitValues('lower', spec.lower, write),
		sensitivity: orEmpty(
			spec.sensitivityPlusMinus,
			spec.model.kind === 'square-root' ? write.span : (value) => plain(value)
		),
		...needValues(spec, write),
		openingDefault: days(spec.openingDefaultHours),
		mktEnergy: orEmpty(spec.mkt.activationEnergyKilojoulesPerMole),
		mktWindow: orEmpty(spec.mkt.windowHours),
		mktLimit: orEmpty(spec.mkt.limitCelsius, degrees),
		...sourceValues(spec, write),
		caution: spec.caution ?? ''
	};
}

/** Needs as they were stated; a need without a temperature of its own is one at the reference. */
function needValues(
	{ neededHours, neededAtDock, neededAtCustomer }: Spec,
	{ degrees, days, orEmpty }: Writer
): SpecFormValues {
	return {
		needed: days(neededAtDock?.hours ?? neededHours),
		neededDegrees: orEmpty(neededAtDock?.celsius, degrees),
		customerNeeded: orEmpty(neededAtCustomer?.hours, days),
		customerDegrees: orEmpty(neededAtCustomer?.celsius, degrees)
	};
}

/** The fields of a model's own figures. */
export function modelValues(
	{ model, referenceCelsius }: Pick<Spec, 'model' | 'referenceCelsius'>,
	{ degrees, days }: Writer
): SpecFormValues {
	switch (model.kind) {
		case 'constant-q10':
			return { q10: plain(model.q10) };
		case 'two-lives': {
			const other = otherLife(model, referenceCelsius);
			return { otherDegrees: degrees(other.celsius), otherLife: days(other.lifeHours) };
		}
		case 'arrhenius':
			return { energy: plain(model.activationEnergyKilojoulesPerMole) };
		case 'square-root':
			return { tmin: degrees(model.minCelsius) };
		case 'life-table':
			return rows(
				'point',
				model.points.filter((point) => point.celsius !== referenceCelsius),
				(point) => ({ Degrees: degrees(point.celsius), Life: days(point.lifeHours) })
			);
		case 'banded-q10':
			return rows('band', model.bands, (band) => ({
				From: degrees(band.fromCelsius),
				To: degrees(band.toCelsius),
				Q10: plain(band.q10)
			}));
	}
}

/** Of two lives the one that is not the reference; the sentence names the reference first. */
function otherLife(model: RateModel & { kind: 'two-lives' }, referenceCelsius: number): LifePoint {
	return model.upper.celsius === referenceCelsius ? model.lower : model.upper;
}

function limitValues(name: 'upper' | 'lower', limit: Limit | null, write: Writer): SpecFormValues {
	if (!limit) return {};
	return {
		[`${name}Degrees`]: write.degrees(limit.celsius),
		[`${name}Grace`]: plain(limit.graceMinutes),
		[`${name}GraceInAll`]: plain(limit.graceMinutesInAll),
		[`${name}Back`]: write.span(limit.hysteresisCelsius),
		[`${name}Major`]: clock(limit.majorMinutes),
		[`${name}Critical`]: clock(limit.criticalMinutes),
		[`${name}AirGrace`]: write.orEmpty(limit.airGraceMinutes),
		[`${name}AirGraceInAll`]: write.orEmpty(limit.airGraceMinutesInAll)
	};
}

function sourceValues(spec: Spec, { degrees, days, orEmpty }: Writer): SpecFormValues {
	return rows('source', spec.sources, ({ text, point, lifeHoursHigh }) => ({
		Text: text,
		Degrees: point ? degrees(point.celsius) : '',
		Life: point ? days(point.lifeHours) : '',
		High: orEmpty(lifeHoursHigh, days)
	}));
}

function rows<Item>(
	kind: RowKind,
	items: readonly Item[],
	write: (item: Item) => Record<string, string>
): SpecFormValues {
	const entries = items.flatMap((item, at) =>
		Object.entries(write(item)).map(([field, text]) => [`${kind}${at}${field}`, text])
	);
	return Object.fromEntries(entries);
}
