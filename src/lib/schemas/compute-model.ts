import { z } from 'zod';
import type { LifePoint, RateModel } from '../domain/shelf-life/spec';
import type { SpecFaultCode } from '../domain/shelf-life/spec-fault';

/** A model as other programs write it, and the full life at its reference. */
export interface ComputeModel {
	readonly model: RateModel;
	readonly referenceCelsius: number;
	readonly lifeHours: number;
}

const number = z.number({
	error: ({ input }) => (input === undefined ? 'It is missing. Send a number.' : 'Send a number.')
});
const celsius = number.gt(-273.15, 'No temperature is that cold. Send °C, above absolute zero.');
const hours = number.positive('Send more than 0 hours.');
const q10 = number.min(1, 'A Q10 below 1 would let warm goods last longer. Send 1 or more.');
const pair = 'Send a pair: [temperature in °C, figure].';
const point = z.tuple([celsius, hours], { error: pair });
const reference = { referenceCelsius: celsius, lifeHours: hours };
const longestList = 100;

/** Each kind with its own figures; what it does not know is refused, lest a misspelt key pass for a default. */
export const computeModel = z.discriminatedUnion(
	'kind',
	[
		z.strictObject({ kind: z.literal('q10'), q10, ...reference }),
		z.strictObject({
			kind: z.literal('twoLives'),
			points: z.tuple([point, point], { error: 'Send two pairs: [[celsius, hours], [celsius, hours]].' })
		}),
		z.strictObject({
			kind: z.literal('arrhenius'),
			activationEnergyKjPerMol: number.positive('Send more than 0 kJ/mol.'),
			...reference
		}),
		z.strictObject({ kind: z.literal('squareRoot'), minCelsius: celsius, ...reference }),
		z.strictObject({
			kind: z.literal('lifeTable'),
			points: z
				.array(point, { error: 'Send a list of pairs: [[celsius, hours], …].' })
				.min(2, 'One point makes no table. Send two or more.')
				.max(longestList, `Send ${longestList} points at most.`)
		}),
		z.strictObject({
			kind: z.literal('bandedQ10'),
			...reference,
			bands: z
				.array(z.tuple([celsius, q10], { error: pair }), {
					error: 'Send a list of pairs: [[fromCelsius, q10], …].'
				})
				.min(1, 'Send one band or more.')
				.max(longestList, `Send ${longestList} bands at most.`)
		})
	],
	{
		error: 'Send an object whose kind is one of q10, twoLives, arrhenius, squareRoot, lifeTable or bandedQ10.'
	}
);
type SentModel = z.output<typeof computeModel>;

/** Figures that are fine alone and nonsense together. */
export interface ModelFault {
	readonly field: string;
	readonly code: Extract<
		SpecFaultCode,
		'points-unsorted' | 'life-longer-when-warmer' | 'reference-outside-model' | 'reference-not-above-minimum'
	>;
}

/** The engine's model of the figures sent; null after refusing what does not make sense together. */
export function modelOf(sent: SentModel, refuse: (fault: ModelFault) => void): ComputeModel | null {
	switch (sent.kind) {
		case 'q10':
			return { ...sent, model: { kind: 'constant-q10', q10: sent.q10 } };
		case 'arrhenius':
			return {
				...sent,
				model: {
					kind: 'arrhenius',
					activationEnergyKilojoulesPerMole: sent.activationEnergyKjPerMol
				}
			};
		case 'squareRoot':
			if (sent.referenceCelsius > sent.minCelsius)
				return { ...sent, model: { kind: 'square-root', minCelsius: sent.minCelsius } };
			refuse({ field: 'model.minCelsius', code: 'reference-not-above-minimum' });
			return null;
		case 'twoLives':
			return ofPoints(sent.points, refuse, ([lower, upper]) =>
				lower && upper ? { kind: 'two-lives', lower, upper } : null
			);
		case 'lifeTable':
			return ofPoints(sent.points, refuse, (points) => ({ kind: 'life-table', points }));
		case 'bandedQ10':
			return ofBands(sent, refuse);
	}
}

/** Points in any order; the coldest is the reference, and its life the full life. */
function ofPoints(
	sent: readonly (readonly [number, number])[],
	refuse: (fault: ModelFault) => void,
	build: (points: readonly LifePoint[]) => RateModel | null
): ComputeModel | null {
	const sorted = ascending(sent);
	for (let i = 1; i < sorted.length; i++) {
		const [before, here] = [sorted[i - 1], sorted[i]];
		if (!before || !here) return null;
		const field = `model.points.${here.at}`;
		if (here.pair[0] === before.pair[0]) {
			refuse({ field, code: 'points-unsorted' });
			return null;
		}
		if (here.pair[1] > before.pair[1]) {
			refuse({ field, code: 'life-longer-when-warmer' });
			return null;
		}
	}
	const points = sorted.map(({ pair: [at, lifeHours] }) => ({ celsius: at, lifeHours }));
	const model = build(points);
	const coldest = points[0];
	return model && coldest ? { model, referenceCelsius: coldest.celsius, lifeHours: coldest.lifeHours } : null;
}

/** Each band reaches to the next one's foot, the last one upwards without end. */
function ofBands(
	sent: SentModel & { kind: 'bandedQ10' },
	refuse: (fault: ModelFault) => void
): ComputeModel | null {
	const sorted = ascending(sent.bands);
	const twice = sorted.find(({ pair: [from] }, i) => from === sorted[i - 1]?.pair[0]);
	if (twice) {
		refuse({ field: `model.bands.${twice.at}`, code: 'points-unsorted' });
		return null;
	}
	if (sent.referenceCelsius < (sorted[0]?.pair[0] ?? Infinity)) {
		refuse({ field: 'model.referenceCelsius', code: 'reference-outside-model' });
		return null;
	}
	const bands = sorted.map(({ pair: [fromCelsius, factor] }, i) => ({
		fromCelsius,
		toCelsius: sorted[i + 1]?.pair[0] ?? Infinity,
		q10: factor
	}));
	const { referenceCelsius, lifeHours } = sent;
	return { model: { kind: 'banded-q10', bands }, referenceCelsius, lifeHours };
}

function ascending(pairs: readonly (readonly [number, number])[]) {
	return pairs.map((one, at) => ({ pair: one, at })).sort((a, b) => a.pair[0] - b.pair[0]);
}
