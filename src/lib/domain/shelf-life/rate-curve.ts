import { steadyPiece, type RatePiece } from './piece';
import { arrheniusPiece } from './rate-arrhenius';
import { lifeTablePieces } from './rate-life-table';
import { bandedQ10Pieces, constantQ10Pieces, twoLivesPieces } from './rate-q10';
import { squareRootPieces } from './rate-square-root';
import type { RateModel, Spec } from './spec';

/** The part of a spec that says how fast life runs. */
export type RateSpec = Pick<
	Spec,
	'referenceCelsius' | 'model' | 'validFromCelsius' | 'validToCelsius' | 'chillingCelsius'
>;

/** A spec's rate over all temperatures, in pieces from the coldest to the warmest that leave no hole. */
export interface RateCurve {
	/** The model speaks for temperatures from here … */
	readonly fromCelsius: number;
	/** … to here; outside the rate is held at the end. */
	readonly toCelsius: number;
	readonly pieces: readonly RatePiece[];
}

/** Builds the curve of a spec that `validateSpec` finds no fault with. */
export function rateCurve(spec: RateSpec): RateCurve {
	const model = modelPieces(spec.model, spec.referenceCelsius);
	const fromCelsius = Math.max(spec.validFromCelsius, (model[0] as RatePiece).fromCelsius);
	const toCelsius = Math.min(spec.validToCelsius, (model[model.length - 1] as RatePiece).toCelsius);
	// Cold earns no credit: below the chilling threshold the rate is the threshold's.
	const heldBelow = Math.max(fromCelsius, spec.chillingCelsius ?? -Infinity);
	const inside = model
		.filter((piece) => piece.toCelsius > heldBelow && piece.fromCelsius < toCelsius)
		.map((piece) => ({
			...piece,
			fromCelsius: Math.max(piece.fromCelsius, heldBelow),
			toCelsius: Math.min(piece.toCelsius, toCelsius)
		}));
	const pieces = [
		...(heldBelow > -Infinity ? [steadyPiece(-Infinity, heldBelow, rateIn(model, heldBelow))] : []),
		...inside,
		...(toCelsius < Infinity ? [steadyPiece(toCelsius, Infinity, rateIn(model, toCelsius))] : [])
	];
	return { fromCelsius, toCelsius, pieces };
}

function modelPieces(model: RateModel, referenceCelsius: number): RatePiece[] {
	switch (model.kind) {
		case 'constant-q10':
			return constantQ10Pieces(model.q10, referenceCelsius);
		case 'two-lives':
			return twoLivesPieces(model.lower, model.upper, referenceCelsius);
		case 'banded-q10':
			return bandedQ10Pieces(model.bands, referenceCelsius);
		case 'arrhenius':
			return [arrheniusPiece(model.activationEnergyKilojoulesPerMole, referenceCelsius)];
		case 'life-table':
			return lifeTablePieces(model.points, referenceCelsius);
		case 'square-root':
			return squareRootPieces(model.minCelsius, referenceCelsius);
	}
}

/** Index of the piece that holds the temperature; a temperature between two belongs to the colder one. */
function pieceAt(pieces: readonly RatePiece[], celsius: number): number {
	let at = 0;
	while (at + 1 < pieces.length && celsius > (pieces[at] as RatePiece).toCelsius) at++;
	return at;
}

function rateIn(pieces: readonly RatePiece[], celsius: number): number {
	return (pieces[pieceAt(pieces, celsius)] as RatePiece).rateAt(celsius);
}

/** Rate at a temperature on a curve. */
export function curveRateAt(curve: RateCurve, celsius: number): number {
	return rateIn(curve.pieces, celsius);
}

/** How fast life runs at a temperature, relative to 1 at the spec's reference temperature. */
export function rateAt(spec: RateSpec, celsius: number): number {
	return curveRateAt(rateCurve(spec), celsius);
}

/** Mean rate while the temperature runs in a straight line; the rates at both ends are known already. Exact. */
export function meanRate(curve: RateCurve, a: number, b: number, rateA: number, rateB: number): number {
	if (a === b) return rateA;
	const isRising = a < b;
	const low = isRising ? a : b;
	const high = isRising ? b : a;
	const { pieces } = curve;
	let at = pieceAt(pieces, low);
	let piece = pieces[at] as RatePiece;
	if (high <= piece.toCelsius)
		return piece.meanRate(low, high, isRising ? rateA : rateB, isRising ? rateB : rateA);
	let from = low;
	let fromRate = isRising ? rateA : rateB;
	let area = 0;
	while (from < high) {
		const to = Math.min(high, piece.toCelsius);
		const toRate = to === high ? (isRising ? rateB : rateA) : piece.rateAt(to);
		if (to > from) area += (to - from) * piece.meanRate(from, to, fromRate, toRate);
		from = to;
		fromRate = toRate;
		piece = pieces[++at] ?? piece;
	}
	return area / (high - low);
}
