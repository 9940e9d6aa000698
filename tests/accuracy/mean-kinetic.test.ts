import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import { meanKineticCelsius } from '../../src/lib/domain/shelf-life/mean-kinetic';
import { arithmeticMean } from '../../src/lib/domain/trace/statistics';
import { celsiusFromFahrenheit } from '../../src/lib/domain/units';
import { beaverCelsius } from './beaver';
import { buildInput, buildSpec, buildTrace, traceAt, startMs, hourMs } from './build';

/** [weight, °C] pairs; mean; mean kinetic temperature at 83.144, 60 and 100 kJ/mol. */
type Vector = readonly [
	name: string,
	held: readonly (readonly [number, number])[],
	mean: number,
	customary: number,
	at60: number,
	at100: number
];

// Source: the formula of USP ⟨1160⟩ (Haynes, J. Pharm. Sci. 60:927–929, 1971) with R 8.3144 J/(mol·K), each profile
// worked out to four decimals in double precision, independently of this code.
const vectors: readonly Vector[] = [
	['24 h at 5', [[24, 5]], 5, 5, 5, 5],
	[
		'20 and 30',
		[
			[1, 20],
			[1, 30]
		],
		25,
		26.2599,
		25.9075,
		26.5006
	],
	[
		'2 and 8',
		[
			[1, 2],
			[1, 8]
		],
		5,
		5.5364,
		5.3826,
		5.6449
	],
	[
		'18 h at 5, 6 h at 14',
		[
			[18, 5],
			[6, 14]
		],
		7.25,
		8.2852,
		7.9568,
		8.5308
	],
	[
		'23 h at 5, 1 h at 14',
		[
			[23, 5],
			[1, 14]
		],
		5.375,
		5.6463,
		5.5475,
		5.7304
	],
	[
		'29 d at 22, 1 d at 38',
		[
			[29, 22],
			[1, 38]
		],
		22.5333,
		23.2759,
		22.9753,
		23.5523
	],
	[
		'27 d at 24, 3 d at 29',
		[
			[27, 24],
			[3, 29]
		],
		24.5,
		24.636,
		24.5919,
		24.6703
	],
	[
		'719 h at 22, 1 h at 40',
		[
			[719, 22],
			[1, 40]
		],
		22.025,
		22.0724,
		22.0515,
		22.094
	],
	[
		'−20, 5 and 25',
		[
			[1, -20],
			[1, 5],
			[1, 25]
		],
		3.3333,
		16.281,
		14.0193,
		17.476
	],
	[
		'15 to 30',
		[
			[1, 15],
			[1, 20],
			[1, 25],
			[1, 30]
		],
		22.5,
		24.1041,
		23.6539,
		24.4136
	],
	[
		'25 and 40',
		[
			[1, 25],
			[1, 40]
		],
		32.5,
		35.0741,
		34.3907,
		35.5163
	],
	// Source: GS1 EPCIS 2.0 repository, JSON/WithSensorData, example 5: 26.0 to 26.5 by tenths.
	[
		'the EPCIS example',
		[26, 26.1, 26.2, 26.3, 26.4, 26.5].map((t) => [1, t] as const),
		26.25,
		26.2515,
		26.2511,
		26.2519
	],
	[
		'20 h at 4, 3 h at 9, 1 h at 15',
		[
			[20, 4],
			[3, 9],
			[1, 15]
		],
		5.0833,
		5.6336,
		5.4413,
		5.7916
	]
];

/** The same profile as a log, one reading an hour (or a day): each stands for what follows it. */
function logOf(held: readonly (readonly [number, number])[]): number[] {
	return held.flatMap(([count, celsius]) => Array.from({ length: count }, () => celsius));
}

