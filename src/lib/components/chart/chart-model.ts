import uPlot from 'uplot';
import type { AssessmentView, SeriesView } from '../../schemas/docket';
import type { TemperatureUnit } from '../../domain/units';
import { inUnit } from '../../format';
import type { Window } from './cursor';
import { lineStyle, primaryStyle, type LineStyle } from './line-style';

export interface LimitLine {
	kind: 'upper' | 'lower' | 'freezing' | 'ceiling';
	/** In the reader's unit. */
	value: number;
}

export interface ChartExcursion {
	name: string;
	kind: 'too-warm' | 'too-cold';
	severity: 'minor' | 'major' | 'critical';
	fromMs: number;
	toMs: number;
	/** In the reader's unit. */
	limit: number;
	costHours: number;
}

/** What the two panels draw, in the reader's unit and in days; times in ms. */
export interface ChartModel {
	/** Times, then one column a trace, the governing one first; null breaks a line, undefined is no reading of that trace. */
	traces: uPlot.AlignedData;
	labels: string[];
	styles: LineStyle[];
	/** Times, life left, low, high. */
	life: uPlot.AlignedData | null;
	limits: LimitLine[];
	excursions: ChartExcursion[];
	legs: { letter: string; holder: string; fromMs: number; toMs: number }[];
	gaps: Window[];
	window: Window | null;
	temperatures: { least: number; most: number };
	fullDays: number;
	neededDays: number | null;
	openingHours: number | null;
}

const dayHours = 24;

/** A series with its place among the loggers of the load, by which its line is drawn; its place in the list otherwise. */
export interface DrawnSeries extends SeriesView {
	styleAt?: number;
}

function governingFirst(series: readonly DrawnSeries[]): DrawnSeries[] {
	return [...series].sort((a, b) => Number(b.isGoverning) - Number(a.isGoverning));
}

/** Letters as on the papers: A to Z, then A2. */
export function legLetter(at: number): string {
	const letter = String.fromCharCode(65 + (at % 26));
	return at < 26 ? letter : `${letter}${Math.floor(at / 26) + 1}`;
}

export function buildModel(
	series: readonly DrawnSeries[],
	assessment: AssessmentView | null,
	unit: TemperatureUnit
): ChartModel {
	const ordered = governingFirst(series);
	const tables = ordered.map((one): uPlot.AlignedData => [
		one.times,
		one.celsius.map((value) => (value === null ? null : inUnit(value, unit)))
	]);
	const traces: uPlot.AlignedData = tables.length > 1 ? uPlot.join(tables) : (tables[0] ?? [[], []]);
	const limits = limitLines(assessment, unit);
	return {
		traces,
		labels: ordered.map((one) => one.label),
		styles: ordered.map((one, at) => (at === 0 ? primaryStyle : lineStyle(one.styleAt ?? at))),
		life: lifeTable(ordered[0]),
		limits,
		excursions: excursionsOf(assessment, unit),
		legs: (assessment?.legs ?? []).map((leg, at) => ({
			letter: legLetter(at),
			holder: leg.holder,
			fromMs: leg.fromMs,
			toMs: leg.toMs
		})),
		gaps: (assessment?.gaps ?? []).map((gap) => ({
			fromMs: Date.parse(gap.fromAt),
			toMs: Date.parse(gap.toAt)
		})),
		window: assessment && {
			fromMs: Date.parse(assessment.windowFromAt),
			toMs: Date.parse(assessment.windowToAt)
		},
		temperatures: bounds(traces, limits),
		fullDays: (assessment?.fullLifeHours ?? 0) / dayHours,
		neededDays: assessment ? assessment.neededHours / dayHours : null,
		openingHours: assessment?.openingHours.value ?? null
	};
}

function lifeTable(series: SeriesView | undefined): uPlot.AlignedData | null {
	if (!series?.remainingHours || !series.remainingLowHours || !series.remainingHighHours) return null;
	const days = (hours: readonly (number | null)[]) =>
		hours.map((value) => (value === null ? null : value / dayHours));
	return [
		series.times,
		days(series.remainingHours),
		days(series.remainingLowHours),
		days(series.remainingHighHours)
	];
}

function limitLines(assessment: AssessmentView | null, unit: TemperatureUnit): LimitLine[] {
	if (!assessment) return [];
	const found = [
		{ kind: 'ceiling', celsius: assessment.ceilingCelsius },
		{ kind: 'upper', celsius: assessment.upperCelsius },
		{ kind: 'lower', celsius: assessment.lowerCelsius },
		{ kind: 'freezing', celsius: assessment.freezingCelsius }
	] as const;
	return found.flatMap(({ kind, celsius }) =>
		celsius === null ? [] : [{ kind, value: inUnit(celsius, unit) }]
	);
}

function excursionsOf(assessment: AssessmentView | null, unit: TemperatureUnit): ChartExcursion[] {
	return (assessment?.excursions ?? []).map((excursion, at) => ({
		name: `E${at + 1}`,
		kind: excursion.kind,
		severity: excursion.severity,
		fromMs: excursion.fromMs,
		toMs: excursion.toMs,
		limit: inUnit(excursion.limitCelsius, unit),
		costHours: excursion.costHours
	}));
}

/** From the lowest to the highest of readings and limits; a ceiling far above the trace does not flatten it. */
function bounds(traces: uPlot.AlignedData, limits: readonly LimitLine[]): { least: number; most: number } {
	let least = Infinity;
	let most = -Infinity;
	for (const column of traces.slice(1)) {
		for (const value of column) {
			if (value === null || value === undefined) continue;
			if (value < least) least = value;
			if (value > most) most = value;
		}
	}
	for (const { kind, value } of limits) {
		if (kind === 'ceiling' && value > most) continue;
		least = Math.min(least, value);
		most = Math.max(most, value);
	}
	return least > most ? { least: 0, most: 10 } : { least, most };
}
