import { exp } from '../math/exp';
import { ln } from '../math/ln';
import { fitArrhenius, fitBandedQ10, fitConstantQ10, type FitFault, type Fitted } from './fit-lines';
import { fitSquareRoot } from './fit-square-root';
import { rateAt } from './rate-curve';
import type { LifePoint, RateModel, RateModelKind } from './spec';

/** How far a fitted model is from one published life. */
export interface Residual extends LifePoint {
	readonly fittedHours: number;
	/** ln(published / fitted): 0.1 is about ten per cent. */
	readonly lnDifference: number;
}

/** The best model of one kind for the points, or why there is none. */
export type Fit =
	| {
			readonly kind: RateModelKind;
			readonly model: RateModel;
			/** Its life at the reference temperature. */
			readonly lifeHours: number;
			readonly residuals: readonly Residual[];
			/** Root mean square of the residuals in ln life. */
			readonly lnScatter: number;
			/** Points more than figures fitted; at 0 the model meets every point because it must. */
			readonly freedom: number;
	  }
	| { readonly kind: RateModelKind; readonly fault: FitFault };

/**
 * Fits every kind of model to a table of life against temperature, by least squares in the logarithm of life, so that
 * a life half as long weighs as much as one twice as long. Points may come in any order and a temperature may come
 * several times. The reference must lie between the coldest and the warmest.
 */
export function fitModels(points: readonly LifePoint[], referenceCelsius: number): readonly Fit[] {
	const sorted = [...points].sort((a, b) => a.celsius - b.celsius);
	const means = geometricMeans(sorted);
	const fits: Record<RateModelKind, Fitted | FitFault> = {
		'constant-q10': fitConstantQ10(sorted),
		'two-lives': throughEnds(means),
		'banded-q10': fitBandedQ10(sorted),
		arrhenius: fitArrhenius(sorted),
		'life-table': throughAll(means),
		'square-root': fitSquareRoot(sorted)
	};
	const kinds = Object.keys(fits) as RateModelKind[];
	return kinds.map((kind) => {
		const fitted = fits[kind];
		return typeof fitted === 'string'
			? { kind, fault: fitted }
			: judged(kind, fitted, sorted, referenceCelsius);
	});
}

/** A fitted model at the reference temperature, beside every point. */
function judged(
	kind: RateModelKind,
	{ model, anchor, figures }: Fitted,
	points: readonly LifePoint[],
	referenceCelsius: number
): Fit {
	const rate = {
		model,
		referenceCelsius,
		validFromCelsius: -Infinity,
		validToCelsius: Infinity,
		chillingCelsius: null
	};
	const lifeHours = anchor.lifeHours * rateAt(rate, anchor.celsius);
	const residuals = points.map((point) => {
		const fittedHours = lifeHours / rateAt(rate, point.celsius);
		return { ...point, fittedHours, lnDifference: ln(point.lifeHours / fittedHours) };
	});
	const squares = residuals.reduce((sum, { lnDifference }) => sum + lnDifference * lnDifference, 0);
	return {
		kind,
		model,
		lifeHours,
		residuals,
		lnScatter: Math.sqrt(squares / points.length),
		freedom: points.length - figures
	};
}

/** One point a temperature: the geometric mean of its lives. */
function geometricMeans(sorted: readonly LifePoint[]): LifePoint[] {
	const logs = new Map<number, number[]>();
	for (const { celsius, lifeHours } of sorted)
		logs.set(celsius, [...(logs.get(celsius) ?? []), ln(lifeHours)]);
	return [...logs].map(([celsius, all]) => {
		const lone = sorted.find((point) => point.celsius === celsius);
		// A lone life keeps its digits.
		if (all.length === 1 && lone) return lone;
		return { celsius, lifeHours: exp(all.reduce((sum, one) => sum + one, 0) / all.length) };
	});
}

function throughEnds(means: readonly LifePoint[]): Fitted | FitFault {
	const lower = means[0];
	const upper = means[means.length - 1];
	if (!lower || !upper || lower === upper) return 'points-too-few';
	if (upper.lifeHours > lower.lifeHours) return 'life-longer-when-warmer';
	return { model: { kind: 'two-lives', lower, upper }, anchor: lower, figures: 2 };
}

function throughAll(points: readonly LifePoint[]): Fitted | FitFault {
	const first = points[0];
	if (!first || points.length < 2) return 'points-too-few';
	const isRising = points.some((point, i) => point.lifeHours > (points[i - 1]?.lifeHours ?? Infinity));
	if (isRising) return 'life-longer-when-warmer';
	return { model: { kind: 'life-table', points }, anchor: first, figures: points.length };
}