describe('mean kinetic temperature', () => {
	it.each(vectors)('of %s', (_, held, mean, customary, at60, at100) => {
		const celsius = held.map(([, reading]) => reading);
		const weights = held.map(([weight]) => weight);
		const close = (energy: number | null, expected: number) =>
			expect(Math.abs((meanKineticCelsius(celsius, weights, energy) ?? NaN) - expected)).toBeLessThan(0.0001);
		close(null, customary);
		close(60, at60);
		close(100, at100);
		expect(arithmeticMean(logOf(held))).toBeCloseTo(mean, 4);
	});

	it.each(vectors.filter(([, held]) => logOf(held).length > 1))(
		'of an evenly spaced log of %s',
		(_, held, __, customary) => {
			const { mktCelsius } = assess(buildInput(buildTrace(logOf(held), 60), buildSpec()));
			expect(Math.abs(mktCelsius - customary)).toBeLessThan(0.0001);
		}
	);

	it('of a year in Nottingham', () => {
		// Source: R datasets::nottem, Nottingham Castle 1920, monthly means in °F (Anderson 1976).
		const fahrenheit = [40.6, 40.8, 44.4, 46.7, 54.1, 58.5, 57.7, 56.4, 54.3, 50.5, 42.9, 39.8];
		const celsius = fahrenheit.map(celsiusFromFahrenheit);
		expect(arithmeticMean(celsius)).toBeCloseTo(9.3843, 4);
		expect(
			meanKineticCelsius(
				celsius,
				celsius.map(() => 1)
			)
		).toBeCloseTo(10.2184, 4);
	});

	it('of a beaver, whose missing reading is stood for by the one before', () => {
		// Source: Reynolds (1994), R datasets::beaver1; mean 36.8622, mean kinetic temperature 36.8640 over readings.
		expect(arithmeticMean(beaverCelsius)).toBeCloseTo(36.8622, 4);
		expect(
			meanKineticCelsius(
				beaverCelsius,
				beaverCelsius.map(() => 1)
			)
		).toBeCloseTo(36.864, 4);
	});

	it('is worse over the worst window than over the journey', () => {
		// 48 h at 5 °C, then 18 h at 5 and 6 h at 14 in the last day: that day alone is over 8 °C.
		const log = [...Array.from({ length: 66 }, () => 5), ...Array.from({ length: 6 }, () => 14)];
		const mkt = { activationEnergyKilojoulesPerMole: null, windowHours: 24, limitCelsius: 8 };
		const { mktCelsius, worstWindowMktCelsius } = assess(buildInput(buildTrace(log, 60), buildSpec({ mkt })));
		expect(worstWindowMktCelsius).toBeCloseTo(8.2852, 4);
		expect(mktCelsius).toBeLessThan(8);
	});

	it('weighs unequal intervals by their length', () => {
		const times = [0, 18, 24].map((hours) => startMs + hours * hourMs);
		// The last reading stands for the usual interval; of two equally frequent steps that is the shorter, 6 h.
		const { mktCelsius } = assess(buildInput(traceAt(times, [5, 14, 14]), buildSpec()));
		expect(mktCelsius).toBeCloseTo(meanKineticCelsius([5, 14], [18, 12]) ?? NaN, 12);
	});
});

describe('a year of Seattle', () => {
	// Source: npm vega-datasets, data/seattle-weather-hourly-normals.csv (US government data): 8759 hourly normals in
	// °C; mean 11.12762, mean kinetic temperature 12.8874, 3.1 to 24.4 °C.
	const file = new URL(
		'../../node_modules/vega-datasets/data/seattle-weather-hourly-normals.csv',
		import.meta.url
	);
	const celsius = readFileSync(file, 'utf8')
		.trim()
		.split('\n')
		.slice(1)
		.map((row) => Number(row.split(',')[2]));
	const year = buildTrace(celsius, 60, Date.UTC(2010, 0, 1, 1));
	const assessment = assess(buildInput(year, buildSpec()));

	it('has its published mean, extremes and mean kinetic temperature', () => {
		expect(celsius).toHaveLength(8759);
		expect(arithmeticMean(celsius)).toBeCloseTo(11.12762, 5);
		expect(assessment.minCelsius).toBe(3.1);
		expect(assessment.maxCelsius).toBe(24.4);
		expect(assessment.mktCelsius).toBeCloseTo(12.8874, 4);
	});

	it('loses no reading', () => {
		expect(assessment.readings).toBe(8759);
		expect(assessment.series.times).toEqual(year.times);
		expect(assessment.series.usedHours).toHaveLength(8759);
		const { usedHours } = assessment.series;
		for (let i = 1; i < usedHours.length; i++)
			expect(usedHours[i]).toBeGreaterThan(usedHours[i - 1] as number);
	});
});
