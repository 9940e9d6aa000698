import type { AssessmentView, SeriesView } from '../../schemas/docket';
import type { TemperatureUnit } from '../../domain/units';
import { lifeDays, range, temperature, temperatureSign, temperatureSpan } from '../../format';
import { day, dayTime, shortDay, time, zoneName } from '../../format-time';
import { words } from '../words';
import { legLetter } from './chart-model';

export interface Readout {
	label: string;
	value: string;
	/** Second figure in a lighter ink. */
	aside?: string;
}

export interface ReadoutInput {
	series: SeriesView;
	assessment: AssessmentView | null;
	index: number;
	zone: string;
	unit: TemperatureUnit;
	locale: string;
}

/** What stands in the line above the chart for the reading at the crosshair. */
export function readoutAt({ series, assessment, index, zone, unit, locale }: ReadoutInput): Readout[] {
	const ms = series.times[index] ?? 0;
	const celsius = series.celsius[index] ?? null;
	const accuracy = assessment ? ` ±${temperatureSpan(assessment.accuracyCelsius, unit, locale)}` : '';
	const figures =
		celsius === null
			? words.noReading
			: `${temperature(celsius, unit, locale)}${accuracy} ${temperatureSign(unit)}`;
	return [
		{ label: words.atTheLine, value: `${dayTime(ms, zone, locale)} ${zoneName(ms, zone)}` },
		{ label: series.label, value: figures },
		...legAt(assessment, ms),
		...lifeAt(series, index, locale)
	];
}

function legAt(assessment: AssessmentView | null, ms: number): Readout[] {
	if (!assessment || assessment.legs.length === 0) return [];
	const at = assessment.legs.findIndex((leg) => leg.fromMs <= ms && ms < leg.toMs);
	const last = assessment.legs.length - 1;
	const found = at < 0 && assessment.legs[last]?.toMs === ms ? last : at;
	const leg = assessment.legs[found];
	return [{ label: words.leg, value: leg ? `${legLetter(found)} ${leg.holder}` : words.outsideLegs }];
}

function lifeAt(series: SeriesView, index: number, locale: string): Readout[] {
	const value = series.remainingHours?.[index];
	if (typeof value !== 'number') return [];
	const low = series.remainingLowHours?.[index];
	const high = series.remainingHighHours?.[index];
	const aside =
		typeof low === 'number' && typeof high === 'number'
			? range(lifeDays(low, locale), lifeDays(high, locale))
			: undefined;
	return [{ label: words.lifeLeftThen, value: `${lifeDays(value, locale)} d`, aside }];
}

/** `30 Mar 08:10 to 3 Apr 07:10`; where it lies within one day the day stands once. */
export function windowText(assessment: AssessmentView, zone: string, locale: string): string {
	const { windowFromAt: from, windowToAt: to } = assessment;
	const isOneDay = day(from, zone, locale) === day(to, zone, locale);
	const end = isOneDay ? time(to, zone) : `${shortDay(to, zone, locale)} ${time(to, zone)}`;
	return `${shortDay(from, zone, locale)} ${time(from, zone)} ${words.to} ${end}`;
}
