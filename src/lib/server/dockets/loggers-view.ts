import type { DocketLoggerView } from '../../schemas/docket';
import type { LoggerTrip } from '../db/models/logger-trip';
import type { TraceRow } from '../db/models/trace-row';
import { parseFigures } from '../assessments/stored-figures';
import type { DocketRows } from './load-rows';

const msPerMinute = 60_000;

/** Trace id → L1, L2 …: expected loggers in their order, then traces that belong to none of them. */
export function labelsOf(rows: DocketRows): Map<string, string> {
	const labels = new Map<string, string>();
	let next = 1;
	for (const trip of rows.trips) {
		for (const trace of rows.traces)
			if (trace.tripId === trip.id && trace.isAssessed) labels.set(trace.id, `L${next}`);
		next++;
	}
	for (const trace of rows.traces)
		if (trace.isAssessed && !labels.has(trace.id)) labels.set(trace.id, `L${next++}`);
	return labels;
}

function zoneByOf(understanding: string | null): DocketLoggerView['zoneBy'] {
	if (!understanding) return null;
	const by: unknown = JSON.parse(understanding)?.layout?.zoneBy;
	return by === 'file' || by === 'answer' || by === 'site' ? by : null;
}

function measured(rows: DocketRows, trace: TraceRow) {
	const read = rows.reads.find((candidate) => candidate.id === trace.readId);
	const file = rows.files.find((candidate) => candidate.id === read?.fileId);
	const assessment = rows.assessments.find((candidate) => candidate.traceId === trace.id);
	const figures = assessment ? parseFigures(assessment.figures) : null;
	return {
		traceId: trace.id,
		readId: trace.readId,
		everyMinutes: trace.usualIntervalMs / msPerMinute,
		readings: trace.readings,
		mktCelsius: figures?.mktCelsius ?? null,
		meanCelsius: trace.meanCelsius,
		minCelsius: trace.minCelsius,
		maxCelsius: trace.maxCelsius,
		gapMinutes: figures
			? figures.gaps.reduce((sum, gap) => sum + (gap.toMs - gap.fromMs) / msPerMinute, 0)
			: null,
		fileName: read?.fileName ?? null,
		fileSha256: file?.sha256 ?? null,
		fileBytes: file?.bytes ?? null,
		zoneBy: zoneByOf(read?.understanding ?? null)
	};
}

const unmeasured = {
	traceId: null,
	readId: null,
	everyMinutes: null,
	readings: null,
	mktCelsius: null,
	meanCelsius: null,
	minCelsius: null,
	maxCelsius: null,
	gapMinutes: null,
	fileName: null,
	fileSha256: null,
	fileBytes: null,
	zoneBy: null
};

function ofTrip(rows: DocketRows, trip: LoggerTrip, label: string): DocketLoggerView {
	const trace = rows.traces.find((candidate) => candidate.tripId === trip.id && candidate.isAssessed);
	const logger = rows.loggers.find((candidate) => candidate.serial === trip.serial);
	return {
		label,
		serial: trip.serial,
		status: trip.status,
		position: trip.position,
		placement: trip.placement,
		accuracyCelsius: logger?.accuracyCelsius ?? null,
		calibrationDueOn: logger?.calibrationDueOn ?? null,
		...(trace ? measured(rows, trace) : unmeasured)
	};
}

/** The loggers of a docket, expected or found, with what their reads say. */
export function loggerViews(rows: DocketRows): DocketLoggerView[] {
	const labels = labelsOf(rows);
	const views = rows.trips.map((trip, index) => ofTrip(rows, trip, `L${index + 1}`));
	for (const trace of rows.traces) {
		if (!trace.isAssessed || rows.trips.some((trip) => trip.id === trace.tripId)) continue;
		views.push({
			label: labels.get(trace.id) ?? '?',
			serial: trace.name,
			status: 'found',
			position: null,
			placement: 'air',
			accuracyCelsius: null,
			calibrationDueOn: null,
			...measured(rows, trace)
		});
	}
	return views;
}
