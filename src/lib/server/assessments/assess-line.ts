import { assess, AssessmentRefusal } from '../../domain/receiving/assess';
import type { Assessment, Handover, OpeningBalance } from '../../domain/receiving/assessment';
import { engineVersion } from '../../domain/receiving/engine-version';
import { msPerHour } from '../../domain/units';
import type { Handover as HandoverRow } from '../db/models/handover';
import type { ShipmentLine } from '../db/models/shipment-line';
import { assessInputOf, type PinnedInputs } from './assessment-inputs';
import type { DocketEvidence, LoadedTrace } from './load-evidence';
import type { SignedSpec } from '../specs/find-spec-in-force';

/** What one trace says about one line, with what it rests on. */
export interface LineAssessment {
	trace: LoadedTrace;
	inputs: PinnedInputs;
	assessment: Assessment;
	trimmedHours: number;
}

/**
 * The traces of the loggers assigned to a line or its pallets; where there is none, of those that rode in its
 * compartment for all. Never another line's, and never another compartment's.
 */
export function tracesOfLine(
	line: { id: string; compartmentId: string | null },
	{ traces, shipment }: Pick<DocketEvidence, 'traces' | 'shipment'>
): LoadedTrace[] {
	const own = traces.filter(({ lineId }) => lineId === line.id);
	if (own.length > 0) return own;
	const compartment = line.compartmentId ?? shipment.compartmentId;
	return traces.filter(
		({ lineId, trip }) => lineId === null && (trip.compartmentId ?? shipment.compartmentId) === compartment
	);
}

/** Assesses a line by each of its traces. A trace without readings in custody says nothing about it and is left out. */
export function assessLine(line: ShipmentLine, spec: SignedSpec, evidence: DocketEvidence): LineAssessment[] {
	const handovers = evidence.handovers.map(domainHandover);
	return tracesOfLine(line, evidence).flatMap((trace) => {
		const inputs = pinnedInputs(line, spec, trace, handovers);
		const assessment = assessOrNone(inputs, spec, trace);
		return assessment ? [{ trace, inputs, assessment, trimmedHours: trimmedHours(trace) }] : [];
	});
}

/** The strictest trace governs: the one with the least life left on the low. */
export function governingOf(assessed: readonly LineAssessment[]): LineAssessment | null {
	const low = ({ assessment }: LineAssessment) => assessment.remainingHours.low;
	return assessed.reduce<LineAssessment | null>(
		(best, one) => (best && low(best) <= low(one) ? best : one),
		null
	);
}

function assessOrNone(inputs: PinnedInputs, spec: SignedSpec, { trace }: LoadedTrace): Assessment | null {
	try {
		return assess(assessInputOf(inputs, spec.figures, trace));
	} catch (error) {
		const isOutside = error instanceof AssessmentRefusal && error.code !== 'spec-faulty';
		if (isOutside) return null;
		throw error;
	}
}

function pinnedInputs(
	line: ShipmentLine,
	spec: SignedSpec,
	trace: LoadedTrace,
	handovers: Handover[]
): PinnedInputs {
	return {
		engineVersion,
		specVersionId: spec.id,
		specSha256: spec.figuresSha256,
		traceSha256: trace.contentSha256,
		fileSha256: trace.fileSha256,
		layoutFingerprint: trace.layoutFingerprint,
		clockShiftMs: trace.clockShiftMs,
		accuracyCelsius: trace.accuracyCelsius,
		placement: trace.trip.placement,
		opening: openingOf(line),
		handovers,
		trims: trace.trims,
		neededHours: line.neededHours ?? spec.figures.neededHours
	};
}

/** The balance a line starts with, as it was declared; an incomplete declaration counts as none. */
export function openingOf(line: ShipmentLine): OpeningBalance {
	const basis = line.openingBasis ?? '';
	if (line.openingKind === 'declared' && line.openingHours !== null) {
		const plusMinusHours = line.openingPlusMinusHours ?? 0;
		return { kind: 'declared', hours: line.openingHours, plusMinusHours, basis };
	}
	if (line.openingKind === 'computed' && line.openingSinceAt && line.openingCelsius !== null) {
		const sinceMs = line.openingSinceAt.getTime();
		const plusMinusCelsius = line.openingPlusMinusCelsius ?? 0;
		return { kind: 'computed', sinceMs, celsius: line.openingCelsius, plusMinusCelsius, basis };
	}
	return { kind: 'undeclared' };
}

/** A handover as the engine takes it. */
export function domainHandover(row: HandoverRow): Handover {
	return {
		id: row.id,
		holder: row.holder,
		place: row.place,
		plannedMs: row.plannedAt?.getTime() ?? null,
		actualMs: row.actualAt?.getTime() ?? null,
		plusMinusMinutes: row.plusMinusMinutes,
		setPointCelsius: row.setPointCelsius,
		allowedHours: row.allowedHours
	};
}

function trimmedHours({ trims }: LoadedTrace): number {
	return trims.reduce((sum, trim) => sum + (trim.toMs - trim.fromMs), 0) / msPerHour;
}
