import { DateTime } from 'luxon';
import { disagreementOf } from '../../domain/receiving/disagreement';
import type { Disagreement, Evidence, PrintedDate, UnitAtDoor } from '../../domain/receiving/evidence';
import { celsiusFromFahrenheit } from '../../domain/units';
import type { Product } from '../db/models/product';
import type { PulpReading } from '../db/models/pulp-reading';
import type { ShipmentLine } from '../db/models/shipment-line';
import { shifted } from './assessment-inputs';
import { governingOf, openingOf, tracesOfLine, type LineAssessment } from './assess-line';
import { gradesOf } from './finding-grades';
import type { DocketEvidence, LoadedTrace } from './load-evidence';
import type { SignedSpec } from '../specs/find-spec-in-force';

/** Everything the recommendation for one line rests on. */
export function lineEvidence(
	line: ShipmentLine,
	spec: SignedSpec,
	assessed: readonly LineAssessment[],
	docket: DocketEvidence,
	now: Date,
	lastBestBeforeOn: string | null
): Evidence {
	const governing = governingOf(assessed);
	const traces = tracesOfLine(line, docket);
	const product = docket.products.find(({ id }) => id === line.productId) ?? null;
	const { arrival, shipment } = docket;
	const arrivedAt = arrival?.arrivedAt ?? shipment.arrivedAt;
	return {
		spec: spec.figures,
		assessment: governing?.assessment ?? null,
		accuracyCelsius: governing?.trace.accuracyCelsius ?? 0,
		openingKind: openingOf(line).kind,
		neededHours: line.neededHours ?? spec.figures.neededHours,
		seal: sealOf(docket),
		pulp: docket.pulp.filter(({ lineId }) => lineId === null || lineId === line.id).map(domainPulp),
		cases: line.casesReceived === null ? null : { advised: line.casesAdvised, received: line.casesReceived },
		calibrations: traces.map(({ trip, calibrationDueOn }) => ({
			serial: trip.serial,
			dueOn: calibrationDueOn
		})),
		arrivedOn: dayAt(arrivedAt ?? now, docket.siteZone),
		disagreement: worstDisagreement(traces),
		journeyEndMs: arrivedAt ? journeyEndMs(docket, arrivedAt) : null,
		journeyStartMs: docket.handovers[0]?.actualAt?.getTime() ?? null,
		plannedJourneyMs: plannedJourneyMs(docket),
		startDelayMinutes: governing?.trace.startDelayMinutes ?? 0,
		isLoggerRequired: docket.lane?.isLoggerRequired || product?.isLoggerRequired || false,
		unit: unitOf(line, docket),
		printedDate: printedDateOf(line, product, lastBestBeforeOn),
		grades: gradesOf(product, docket.lane)
	};
}

function sealOf({ arrival, shipment }: DocketEvidence): Evidence['seal'] {
	if (!arrival || arrival.isSealIntact === null) return null;
	return { text: arrival.sealFound ?? shipment.seal ?? '', isIntact: arrival.isSealIntact };
}

function plannedJourneyMs({ handovers }: DocketEvidence): number | null {
	const planned = handovers.map(({ plannedAt }) => plannedAt);
	const [first, last] = [planned[0], planned[planned.length - 1]];
	return handovers.length > 1 && first && last ? last.getTime() - first.getTime() : null;
}

/** What the unit of the line's compartment showed, else that of the whole load, against the last leg's set-point. */
function unitOf(
	line: ShipmentLine,
	{ arrival, compartments, handovers, shipment }: DocketEvidence
): UnitAtDoor {
	const id = line.compartmentId ?? shipment.compartmentId;
	const chamber = compartments.find((compartment) => compartment.id === id);
	const lastLeg = handovers[handovers.length - 2];
	return {
		setPointCelsius: chamber?.setPointCelsius ?? arrival?.setPointCelsius ?? null,
		agreedCelsius: lastLeg?.setPointCelsius ?? null,
		returnAirCelsius: chamber?.returnAirCelsius ?? arrival?.returnAirCelsius ?? null
	};
}

function printedDateOf(
	{ bestBeforeOn }: ShipmentLine,
	product: Product | null,
	lastBestBeforeOn: string | null
): PrintedDate {
	return { bestBeforeOn, neededDays: product?.minimumDatedDays ?? null, lastBestBeforeOn };
}

function domainPulp({ degrees, unit, position }: PulpReading) {
	return { celsius: unit === 'fahrenheit' ? celsiusFromFahrenheit(degrees) : degrees, position };
}

function dayAt(at: Date, zone: string): string {
	return DateTime.fromJSDate(at, { zone }).toFormat('yyyy-MM-dd');
}

/** Custody ends with the last handover that took place, else when the load was logged at the door. */
function journeyEndMs({ handovers }: DocketEvidence, arrivedAt: Date): number {
	return handovers[handovers.length - 1]?.actualAt?.getTime() ?? arrivedAt.getTime();
}

/** The pair of the line's loggers that is furthest beyond what their accuracies allow. */
function worstDisagreement(traces: readonly LoadedTrace[]): Disagreement | null {
	const loggers = traces.map(({ trace, clockShiftMs, trip, accuracyCelsius }) => ({
		serial: trip.serial,
		trace: shifted(trace, clockShiftMs),
		accuracyCelsius
	}));
	const beyond = (found: Disagreement) => found.differenceCelsius - found.allowedCelsius;
	let worst: Disagreement | null = null;
	for (const [i, first] of loggers.entries()) {
		for (const second of loggers.slice(i + 1)) {
			const found = disagreementOf(first, second);
			if (found && (worst === null || beyond(found) > beyond(worst))) worst = found;
		}
	}
	return worst;
}
