import type { AssessmentView } from '../../schemas/docket';
import type { TemperatureUnit } from '../../domain/units';
import { lifeDays, range, temperature, temperatureSign, temperatureSpan } from '../../format';
import { day, dayTime, shortDay, time, zoneName } from '../../format-time';
import { words } from '../words';
import { legLetter } from './chart-model';
import type { Point } from './points';

export interface Readout {
	label: string;
	value: string;
	/** Second figure in a lighter ink. */
	aside?: string;
}

export interface ReadoutInput {
	/** Name of the trace. */
	label: string;
	point: Point;
	assessment: AssessmentView | null;
	zone: string;
	unit: TemperatureUnit;
	locale: string;
}

/** What stands in the line above the chart for the reading at the crosshair. */
export function readoutAt({ label, point, assessment, zone, unit, locale }: ReadoutInput): Readout[] {
	const { ms, celsius } = point;
	const accuracy = assessment ? ` ±${temperatureSpan(assessment.accuracyCelsius, unit, locale)}` : '';
	const figures =
		celsius === null
			? words.noReading
			: `${temperature(celsius, unit, locale)}${accuracy} ${temperatureSign(unit)}`;
	return [
		{ label: words.atTheLine, value: `${dayTime(ms, zone, locale)} ${zoneName(ms, zone)}` },
		{ label, value: figures },
		...legAt(assessment, ms),
		...lifeAt(point, locale)
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

function lifeAt({ leftHours, leftLowHours: low, leftHighHours: high }: Point, locale: string): Readout[] {
	if (leftHours === null) return [];
	const aside =
		low !== null && high !== null ? range(lifeDays(low, locale), lifeDays(high, locale)) : undefined;
	return [{ label: words.lifeLeftThen, value: `${lifeDays(leftHours, locale)} d`, aside }];
}

export function windowText(assessment: AssessmentView, zone: string, locale: string): string {
	return spanText(assessment.windowFromAt, assessment.windowToAt, zone, locale);
}

/** `30 Mar 08:10 to 3 Apr 07:10`; where it lies within one day the day stands once. */
export function spanText(from: number | string, to: number | string, zone: string, locale: string): string {
	const isOneDay = day(from, zone, locale) === day(to, zone, locale);
	const end = isOneDay ? time(to, zone) : `${shortDay(to, zone, locale)} ${time(to, zone)}`;
	return `${shortDay(from, zone, locale)} ${time(from, zone)} ${words.to} ${end}`;
}
