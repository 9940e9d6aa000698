import type { Spec } from '../../domain/shelf-life/spec';
import type { AssessmentView } from '../../schemas/docket';
import { parseFigures, type StoredFigures } from '../assessments/stored-figures';
import type { AssessmentRow } from '../db/models/assessment-row';
import type { DocketRows } from './load-rows';
import { labelsOf } from './loggers-view';

function specOf(rows: DocketRows, specVersionId: string): { version: number; name: string; figures: Spec } {
	const version = rows.specs.find((spec) => spec.id === specVersionId);
	if (!version) throw new Error(`The spec version ${specVersionId} of an assessment is missing.`);
	const product = rows.products.find((candidate) => candidate.id === version.productId);
	const variety = rows.varieties.find((candidate) => candidate.id === version.varietyId);
	const name = [product?.name, variety?.name].filter(Boolean).join(', ');
	return { version: version.number, name, figures: JSON.parse(version.figures) as Spec };
}

/** Figures that assessments of older engines do not have. */
function olderMayLack(
	{ worstWindowMktCelsius, rangeParts, limitTimes, incidents }: Partial<StoredFigures>,
	{ mkt }: Spec
): Partial<AssessmentView> {
	return {
		...(worstWindowMktCelsius === undefined ? {} : { worstWindowMktCelsius }),
		mktWindowHours: mkt.windowHours,
		mktLimitCelsius: mkt.limitCelsius,
		...(rangeParts ? { rangeParts: [...rangeParts] } : {}),
		...(limitTimes ? { limitTimes: [...limitTimes] } : {}),
		...(incidents ? { incidents: [...incidents] } : {})
	};
}

const iso = (ms: number) => new Date(ms).toISOString();

/** All current assessments, the governing one of each line first. */
export function assessmentViews(rows: DocketRows): AssessmentView[] {
	const labels = labelsOf(rows);
	return rows.assessments
		.map((row) => assessmentView(rows, row, labels))
		.sort(
			(a, b) => Number(b.isGoverning) - Number(a.isGoverning) || a.remainingHours.low - b.remainingHours.low
		);
}

function assessmentView(rows: DocketRows, row: AssessmentRow, labels: Map<string, string>): AssessmentView {
	const figures = parseFigures(row.figures);
	const spec = specOf(rows, row.specVersionId);
	const line = rows.lines.find((candidate) => candidate.id === row.lineId);
	return {
		id: row.id,
		lineId: row.lineId,
		traceId: row.traceId,
		logger: labels.get(row.traceId) ?? '?',
		isGoverning: row.isGoverning,
		engineVersion: row.engineVersion,
		specId: row.specVersionId,
		specName: spec.name,
		specVersion: spec.version,
		windowFromAt: iso(figures.windowFromMs),
		windowToAt: iso(figures.windowToMs),
		openingHours: figures.openingHours,
		openingBasis: line?.openingBasis ?? '',
		openingKind: line?.openingKind ?? 'undeclared',
		usedHours: figures.usedHours,
		remainingHours: figures.remainingHours,
		neededHours: figures.neededHours,
		fullLifeHours: figures.fullLifeHours,
		accuracyCelsius: figures.inputs.accuracyCelsius,
		upperCelsius: spec.figures.upper?.celsius ?? null,
		lowerCelsius: spec.figures.lower?.celsius ?? null,
		freezingCelsius: spec.figures.freezingCelsius,
		ceilingCelsius: spec.figures.ceilingCelsius,
		meanCelsius: figures.meanCelsius,
		mktCelsius: figures.mktCelsius,
		minCelsius: figures.minCelsius,
		maxCelsius: figures.maxCelsius,
		gaps: figures.gaps.map((gap) => ({
			fromAt: iso(gap.fromMs),
			toAt: iso(gap.toMs),
			usedHours: gap.usedHours.value
		})),
		unobservedHours: figures.unobservedHours,
		unobservedUsedHours: figures.unobservedUsedHours.value,
		belowModelHours: figures.belowModelHours,
		aboveModelHours: figures.aboveModelHours,
		chilledHours: figures.chilledHours,
		trimmedHours: figures.trimmedHours,
		excursions: [...figures.excursions],
		stops: [...figures.stops],
		legs: [...figures.legs],
		...olderMayLack(figures, spec.figures)
	};
}
