import { msPerHour, msPerMinute } from '../../../domain/units';
import type { Chance } from '../chance';
import type { Incident, PlacedLeg, Ride } from './journey';

/** How fast a sensor follows the air it stands in, hours; longer inside the goods. */
const lagHours = { air: 0.4, 'between-cases': 1.6, 'in-product': 3 } as const;
const everyMinutes = 10;
const doorOpenHours = 0.35;
/** Warmer than the goods are kept by this much, while a door stands open. */
const doorCelsius = 6;

export interface Written {
	times: number[];
	/** One decimal, as the instrument writes. */
	celsius: number[];
}

interface Course {
	legs: readonly PlacedLeg[];
	arrivedMs: number;
	incidents: readonly Incident[];
}

/** The air around the load at a moment, before it reaches the sensor. */
function airAt({ legs, incidents }: Course, ms: number, exposure: number): number {
	const at = Math.max(
		0,
		legs.findLastIndex((leg) => leg.actualMs <= ms)
	);
	const leg = legs[at];
	if (!leg) return 0;
	const sinceHours = (ms - leg.actualMs) / msPerHour;
	const kept = leg.setPointCelsius + 0.3 * Math.sin(sinceHours * 5.2);
	const incident = incidents.find(
		(one) => one.leg === at && sinceHours >= one.afterHours && sinceHours < one.afterHours + one.hours
	);
	if (incident) return kept + (incident.airCelsius - kept) * exposure;
	return at > 0 && sinceHours < doorOpenHours ? kept + doorCelsius * exposure : kept;
}

function isSilent(ride: Ride, course: Course, ms: number): boolean {
	const { gap, stopsEarlyHours = 0 } = ride;
	if (ms > course.arrivedMs - stopsEarlyHours * msPerHour) return true;
	const start = gap && course.legs[gap.leg];
	if (!gap || !start) return false;
	const sinceHours = (ms - start.actualMs) / msPerHour;
	return sinceHours > gap.afterHours && sinceHours < gap.afterHours + gap.hours;
}

/** What a logger wrote from the first handover until it was read at the door. */
export function temperaturesOf(course: Course, ride: Ride, chance: Chance): Written {
	const written: Written = { times: [], celsius: [] };
	const startMs = Math.ceil((course.legs[0]?.actualMs ?? 0) / msPerMinute / 10) * 10 * msPerMinute;
	const follow = 1 - Math.exp(-everyMinutes / 60 / lagHours[ride.placement]);
	let celsius = (course.legs[0]?.setPointCelsius ?? 0) + 0.8 + ride.offsetCelsius;
	let drift = 0;
	for (let ms = startMs; ms <= course.arrivedMs; ms += everyMinutes * msPerMinute) {
		celsius += (airAt(course, ms, ride.exposure) + ride.offsetCelsius - celsius) * follow;
		drift = drift * 0.8 + (chance.next() - 0.5) * 0.12;
		if (isSilent(ride, course, ms)) continue;
		written.times.push(ms);
		written.celsius.push(Math.round((celsius + drift) * 10) / 10);
	}
	return written;
}
