import { q10FromTwoLives } from './rate-q10';
import { rateCurve, type RateCurve, type RateSpec } from './rate-curve';
import type { RateModel, Spec } from './spec';

/** The slowest and the fastest the rate can be at each temperature, given how far the model's figure may be off. */
export interface RateBounds {
	readonly low: RateCurve;
	readonly high: RateCurve;
}

/**
 * Curves of a spec by its figure at either end of its ±. All meet at 1 at the reference temperature: above it the
 * larger figure is the faster, below it the smaller one, so each bound changes over there. Without a ± both are the
 * spec's own curve.
 */
export function rateBounds(spec: RateSpec & Pick<Spec, 'sensitivityPlusMinus'>): RateBounds {
	const plusMinus = spec.sensitivityPlusMinus ?? 0;
	if (plusMinus === 0) {
		const curve = rateCurve(spec);
		return { low: curve, high: curve };
	}
	const flat = rateCurve({ ...spec, model: modelOffBy(spec.model, -plusMinus) });
	const steep = rateCurve({ ...spec, model: modelOffBy(spec.model, plusMinus) });
	return {
		low: spliced(steep, flat, spec.referenceCelsius),
		high: spliced(flat, steep, spec.referenceCelsius)
	};
}

/** The model with its own figure moved; no further than to a rate that is the same at every temperature. */
function modelOffBy(model: RateModel, by: number): RateModel {
	switch (model.kind) {
		case 'constant-q10':
			return { kind: 'constant-q10', q10: Math.max(1, model.q10 + by) };
		case 'two-lives':
			return { kind: 'constant-q10', q10: Math.max(1, q10FromTwoLives(model.lower, model.upper) + by) };
		case 'banded-q10':
			return {
				kind: 'banded-q10',
				bands: model.bands.map((band) => ({ ...band, q10: Math.max(1, band.q10 + by) }))
			};
		case 'arrhenius':
			return {
				kind: 'arrhenius',
				activationEnergyKilojoulesPerMole: Math.max(0, model.activationEnergyKilojoulesPerMole + by)
			};
		case 'square-root':
			return { kind: 'square-root', minCelsius: model.minCelsius + by };
		case 'life-table':
			return model;
	}
}

/** One curve up to a temperature, another from there; both must have the same rate at it. */
function spliced(below: RateCurve, above: RateCurve, celsius: number): RateCurve {
	return {
		fromCelsius: below.fromCelsius,
		toCelsius: above.toCelsius,
		pieces: [
			...below.pieces
				.filter((piece) => piece.fromCelsius < celsius)
				.map((piece) => ({ ...piece, toCelsius: Math.min(piece.toCelsius, celsius) })),
			...above.pieces
				.filter((piece) => piece.toCelsius > celsius)
				.map((piece) => ({ ...piece, fromCelsius: Math.max(piece.fromCelsius, celsius) }))
		]
	};
}
