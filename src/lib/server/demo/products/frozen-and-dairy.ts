import {
	at,
	customaryMkt,
	days,
	limit,
	lowLimit,
	months,
	qualityOnly,
	source,
	type DemoProduct
} from './shape';

const iir =
	'International Institute of Refrigeration, Recommendations for the processing and handling of frozen foods, 3rd ed. 1986';
const quickFrozen =
	'Directive 89/108/EEC, art. 5: −18 °C, brief upward fluctuations of at most 3 °C in transport';

const peas: DemoProduct = {
	name: 'Peas, frozen',
	family: 'frozen',
	countUnit: 'case',
	reason: 'first version, from two published lives',
	spec: {
		referenceCelsius: -18,
		fullLifeHours: months(24),
		fullLifeUncertaintyHours: months(2),
		model: { kind: 'two-lives', lower: at(-18, months(24)), upper: at(-12, months(6)) },
		validFromCelsius: -24,
		validToCelsius: -12,
		chillingCelsius: null,
		freezingCelsius: null,
		ceilingCelsius: null,
		upper: limit(-15, { graceMinutes: 20, graceMinutesInAll: 60, majorMinutes: 60, criticalMinutes: 240 }),
		lower: null,
		neededHours: months(12),
		openingDefaultHours: months(3),
		mkt: customaryMkt,
		sources: [
			source(`${iir}, peas: 24 months at −18 °C`, at(-18, months(24))),
			source('the same: 6 months at −12 °C', at(-12, months(6))),
			source('the same: more than 24 months at −24 °C, which is not a figure to draw through'),
			source(quickFrozen),
			source('±2 months: common practice, no source')
		],
		caution: qualityOnly
	}
};

const iceCream: DemoProduct = {
	name: 'Ice cream',
	family: 'dairy',
	countUnit: 'case',
	reason: 'first version, from the published life table',
	spec: {
		referenceCelsius: -18,
		fullLifeHours: months(6),
		fullLifeUncertaintyHours: months(0.5),
		model: {
			kind: 'life-table',
			points: [at(-24, months(24)), at(-18, months(6)), at(-12, months(1))]
		},
		validFromCelsius: -24,
		validToCelsius: -12,
		chillingCelsius: null,
		freezingCelsius: null,
		ceilingCelsius: null,
		upper: limit(-17, { graceMinutes: 20, graceMinutesInAll: 60, majorMinutes: 60, criticalMinutes: 240 }),
		lower: null,
		neededHours: months(3),
		openingDefaultHours: months(1),
		mkt: customaryMkt,
		sources: [
			source(`${iir}, ice cream: 24 months at −24 °C`, at(-24, months(24))),
			source('the same: 6 months at −18 °C', at(-18, months(6))),
			source('the same: 1 month at −12 °C', at(-12, months(1))),
			source('ATP, Annex 2: ice cream at −20 °C; the limit adds the customary 3 °C'),
			source('±2 weeks: common practice, no source')
		],
		caution: `${qualityOnly} Every thaw and refreeze coarsens the ice; the life table does not count them.`
	}
};

const milk: DemoProduct = {
	name: 'Milk, pasteurised',
	family: 'dairy',
	countUnit: 'crate',
	reason: 'first version; the life is common practice until the dairy sends its own',
	spec: {
		referenceCelsius: 4,
		fullLifeHours: days(14),
		fullLifeUncertaintyHours: days(2),
		model: { kind: 'constant-q10', q10: 3 },
		validFromCelsius: 0,
		validToCelsius: 15,
		chillingCelsius: null,
		freezingCelsius: null,
		ceilingCelsius: null,
		upper: limit(5, { graceMinutesInAll: 60 }),
		lower: lowLimit(0),
		neededHours: days(7),
		openingDefaultHours: days(3),
		mkt: customaryMkt,
		sources: [
			source('14 ±2 d at 4 °C and Q10 3: common practice, no source', at(4, days(12)), days(16)),
			source('FDA Food Code 3-202.11(A): 5 °C (41 °F) or below when received'),
			source('ATP, Annex 3: pasteurised milk at 6 °C or colder')
		],
		caution: qualityOnly
	}
};

export const frozenAndDairy: readonly DemoProduct[] = [peas, iceCream, milk];
