import type { ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import type { Timing } from '../layout/timing';
import { utcOfLocal } from '../times/local-times';
import { settleClock } from './clock-run';
import type { Gathered } from './gathered';
import { instantsOf, isDescending, localTimes, type Instants } from './instants';
import type { AxisOrOpen, OpenTimes } from './open-times';
import { decideOrder, openDaysOf } from './order';
import { judgeDates } from './plausible-dates';
import { runningAxis } from './running-axis';
import { settleMonths } from './twofold-months';
import { distinctZones, whyZone, zonesFor, type Placed } from './zone-choice';

export type { OpenTimes, TimeAxis } from './open-times';

function openZone(places: readonly Placed<Instants>[], stated: Stated): OpenTimes {
	return {
		code: 'zone',
		why: whyZone(stated),
		options: places.map(({ zone, placed }) => ({
			answer: { zone: zone.zone },
			label: zone.zone,
			ms: placed.ms
		}))
	};
}

/** Rows that carry a whole calendar moment. */
function calendarAxis(written: Gathered, stated: Stated, context: ReadContext): AxisOrOpen {
	const likely = zonesFor(written, stated, context, NaN)[0]?.zone ?? context.siteZone;
	const months = settleMonths(written, stated, context, likely);
	if ('options' in months) return months;
	const { gathered, decisions } = months;
	const days = openDaysOf(gathered);
	const decided = decideOrder(days, stated, context);
	const first = localTimes(gathered, decided.possible[0] ?? null, 1)[0] ?? NaN;
	const zones = zonesFor(gathered, stated, context, first);
	if (decided.possible.length > 1) {
		const zone = zones[0]?.zone ?? context.siteZone;
		return {
			code: 'date-order',
			why: decided.why,
			options: decided.possible.map((order) => ({
				answer: { dateOrder: order },
				label: order,
				ms: instantsOf(gathered, order, zone).ms
			}))
		};
	}
	const places = distinctZones(
		zones,
		(zone) => instantsOf(gathered, decided.order, zone),
		context.uploadedMs
	);
	const [only] = places;
	if (only === undefined || places.length > 1) return openZone(places, stated);
	const isIso = days.length === 0;
	return {
		...only.placed,
		zone: only.zone,
		order: isIso ? 'ymd' : decided.order,
		orderBy: isIso ? (gathered.times.isSettled[0] === 2 ? 'month-name' : 'iso') : decided.by,
		isLocal: true,
		...(decisions.length > 0 && { decisions })
	};
}

/** Local times, in the order of the file, placed in a zone. */
function placeLocal(local: Float64Array, zone: string): Instants {
	const isBackwards = isDescending(local);
	const at = (i: number): number => (isBackwards ? local.length - 1 - i : i);
	const { utc, change, rows } = utcOfLocal(isBackwards ? local.slice().reverse() : local, zone);
	return { ms: isBackwards ? utc.slice().reverse() : utc, change, changeRows: rows.map(at) };
}

function serialAxis(gathered: Gathered, stated: Stated, context: ReadContext): AxisOrOpen {
	const local = gathered.times.ms.slice(0, gathered.count);
	const zones = zonesFor(gathered, stated, context, local[0] ?? NaN);
	const places = distinctZones(zones, (zone) => placeLocal(local, zone), context.uploadedMs);
	const [only] = places;
	if (only === undefined || places.length > 1) return openZone(places, stated);
	return { ...only.placed, zone: only.zone, order: null, orderBy: null, isLocal: true };
}

function rawAxis(gathered: Gathered, timing: Timing, stated: Stated, context: ReadContext): AxisOrOpen {
	switch (timing.kind) {
		case 'epoch':
			return {
				ms: gathered.times.ms.slice(0, gathered.count),
				change: null,
				changeRows: [],
				zone: { zone: 'UTC', by: 'file' },
				order: null,
				orderBy: null,
				isLocal: false
			};
		case 'serial-day':
			return serialAxis(gathered, stated, context);
		case 'moment':
		case 'date':
		case 'date-and-time':
		case 'parts':
			return calendarAxis(gathered, stated, context);
		default:
			return runningAxis(gathered, timing, stated, context);
	}
}

/** Several readings a day with nothing but its date cannot be placed. */
function hasOnlyDates(gathered: Gathered): boolean {
	const { times, count } = gathered;
	let repeats = 0;
	for (let i = 1; i < count; i++)
		if (times.a[i] === times.a[i - 1] && times.b[i] === times.b[i - 1] && times.c[i] === times.c[i - 1])
			repeats++;
	return count > 2 && repeats > count / 2;
}

/** Puts every gathered row on the UTC axis, or says what has to be asked first, or why it cannot be done. */
export function timeAxisOf(
	gathered: Gathered,
	timing: Timing,
	stated: Stated,
	context: ReadContext
): AxisOrOpen {
	if (timing.kind === 'date' && hasOnlyDates(gathered)) return { refusal: 'no-time', found: null };
	const raw = rawAxis(gathered, timing, stated, context);
	if (!('zone' in raw)) return raw;
	const judged = judgeDates(raw, timing, stated, context);
	return 'zone' in judged ? settleClock(judged, gathered, context) : judged;
}
