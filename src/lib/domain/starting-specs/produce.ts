import { q10FromTwoRates } from '../shelf-life/rate-q10';
import type { Spec } from '../shelf-life/spec';
import { at, days, months, qualityOnly, source, unsettled, type StartingSpec } from './starting-spec';

const handbook = 'USDA Agriculture Handbook 66';
const davis = 'UC Davis Postharvest Center';
const storageTable = `${davis}, Cantwell 2001, Properties and recommended conditions for long-term storage`;
const unmeasured = 'Ethylene, humidity, atmosphere, bruising and starting quality are not measured.';

interface Respiring {
	readonly product: string;
	readonly family: string;
	/** mg CO₂/(kg·h) at 0, 10 and 20 °C: AH-66, Saltveit, Respiratory metabolism, summary table. */
	readonly rates: readonly [number, number, number];
	/** Life as printed, shortest and longest, hours. */
	readonly life: readonly [number, number];
	readonly lifeSource: string;
	readonly freezingCelsius: number;
	readonly referenceCelsius?: number;
	readonly chillingCelsius?: number;
	readonly caution?: string;
}

/** Life as printed at the reference; its rate by the Q10 of published respiration over each ten degrees. */
function byRespiration(sheet: Respiring): StartingSpec {
	const {
		product,
		family,
		rates,
		life,
		freezingCelsius,
		referenceCelsius = 0,
		chillingCelsius = null
	} = sheet;
	const [shortest, longest] = life;
	const [at0, at10, at20] = rates;
	const high = longest > shortest ? longest : null;
	return {
		key: product.toLowerCase().replace(/[^a-z]+/g, '-'),
		product,
		family,
		figures: {
			...unsettled,
			referenceCelsius,
			fullLifeHours: (shortest + longest) / 2,
			fullLifeUncertaintyHours: (longest - shortest) / 2,
			model: {
				kind: 'banded-q10',
				bands: [
					{ fromCelsius: 0, toCelsius: 10, q10: q10FromTwoRates(0, at0, 10, at10) },
					{ fromCelsius: 10, toCelsius: 20, q10: q10FromTwoRates(10, at10, 20, at20) }
				]
			},
			validFromCelsius: 0,
			validToCelsius: 20,
			chillingCelsius,
			freezingCelsius,
			sources: [
				source(sheet.lifeSource, at(referenceCelsius, shortest), high),
				source(
					`${handbook}, Respiratory metabolism, summary table: ${at0}, ${at10} and ${at20} mg CO₂/(kg·h) at 0, 10 and 20 °C`
				),
				source(`highest freezing point ${freezingCelsius} °C: ${storageTable}; ${handbook}`)
			],
			caution: [qualityOnly, unmeasured, sheet.caution].filter(Boolean).join(' ')
		}
	};
}

