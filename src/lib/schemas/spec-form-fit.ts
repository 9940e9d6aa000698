import type { Fit } from '../domain/shelf-life/fit-models';
import type { LifePoint, RateModel } from '../domain/shelf-life/spec';
import type { TemperatureUnit } from '../domain/units';
import { modelValues, writer, type SpecFormValues } from './spec-form-values';

type Found = Extract<Fit, { model: RateModel }>;

/** Where a table is fitted to: the reference entered, if the table reaches it; else its coldest temperature. */
export function fitReference(points: readonly LifePoint[], entered: number | null): number {
	const degrees = points.map(({ celsius }) => celsius);
	const [coldest, warmest] = [Math.min(...degrees), Math.max(...degrees)];
	return entered !== null && entered >= coldest && entered <= warmest ? entered : coldest;
}

/** The editor's fields that a fitted model fills in: the model, its reference and full life, and where it is valid. */
export function fittedValues(
	fit: Found,
	points: readonly LifePoint[],
	referenceCelsius: number,
	unit: TemperatureUnit
): SpecFormValues {
	const write = writer(unit);
	const degrees = points.map(({ celsius }) => celsius);
	const { model } = fit;
	// The form's second life stands beside the reference's own: of two lives one is the reference.
	const anchor =
		model.kind === 'two-lives' ? model.lower : { celsius: referenceCelsius, lifeHours: fit.lifeHours };
	return {
		model: model.kind,
		reference: write.degrees(anchor.celsius),
		fullLife: write.days(anchor.lifeHours),
		validFrom: write.degrees(Math.min(...degrees)),
		validTo: write.degrees(Math.max(...degrees)),
		...modelValues({ model, referenceCelsius: anchor.celsius }, write)
	};
}
