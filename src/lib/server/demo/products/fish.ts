import { at, customaryMkt, days, limit, lowLimit, source, type DemoProduct } from './shape';

const fao = 'FAO Fisheries Technical Paper 348 (Huss 1995), 6.1';
const notSafety = 'Quality estimate only; it does not assess safety and is not a clearance.';

const cod: DemoProduct = {
	name: 'Cod, fresh, gutted',
	family: 'fish',
	countUnit: 'box',
	reason: 'first version, square root with Tmin −10 °C',
	spec: {
		referenceCelsius: 0,
		fullLifeHours: days(14),
		// The same table's 3.0 d at 10 °C reads back to 12 d in ice.
		fullLifeUncertaintyHours: days(2),
		model: { kind: 'square-root', minCelsius: -10 },
		validFromCelsius: -1,
		validToCelsius: 15,
		chillingCelsius: null,
		freezingCelsius: -1,
		ceilingCelsius: null,
		upper: limit(2, { graceMinutesInAll: 60, majorMinutes: 60, criticalMinutes: 180 }),
		lower: lowLimit(-0.7),
		neededHours: days(5),
		openingDefaultHours: days(3),
		mkt: customaryMkt,
		sources: [
			source(`${fao}, packed cod: 14 d at 0 °C`, at(0, days(14))),
			source('the same: 6.0 d at 5 °C', at(5, days(6))),
			source('the same: 3.0 d at 10 °C', at(10, days(3))),
			source('Ratkowsky et al. 1982; Dalgaard 2002: fresh fish, Tmin −10 °C'),
			source('Regulation (EC) 853/2004, Annex III, Section VIII: the temperature of melting ice')
		],
		caution: `${notSafety} Below about −1 °C the fish is part-frozen and the model is out of its range.`
	}
};

const salmon: DemoProduct = {
	name: 'Salmon, fresh, head on',
	family: 'fish',
	countUnit: 'box',
	reason: 'first version, from the published life table',
	spec: {
		referenceCelsius: 0,
		fullLifeHours: days(11.8),
		fullLifeUncertaintyHours: days(1),
		model: { kind: 'life-table', points: [at(0, days(11.8)), at(5, days(8)), at(10, days(3))] },
		validFromCelsius: 0,
		validToCelsius: 10,
		chillingCelsius: null,
		freezingCelsius: -1,
		ceilingCelsius: null,
		upper: limit(2, { graceMinutesInAll: 60, majorMinutes: 60, criticalMinutes: 180 }),
		lower: lowLimit(-0.7),
		neededHours: days(4),
		openingDefaultHours: days(3),
		mkt: customaryMkt,
		sources: [
			source(
				`${fao}, salmon: 11.8 d at 0 °C; no range is printed, ±1 d is common practice`,
				at(0, days(11.8))
			),
			source('the same: 8.0 d at 5 °C', at(5, days(8))),
			source('the same: 3.0 d at 10 °C', at(10, days(3))),
			source('Regulation (EC) 853/2004, Annex III, Section VIII: the temperature of melting ice')
		],
		caution: notSafety
	}
};

const smokedSalmon: DemoProduct = {
	name: 'Salmon, cold-smoked, vacuum',
	family: 'fish',
	countUnit: 'case',
	reason: 'first version, exponential after the published batches',
	spec: {
		referenceCelsius: 5,
		fullLifeHours: days(36.5),
		// Both published batches together put the life at 5 °C between 36.3 and 37.1 d.
		fullLifeUncertaintyHours: days(0.6),
		// ln(rate) = 0.089·T: e^0.89 = 2.435 for ten degrees.
		model: { kind: 'constant-q10', q10: 2.435 },
		validFromCelsius: 0,
		validToCelsius: 25,
		chillingCelsius: null,
		freezingCelsius: null,
		ceilingCelsius: null,
		upper: limit(3.3, { graceMinutes: 20, graceMinutesInAll: 60, majorMinutes: 60, criticalMinutes: 240 }),
		lower: null,
		neededHours: days(21),
		openingDefaultHours: days(7),
		mkt: customaryMkt,
		sources: [
			source(
				'Dalgaard, Murillo and Jørgensen 2004, vacuum-packed cold-smoked salmon: ln(rate) = 0.089·T, 0 to 25 °C',
				at(5, days(36.3)),
				days(37.1)
			),
			source(
				'FDA Fish and Fishery Products Hazards and Controls Guide: reduced-oxygen packs at 3.3 °C or colder'
			)
		],
		caution:
			'Reduced-oxygen pack: limit 3.3 °C; this figure is not a clearance. It does not cover C. botulinum or Listeria.'
	}
};

export const fish: readonly DemoProduct[] = [cod, salmon, smokedSalmon];
