import { at, customaryMkt, days, limit, lowLimit, source, type DemoProduct } from './shape';

const vaccine: DemoProduct = {
	name: 'Vaccine, refrigerated, 10-dose vials',
	family: 'medicines',
	countUnit: 'shipper',
	reason: 'first version, arithmetic only; the holder of the authorisation decides',
	spec: {
		referenceCelsius: 5,
		// "More than 2 years": the least it says is the figure, so there is nothing to take off it.
		fullLifeHours: days(730),
		fullLifeUncertaintyHours: 0,
		// 45 d at 25 °C and 7 d at 37 °C: R·ln(45/7)/(1/298.15 − 1/310.15) = 119.22 kJ/mol.
		model: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: 119.22 },
		validFromCelsius: 2,
		validToCelsius: 37,
		chillingCelsius: 2,
		freezingCelsius: 0,
		ceilingCelsius: null,
		upper: limit(8, {
			graceMinutes: 10,
			graceMinutesInAll: 30,
			hysteresisCelsius: 0.3,
			majorMinutes: 30,
			criticalMinutes: 120,
			airGraceMinutes: 15,
			airGraceMinutesInAll: 45
		}),
		lower: lowLimit(2, {
			graceMinutes: 10,
			graceMinutesInAll: 30,
			hysteresisCelsius: 0.3,
			majorMinutes: 30,
			criticalMinutes: 120,
			airGraceMinutes: 15,
			airGraceMinutesInAll: 45
		}),
		neededHours: days(365),
		openingDefaultHours: days(90),
		mkt: { activationEnergyKilojoulesPerMole: null, windowHours: 24, limitCelsius: 8 },
		sources: [
			source('WHO specification E6/IN5, category of 7 days: more than 2 years at 5 °C', at(5, days(730))),
			source('the same: 45 d at 25 °C', at(25, days(45))),
			source('the same: 7 d at 37 °C', at(37, days(7))),
			source('CDC vaccine storage guidance: 2 to 8 °C; one exposure at 0 °C or below can destroy it')
		],
		caution:
			'Arithmetic only, for QA to review with the manufacturer. Only the authorisation holder’s stability data decide; a monitor category is not this vaccine’s own kinetics. Freezing: hold, shake test.'
	}
};

const tulips: DemoProduct = {
	name: 'Tulips, cut',
	family: 'flowers',
	countUnit: 'bucket',
	reason: 'first version, common practice until tried in the vase',
	spec: {
		referenceCelsius: 2,
		fullLifeHours: days(9),
		fullLifeUncertaintyHours: days(2),
		model: { kind: 'constant-q10', q10: 3 },
		validFromCelsius: 0,
		validToCelsius: 20,
		chillingCelsius: null,
		freezingCelsius: -0.5,
		ceilingCelsius: null,
		upper: limit(5),
		lower: lowLimit(0),
		neededHours: days(4),
		openingDefaultHours: days(2),
		mkt: customaryMkt,
		sources: [
			source('9 ±2 d at 2 °C and Q10 3: common practice, no source', at(2, days(7)), days(11)),
			source('Freezing stop −0.5 °C: common practice, no source')
		],
		caution: 'Quality estimate only. Bud stage at harvest and water are not measured.'
	}
};

export const notFood: readonly DemoProduct[] = [vaccine, tulips];
