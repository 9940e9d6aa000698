import type { FormFault, FormFaultCode } from '../../schemas/spec-form-reader';
import type { SpecFormValues } from '../../schemas/spec-form-values';

/** What the fields of the spec editor are called in a sentence. */
const names: Record<string, string> = {
	model: 'Model',
	reference: 'Reference temperature',
	fullLife: 'Full life',
	uncertainty: 'Full life, give or take',
	q10: 'Q10',
	otherDegrees: 'Second temperature',
	otherLife: 'Second life',
	energy: 'Activation energy',
	tmin: 'Tmin',
	validFrom: 'Valid from',
	validTo: 'Valid to',
	chilling: 'Chilling threshold',
	freezing: 'Freezing stop',
	ceiling: 'Ceiling',
	needed: 'Life needed',
	openingDefault: 'Opening balance',
	sensitivity: 'Model, give or take',
	neededDegrees: 'Life needed, temperature',
	customerNeeded: 'Life needed at the customer',
	customerDegrees: 'Life needed at the customer, temperature',
	mktEnergy: 'Mean kinetic temperature, ΔH',
	mktWindow: 'Mean kinetic temperature, window',
	mktLimit: 'Mean kinetic temperature, limit',
	caution: 'Caution'
};

/** What a field is called: `Lower limit`, `Point 2`, `Source 1`. */
export function fieldName(field: string): string {
	if (field.startsWith('upper')) return 'Upper limit';
	if (field.startsWith('lower')) return 'Lower limit';
	const row = /^(point|band|source)(\d+)/.exec(field);
	if (!row) return names[field] ?? field;
	const kind = { point: 'Point', band: 'Band', source: 'Source' }[row[1] as 'point' | 'band' | 'source'];
	return `${kind} ${Number(row[2]) + 1}`;
}

type Sentence = (value: string, values: SpecFormValues, field: string) => string;

/** What is wrong, then what to do. */
const sentences: Record<FormFaultCode, Sentence> = {
	missing: (_, __, field) =>
		field === 'model' ? 'none is chosen. Choose one.' : 'nothing is entered. Enter a figure.',
	'not-a-number': (value) => `“${value}” is not a figure. Write digits, such as 4 or 0.5.`,
	'not-a-clock': (value) => `“${value}” is not hours and minutes. Write them as 2:00.`,
	'not-positive': (value) => `${value} is not above zero. Enter more than 0.`,
	negative: (value) => `${value} is below zero. Enter 0 or more.`,
	'below-absolute-zero': (value) => `${value} is colder than anything can be. Look at the sign and the unit.`,
	'range-upside-down': () => 'the range ends where it begins, or before. Enter the colder end first.',
	'q10-below-one': (value) =>
		`${value} would make cold goods age faster. Enter 1 or more; most produce lies between 2 and 4.`,
	'life-longer-when-warmer': (value) =>
		`${value} days is more than at the colder temperature before it. Enter a shorter life, or look at the temperature.`,
	'points-unsorted': (value) => `${value} stands there twice, or out of order. Enter each temperature once.`,
	'points-too-few': () => 'one point makes no table. Enter at least one more temperature and its life.',
	'bands-not-adjoining': (value) =>
		`the band begins at ${value}, not where the one before ends. Close the gap.`,
	'reference-outside-model': (value) =>
		`${value} lies outside the temperatures the model is valid for. Widen the range, or take a reference within it.`,
	'reference-below-chilling': (value) =>
		`${value} is above the reference temperature, where full life is counted. Enter that or colder.`,
	'reference-not-above-minimum': (value) =>
		`${value} is not below the reference temperature. Enter a colder one.`,
	'limits-upside-down': (value, { upperDegrees = '' }) =>
		`${value} is not below the upper limit of ${upperDegrees}. Enter a colder one.`,
	'stops-upside-down': (value, { ceiling = '' }) =>
		`${value} is not below the ceiling of ${ceiling}. Enter a colder one.`,
	'severity-upside-down': (value, values, field) =>
		`critical from ${value} comes before major from ${values[field.replace('Critical', 'Major')] ?? ''}. Enter that or later.`,
	'more-than-full-life': (value, values, field) => {
		const degrees = values[field === 'needed' ? 'neededDegrees' : 'customerDegrees'];
		const { fullLife = '' } = values;
		return degrees
			? `${value} days at ${degrees} is more than even fresh goods last there. Enter fewer days, or look at the temperature.`
			: `${value} days is more than the full life of ${fullLife}. Enter ${fullLife} or fewer.`;
	},
	'sensitivity-without-figure': () =>
		'a table has no figure of its own to be off. Leave it empty, or choose another model.',
	'sensitivity-too-wide': (value) =>
		`${value} would lift Tmin to the reference temperature or above. Enter less.`,
	'need-disagrees': (value) =>
		`${value} days is not what the need at its own temperature comes to. Enter one of them again.`,
	'row-incomplete': () => 'a highest figure needs a temperature and a life beside it. Enter both.',
	'grace-in-all-short': (value, values, field) => {
		const single = values[field.replace('InAll', '')] ?? '';
		return `${value} minutes in all is less than the ${single} allowed for one event. Enter ${single} or more.`;
	},
	'text-too-long': () => 'this is longer than 500 characters. Shorten it.'
};

/** One sentence about one field: "Lower limit: 20 minutes in all is less than the 30 allowed for one event. …" */
export function specFaultSentence({ field, code }: FormFault, values: SpecFormValues): string {
	const value = (values[field] ?? '').trim();
	return `${fieldName(field)}: ${sentences[code](value, values, field)}`;
}

/** The first sentence for each faulty field. */
export function specIssues(faults: readonly FormFault[], values: SpecFormValues): Record<string, string> {
	const issues: Record<string, string> = {};
	for (const fault of faults) issues[fault.field] ??= specFaultSentence(fault, values);
	return issues;
}
