import { fahrenheitFromCelsius } from '../../../domain/units';
import { arrivalInput, type ArrivalInput } from '../../../schemas/arrival';
import { sites } from '../cast/sites';
import { chanceOf } from '../chance';
import type { Staged } from './staged';

const drivers = [
	'J. Pell',
	'A. Rusk',
	'K. Moravec',
	'S. Dunne',
	'T. Okafor',
	'L. Brandt',
	'M. Quist'
] as const;
const places = ['nose', 'middle', 'tail'] as const;

const tenth = (value: number) => Math.round(value * 10) / 10;

/** What was seen at the door, in the site's own unit. */
export function arrivalOf(staged: Staged, lineIds: readonly string[]): ArrivalInput {
	const { plan, lane, goods, arrivedMs } = staged;
	const chance = chanceOf(`${plan.key} door`);
	const unit = sites[lane.site].temperatureUnit;
	const degrees = (celsius: number) => tenth(unit === 'celsius' ? celsius : fahrenheitFromCelsius(celsius));
	const setPoint = lane.legs.at(-1)?.setPointCelsius ?? 0;
	const pulp = plan.pulpCelsius ?? [setPoint + chance.whole(0, 6) / 10, setPoint + chance.whole(2, 9) / 10];
	return arrivalInput.parse({
		arrived: new Date(arrivedMs).toISOString(),
		seal: plan.seal ?? 'as-on-papers',
		sealFound: plan.seal === 'other' ? '0041877' : undefined,
		setPointDegrees: degrees(setPoint),
		returnAirDegrees: degrees(setPoint + chance.whole(3, 11) / 10),
		unit,
		counts: lineIds.map((lineId, at) => ({
			lineId,
			received: (goods[at]?.cases ?? 0) - (at === 0 ? (plan.short ?? 0) : 0)
		})),
		pulp: pulp.map((celsius, at) => ({
			lineId: lineIds[Math.min(at, lineIds.length - 1)],
			position: places[at % places.length],
			degrees: degrees(celsius),
			unit,
			instrument: 'Probe 4',
			// Frozen goods in °F look like chilled ones in °C.
			isMeant: true
		})),
		conditionNote: plan.doorNote,
		reservation: plan.seal === 'broken' || plan.short ? 'Taken under reservation: see remarks.' : undefined,
		driverName: chance.pick(drivers)
	});
}
