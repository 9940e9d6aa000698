import { celsiusFromFahrenheit, msPerMinute } from '../../domain/units';
import type { ArrivalInput } from '../../schemas/arrival';
import type { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { refuseFaults } from '../shipments/invalid-fields';
import { siteTime } from '../shipments/site-time';

/** A phone's clock may be ahead of ours by this much; a later arrival has not happened yet. */
const clockTolerance = 10 * msPerMinute;

function sealOf(seen: ArrivalInput, shipment: Shipment) {
	if (seen.seal === 'none') return { sealFound: null, isSealIntact: shipment.seal === null ? null : false };
	return { sealFound: seen.sealFound ?? shipment.seal, isSealIntact: seen.seal !== 'broken' };
}

/** What was seen, in the form the rows keep it, checked against the docket. @throws InvalidFields */
export async function arrivalFacts(shipment: Shipment, zone: string, now: Date, seen: ArrivalInput) {
	const issues: Record<string, string> = {};
	const arrived = siteTime(seen.arrived ?? '', zone);
	if (!arrived.ok) issues.arrived = arrived.fault;
	else if (arrived.at.getTime() > now.getTime() + clockTolerance)
		issues.arrived = 'That time is still to come.';

	const lines = await ShipmentLine.findAll({ where: { shipmentId: shipment.id } });
	const isOwn = (id: string | null) => id === null || lines.some((line) => line.id === id);
	for (const row of seen.counts)
		if (!isOwn(row.lineId)) issues[`counts.${row.at}.received`] = 'There is no such line on this docket.';
	for (const row of seen.pulp)
		if (!isOwn(row.lineId)) issues[`pulp.${row.at}.lineId`] = 'There is no such line on this docket.';
	refuseFaults(issues);

	const celsius = (degrees: number | null) =>
		degrees !== null && seen.unit === 'fahrenheit' ? celsiusFromFahrenheit(degrees) : degrees;
	return {
		arrivedAt: arrived.ok ? arrived.at : now,
		...sealOf(seen, shipment),
		setPointCelsius: celsius(seen.setPointDegrees),
		returnAirCelsius: celsius(seen.returnAirDegrees),
		conditionNote: seen.conditionNote ?? '',
		reservation: seen.reservation ?? '',
		driverName: seen.driverName
	};
}
