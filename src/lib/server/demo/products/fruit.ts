import { at, customaryMkt, days, limit, lowLimit, qualityOnly, source, type DemoProduct } from './shape';

const handbook = 'USDA Agriculture Handbook 66';

const strawberry: DemoProduct = {
	name: 'Strawberries',
	family: 'berries',
	countUnit: 'case',
	reason: 'first version, Q10 by band from published respiration',
	spec: {
		referenceCelsius: 0,
		fullLifeHours: days(7),
		fullLifeUncertaintyHours: days(1),
		// 16, 75 and 150 mg/(kg·h) at 0, 10 and 20 °C: 4.69, then 2.00.
		model: {
			kind: 'banded-q10',
			bands: [
				{ fromCelsius: 0, toCelsius: 10, q10: 4.69 },
				{ fromCelsius: 10, toCelsius: 20, q10: 2 }
			]
		},
		validFromCelsius: 0,
		validToCelsius: 20,
		chillingCelsius: null,
		freezingCelsius: -0.8,
		ceilingCelsius: null,
		upper: limit(4, { graceMinutesInAll: 60, majorMinutes: 60, criticalMinutes: 180 }),
		lower: lowLimit(-0.5),
		neededHours: days(2.5),
		openingDefaultHours: days(2),
		mkt: customaryMkt,
		sources: [
			source(`${handbook}: 7 d at 0 °C; no range is printed, ±1 d is common practice`, at(0, days(7))),
			source('the same, respiration 16, 75 and 150 mg/(kg·h) at 0, 10 and 20 °C'),
			source('UC Davis Postharvest Center, produce fact sheet, strawberry: best at 0 ±0.5 °C')
		],
		caution: qualityOnly
	}
};

const blueberry: DemoProduct = {
	name: 'Blueberries',
	family: 'berries',
	countUnit: 'case',
	reason: 'first version, Q10 by band from published respiration',
	spec: {
		referenceCelsius: 0,
		fullLifeHours: days(17.5),
		// Middle and half-width of the printed 2 to 3 weeks.
		fullLifeUncertaintyHours: days(3.5),
		// 6, 29 and 70 mg/(kg·h) at 0, 10 and 20 °C: 4.83, then 2.41.
		model: {
			kind: 'banded-q10',
			bands: [
				{ fromCelsius: 0, toCelsius: 10, q10: 4.83 },
				{ fromCelsius: 10, toCelsius: 20, q10: 2.41 }
			]
		},
		validFromCelsius: 0,
		validToCelsius: 20,
		chillingCelsius: null,
		freezingCelsius: -1.3,
		ceilingCelsius: null,
		upper: limit(4),
		lower: lowLimit(-0.5),
		neededHours: days(7),
		openingDefaultHours: days(3),
		mkt: customaryMkt,
		sources: [
			source(`NC State Extension, quoting ${handbook} (1986): 2 to 3 weeks`, at(0, days(14)), days(21)),
			source(
				'UC Davis Postharvest Center, produce fact sheet, blueberry: 1 to 2 weeks at 0 ±0.5 °C',
				at(0, days(7)),
				days(14)
			),
			source(`${handbook}, respiration 6, 29 and 70 mg/(kg·h) at 0, 10 and 20 °C; freezes from −1.3 °C`)
		],
		caution: `${qualityOnly} The two published lives hardly overlap; the fact sheet is the shorter.`
	}
};

const grape: DemoProduct = {
	name: 'Table grapes',
	family: 'fruit',
	countUnit: 'case',
	reason: 'first version, one Q10 from published respiration',
	spec: {
		referenceCelsius: 0,
		fullLifeHours: days(17.5),
		// Middle and half-width of the printed 1 to 4 weeks.
		fullLifeUncertaintyHours: days(10.5),
		// 3 mg/(kg·h) at 0 °C and 27 at 20 °C: √9 = 3.00 for each ten degrees.
		model: { kind: 'constant-q10', q10: 3 },
		validFromCelsius: -1,
		validToCelsius: 20,
		chillingCelsius: null,
		freezingCelsius: -2.7,
		ceilingCelsius: null,
		upper: limit(4),
		lower: lowLimit(-1.5),
		neededHours: days(3),
		openingDefaultHours: days(2),
		mkt: customaryMkt,
		sources: [
			source(`${handbook}: 1 to 4 weeks at −1 to 0 °C, longer with SO₂`, at(0, days(7)), days(28)),
			source('the same, respiration 3 mg/(kg·h) at 0 °C, 27 at 20 °C: Q10 3.00'),
			source('UC Davis Postharvest Center, produce fact sheet, table grape: berries freeze from −2.7 °C')
		],
		caution: `${qualityOnly} SO₂ pads lengthen life; they are not counted.`
	}
};

export const fruit: readonly DemoProduct[] = [strawberry, blueberry, grape];
