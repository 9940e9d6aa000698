import { at, months, qualityOnly, source, unsettled, type StartingSpec } from './starting-spec';

const iir =
	'International Institute of Refrigeration, Recommendations for the processing and handling of frozen foods, 3rd ed. 1986';
const law = 'Quick-frozen goods must be at −18 °C or colder whatever life is left (Directive 89/108/EEC).';

/** Months as printed; null where the table says only "more than", which is no point to draw through. */
type Row = readonly [product: string, family: string, at24: number | null, at18: number, at12: number | null];

/** Source: the table of practical storage life of the recommendations named above, months at −24, −18 and −12 °C. */
const rows: readonly Row[] = [
	['Beef cuts, frozen', 'meat', 24, 18, 8],
	['Ground beef, frozen', 'meat', 15, 10, 6],
	['Lamb cuts, frozen', 'meat', 24, 18, 12],
	['Pork cuts, frozen', 'meat', 15, 10, 6],
	['Chicken, frozen', 'meat', null, 18, 9],
	['Turkey, frozen', 'meat', null, 15, 8],
	['Fatty fish, glazed, frozen', 'fish', null, 5, 3],
	['Lean fish, frozen', 'fish', null, 9, 4],
	['Shrimp, cooked and peeled, frozen', 'fish', null, 5, 2],
	['Green beans, frozen', 'vegetables', null, 15, 4],
	['Peas, frozen', 'vegetables', null, 24, 6],
	['Broccoli, frozen', 'vegetables', 24, 15, null],
	['Spinach, frozen', 'vegetables', null, 18, 4],
	['Strawberries and raspberries, frozen', 'berries', null, 24, 5],
	['Ice cream', 'dairy', 24, 6, 1]
];

function frozenSpec([product, family, at24, at18, at12]: Row): StartingSpec {
	const printed = [
		[-24, at24],
		[-18, at18],
		[-12, at12]
	] as const;
	const points = printed.flatMap(([celsius, count]) => (count === null ? [] : [at(celsius, months(count))]));
	const sources = printed.flatMap(([celsius, count]) =>
		count === null ? [] : [source(`${iir}: ${count} months at ${celsius} °C`, at(celsius, months(count)))]
	);
	return {
		key: product.toLowerCase().replace(/[^a-z]+/g, '-'),
		product,
		family,
		figures: {
			...unsettled,
			referenceCelsius: -18,
			fullLifeHours: months(at18),
			fullLifeUncertaintyHours: 0,
			model: { kind: 'life-table', points },
			validFromCelsius: points[0]?.celsius ?? -18,
			validToCelsius: points[points.length - 1]?.celsius ?? -18,
			sources,
			caution: `${qualityOnly} No range of life is printed: enter your own ±. ${law}`
		}
	};
}

/** Frozen goods. */
export const frozen: readonly StartingSpec[] = rows.map(frozenSpec);
