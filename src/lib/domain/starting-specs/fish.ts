import { exp } from '../math/exp';
import { at, days, qualityOnly, source, unsettled, type StartingSpec } from './starting-spec';

const fao = 'FAO Fisheries Technical Paper 348 (Huss 1995), 6.1';
const histamine = 'Histamine and other hazards follow the HACCP plan, not this figure.';

/** √rate is a straight line to nothing at −10 °C; fish begins to freeze about −1 °C, where the model ends. */
function inIce(
	product: string,
	lifeDays: number,
	others: readonly (readonly [number, number])[]
): StartingSpec {
	return {
		key: product.toLowerCase().replace(/[^a-z]+/g, '-'),
		product,
		family: 'fish',
		figures: {
			...unsettled,
			referenceCelsius: 0,
			fullLifeHours: days(lifeDays),
			fullLifeUncertaintyHours: 0,
			model: { kind: 'square-root', minCelsius: -10 },
			validFromCelsius: -1,
			validToCelsius: 15,
			sources: [
				source(`${fao}: ${lifeDays} d at 0 °C`, at(0, days(lifeDays))),
				...others.map(([celsius, lifeAt]) =>
					source(`the same: ${lifeAt} d at ${celsius} °C`, at(celsius, days(lifeAt)))
				),
				source(
					'Olley & Ratkowsky 1973; Ratkowsky et al. 1982: rate (1 + 0.1 T)² for fish of temperate waters'
				)
			],
			caution: `${qualityOnly} No range of life is printed: enter your own ±. ${histamine}`
		}
	};
}

const smokedSalmon: StartingSpec = {
	key: 'salmon-cold-smoked',
	product: 'Salmon, cold-smoked, vacuum-packed',
	family: 'fish',
	figures: {
		...unsettled,
		referenceCelsius: 5,
		fullLifeHours: days(36.5),
		fullLifeUncertaintyHours: days(0.5),
		model: { kind: 'constant-q10', q10: exp(0.89) },
		validFromCelsius: 0,
		validToCelsius: 25,
		sources: [
			source('Dalgaard, Murillo & Jørgensen 2004: ln of the relative rate is 0.089 T, valid 0 to 25 °C'),
			source(
				'the same, worked back from its two batches moved between 5 and 15 °C: 36.3 to 37.1 d at 5 °C',
				at(5, days(36.3)),
				days(37.1)
			)
		],
		caution: `${qualityOnly} Packed without oxygen: botulinum and Listeria set their own limits (3.3 °C in the FDA Hazards Guide).`
	}
};

/** Chilled fish and shellfish. */
export const fish: readonly StartingSpec[] = [
	inIce('Cod, packed', 14, [
		[5, 6],
		[10, 3]
	]),
	inIce('Salmon, fresh', 11.8, [
		[5, 8],
		[10, 3]
	]),
	inIce('Sea bream', 32, [[10, 8]]),
	inIce('Crab claws', 10.1, [
		[5, 5.5],
		[10, 2.6]
	]),
	smokedSalmon
];
