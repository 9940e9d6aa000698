import { at, customaryMkt, days, limit, lowLimit, qualityOnly, source, type DemoProduct } from './shape';

const postharvest = 'UC Davis Postharvest Center, produce fact sheet';
const storageTable =
	'UC Davis, Properties and recommended conditions for long-term storage of fresh fruits and vegetables, 2001';

const broccoli: DemoProduct = {
	name: 'Broccoli, crowns',
	family: 'vegetables',
	countUnit: 'case',
	reason: 'first version, from the published life table',
	spec: {
		referenceCelsius: 0,
		fullLifeHours: days(28),
		// Published as 21–28 d: the low figure is seven days under the one the table is drawn through.
		fullLifeUncertaintyHours: days(7),
		model: { kind: 'life-table', points: [at(0, days(28)), at(5, days(14)), at(10, days(5))] },
		validFromCelsius: 0,
		validToCelsius: 10,
		chillingCelsius: null,
		freezingCelsius: -0.6,
		ceilingCelsius: null,
		upper: limit(5),
		lower: lowLimit(-0.3),
		neededHours: days(10),
		openingDefaultHours: days(4),
		mkt: customaryMkt,
		sources: [
			source(`${postharvest}, broccoli: 21 to 28 d at 0 °C`, at(0, days(21)), days(28)),
			source('the same: 14 d at 5 °C', at(5, days(14))),
			source('the same: about 5 d at 10 °C; freezes from −0.6 °C', at(10, days(5))),
			source('USDA Agriculture Handbook 66: 2 to 3 weeks at 0 °C', at(0, days(14)), days(21))
		],
		caution: qualityOnly
	}
};

const lettuce: DemoProduct = {
	name: 'Lettuce, crisphead',
	family: 'vegetables',
	countUnit: 'carton',
	reason: 'first version, from two published lives',
	spec: {
		referenceCelsius: 0,
		fullLifeHours: days(28),
		fullLifeUncertaintyHours: days(7),
		model: { kind: 'two-lives', lower: at(0, days(28)), upper: at(5, days(14)) },
		validFromCelsius: 0,
		validToCelsius: 5,
		chillingCelsius: null,
		freezingCelsius: -0.2,
		ceilingCelsius: null,
		upper: limit(5),
		lower: lowLimit(-0.1),
		neededHours: days(10),
		openingDefaultHours: days(4),
		mkt: customaryMkt,
		sources: [
			source(`${postharvest}, crisphead lettuce: 21 to 28 d at 0 °C`, at(0, days(21)), days(28)),
			source('the same: 14 d at 5 °C without ethylene; freezes below −0.2 °C', at(5, days(14)))
		],
		caution: `${qualityOnly} Freezing begins a fifth of a degree under the storage temperature.`
	}
};

const asparagus: DemoProduct = {
	name: 'Asparagus',
	family: 'vegetables',
	countUnit: 'crate',
	reason: 'first version, Q10 from published respiration',
	spec: {
		referenceCelsius: 2,
		fullLifeHours: days(17.5),
		// Middle and half-width of the printed 14 to 21 d.
		fullLifeUncertaintyHours: days(3.5),
		// 60 mg/(kg·h) at 0 °C and 215 at 10 °C: 215/60 = 3.58.
		model: { kind: 'constant-q10', q10: 3.58 },
		validFromCelsius: 0,
		validToCelsius: 10,
		chillingCelsius: 2,
		freezingCelsius: -0.6,
		ceilingCelsius: null,
		upper: limit(5),
		lower: lowLimit(0),
		neededHours: days(6),
		openingDefaultHours: days(3),
		mkt: customaryMkt,
		sources: [
			source('USDA Agriculture Handbook 66: 14 to 21 d at 0 to 2 °C', at(2, days(14)), days(21)),
			source('the same, respiration 60 mg/(kg·h) at 0 °C, 215 at 10 °C: Q10 3.58'),
			source(`${storageTable}: 2.5 °C, 2 to 3 weeks; freezes from −0.6 °C; chilling under 0 to 2 °C`)
		],
		caution: `${qualityOnly} Under 2 °C cold earns no credit.`
	}
};

const tomato: DemoProduct = {
	name: 'Tomatoes, ripe',
	family: 'vegetables',
	countUnit: 'case',
	reason: 'first version, with a chilling threshold',
	spec: {
		referenceCelsius: 10,
		fullLifeHours: days(14),
		// Middle and half-width of the printed 1 to 3 weeks.
		fullLifeUncertaintyHours: days(7),
		model: { kind: 'constant-q10', q10: 2.5 },
		validFromCelsius: 10,
		validToCelsius: 20,
		chillingCelsius: 10,
		freezingCelsius: -0.5,
		ceilingCelsius: null,
		upper: limit(14, { graceMinutes: 60, graceMinutesInAll: 240, airGraceMinutes: 90 }),
		lower: lowLimit(7, { graceMinutes: 60, graceMinutesInAll: 180, hysteresisCelsius: 0.5 }),
		neededHours: days(3),
		openingDefaultHours: days(3),
		mkt: customaryMkt,
		sources: [
			source(
				'USDA Agriculture Handbook 66, tomato, ripe: 1 to 3 weeks at 8 to 10 °C',
				at(10, days(7)),
				days(21)
			),
			source('the same, lowest safe temperature 7 to 10 °C; the higher is taken'),
			source('Saltveit, Respiratory metabolism, the same handbook: Q10 2.0 to 2.5 from 10 to 20 °C')
		],
		caution: `${qualityOnly} Below the chilling threshold shelf life is not credited; the harm shows later, in the warm.`
	}
};

export const vegetables: readonly DemoProduct[] = [broccoli, lettuce, asparagus, tomato];