const respiring: readonly Respiring[] = [
	{
		product: 'Apples, fall',
		family: 'fruit',
		rates: [3, 9, 20],
		life: [months(2), months(4)],
		lifeSource: `${handbook}: 2 to 4 months at −1 to 4 °C`,
		freezingCelsius: -1.5,
		caution: 'Cultivars that suffer from cold need 4 °C; controlled atmosphere lengthens life.'
	},
	{
		product: 'Asparagus',
		family: 'vegetables',
		rates: [60, 215, 270],
		life: [days(14), days(21)],
		lifeSource: `${handbook}: 14 to 21 d at 0 to 2 °C`,
		freezingCelsius: -0.6,
		referenceCelsius: 2,
		chillingCelsius: 2,
		caution: 'Chilled below 0 to 2 °C for long; the warmer end is taken.'
	},
	{
		product: 'Blueberries',
		family: 'berries',
		rates: [6, 29, 70],
		life: [days(7), days(14)],
		lifeSource: `${davis}, produce fact sheet, blueberry: 1 to 2 weeks at 0 ±0.5 °C`,
		freezingCelsius: -1.3,
		caution: `Another table gives 2 to 3 weeks (NC State Extension, quoting ${handbook}, 1986).`
	},
	{
		product: 'Cabbage',
		family: 'vegetables',
		rates: [5, 18, 42],
		life: [months(3), months(6)],
		lifeSource: `${storageTable}: 3 to 6 months at 0 °C`,
		freezingCelsius: -0.9
	},
	{
		product: 'Cauliflower',
		family: 'vegetables',
		rates: [17, 34, 79],
		life: [days(21), days(21)],
		lifeSource: `${storageTable}: 3 weeks at 0 °C`,
		freezingCelsius: -0.8,
		caution: 'No range of life is printed: enter your own ±.'
	},
	{
		product: 'Table grapes',
		family: 'fruit',
		rates: [3, 13, 27],
		life: [days(7), days(28)],
		lifeSource: `${handbook}: 1 to 4 weeks at −1 to 0 °C`,
		freezingCelsius: -2.7,
		caution: 'SO₂ pads lengthen life; they are not counted.'
	},
	{
		product: 'Mushrooms',
		family: 'vegetables',
		rates: [36, 97, 264],
		life: [days(7), days(14)],
		lifeSource: `${storageTable}: 7 to 14 d at 0 °C`,
		freezingCelsius: -0.9
	},
	{
		product: 'Raspberries',
		family: 'berries',
		rates: [17, 35, 125],
		life: [days(2), days(5)],
		lifeSource: `${davis}, produce fact sheet, raspberry: 2 to 5 d at −0.5 to 0 °C`,
		freezingCelsius: -0.9,
		caution: 'One printing of the respiration table labels the coldest column 2 °C.'
	},
	{
		product: 'Snap beans',
		family: 'vegetables',
		rates: [20, 58, 130],
		life: [days(8), days(12)],
		lifeSource: `${storageTable}: 8 to 12 d at 5 to 7.5 °C`,
		freezingCelsius: -0.7,
		referenceCelsius: 7,
		chillingCelsius: 7,
		caution: 'Chilled below 7 °C: cold earns no credit there.'
	},
	{
		product: 'Spinach',
		family: 'vegetables',
		rates: [21, 110, 230],
		life: [days(10), days(14)],
		lifeSource: `${storageTable}: 10 to 14 d at 0 °C`,
		freezingCelsius: -0.3
	},
	{
		product: 'Strawberries',
		family: 'berries',
		rates: [16, 75, 150],
		life: [days(7), days(7)],
		lifeSource: `${handbook}: 7 d at 0 °C`,
		freezingCelsius: -0.8,
		caution: 'No range of life is printed: enter your own ±.'
	},
	{
		product: 'Sweet corn',
		family: 'vegetables',
		rates: [41, 105, 261],
		life: [days(4), days(6)],
		lifeSource: `${storageTable}: 4 to 6 d at 0 °C`,
		freezingCelsius: -0.6
	}
];

/** Lives printed at several temperatures: the table is the model and nothing lies outside it. */
function byTable(
	product: string,
	figures: Pick<Spec, 'model' | 'sources'> & { to: number; freezing: number }
): StartingSpec {
	return {
		key: product.toLowerCase().replace(/[^a-z]+/g, '-'),
		product,
		family: 'vegetables',
		figures: {
			...unsettled,
			referenceCelsius: 0,
			fullLifeHours: days(28),
			fullLifeUncertaintyHours: days(7),
			model: figures.model,
			validFromCelsius: 0,
			validToCelsius: figures.to,
			freezingCelsius: figures.freezing,
			sources: figures.sources,
			caution: `${qualityOnly} ${unmeasured} 28 d is the long end of the printed 21 to 28.`
		}
	};
}

const tables: readonly StartingSpec[] = [
	byTable('Broccoli', {
		to: 10,
		freezing: -0.6,
		model: { kind: 'life-table', points: [at(0, days(28)), at(5, days(14)), at(10, days(5))] },
		sources: [
			source(`${davis}, produce fact sheet, broccoli: 21 to 28 d at 0 °C`, at(0, days(21)), days(28)),
			source('the same: 14 d at 5 °C', at(5, days(14))),
			source('the same: about 5 d at 10 °C; freezes from −0.6 °C', at(10, days(5)))
		]
	}),
	byTable('Lettuce, crisphead', {
		to: 5,
		freezing: -0.2,
		model: { kind: 'life-table', points: [at(0, days(28)), at(5, days(14))] },
		sources: [
			source(
				`${davis}, produce fact sheet, lettuce, crisphead: 21 to 28 d at 0 °C`,
				at(0, days(21)),
				days(28)
			),
			source('the same: 14 d at 5 °C without ethylene; freezes below −0.2 °C', at(5, days(14)))
		]
	})
];

/** Fresh produce. */
export const produce: readonly StartingSpec[] = [...respiring.map(byRespiration), ...tables];
