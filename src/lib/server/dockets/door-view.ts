import { celsiusFromFahrenheit } from '../../domain/units';
import type { ArrivalView, DocketView, HandoverView, PartyView, PulpView } from '../../schemas/docket';
import type { PulpReading } from '../db/models/pulp-reading';
import type { DocketRows } from './load-rows';
import { labelsOf } from './loggers-view';

const nameOf = (rows: DocketRows, userId: string) =>
	rows.users.find((user) => user.id === userId)?.name ?? 'somebody';

export function partyView(rows: DocketRows, partnerId: string | null): PartyView | null {
	const partner = rows.partners.find((candidate) => candidate.id === partnerId);
	return partner
		? { id: partner.id, name: partner.name, gln: partner.gln, note: partner.address || null }
		: null;
}

export function arrivalView(rows: DocketRows): ArrivalView | null {
	const { arrival, shipment } = rows;
	if (!arrival) return null;
	return {
		arrivedAt: arrival.arrivedAt.toISOString(),
		dock: shipment.dock,
		sealFound: arrival.sealFound,
		isSealIntact: arrival.isSealIntact,
		setPointCelsius: arrival.setPointCelsius,
		returnAirCelsius: arrival.returnAirCelsius,
		conditionNote: arrival.conditionNote || null,
		driverName: arrival.driverName,
		hasDriverSignature: arrival.driverSignatureId !== null,
		loggedBy: nameOf(rows, arrival.loggedBy)
	};
}

export function pulpCelsius({ degrees, unit }: Pick<PulpReading, 'degrees' | 'unit'>): number {
	return unit === 'celsius' ? degrees : celsiusFromFahrenheit(degrees);
}

export function pulpViews(rows: DocketRows): PulpView[] {
	return rows.pulp.map((row) => ({
		id: row.id,
		lineId: row.lineId,
		lot: rows.lines.find((line) => line.id === row.lineId)?.lot ?? null,
		position: row.position,
		caseLabel: row.caseLabel,
		celsius: pulpCelsius(row),
		text: `${row.degrees.toFixed(1)} ${row.unit === 'celsius' ? '°C' : '°F'}`,
		instrument: row.instrument,
		takenAt: row.takenAt.toISOString()
	}));
}

export function handoverViews(rows: DocketRows): HandoverView[] {
	return rows.handovers.map((row) => ({
		id: row.id,
		ordinal: row.ordinal,
		holder: row.holder,
		place: row.place,
		plannedAt: row.plannedAt?.toISOString() ?? null,
		actualAt: row.actualAt?.toISOString() ?? null,
		setPointCelsius: row.setPointCelsius,
		source: row.source
	}));
}

export function photoViews(rows: DocketRows): DocketView['photos'] {
	return rows.photos.map((row) => ({
		id: row.id,
		caption: row.caption,
		kind: row.kind,
		by: nameOf(rows, row.takenBy),
		at: row.takenAt.toISOString(),
		bytes: rows.files.find((file) => file.id === row.fileId)?.bytes ?? 0
	}));
}

export function noteViews(rows: DocketRows): DocketView['notes'] {
	return rows.notes.map((row) => ({
		id: row.id,
		text: row.text,
		by: nameOf(rows, row.writtenBy),
		at: row.writtenAt.toISOString(),
		files: rows.noteFiles
			.filter(({ noteId }) => noteId === row.id)
			.map(({ id, fileId, fileName }) => {
				const file = rows.files.find((candidate) => candidate.id === fileId);
				return { id, fileName, bytes: Number(file?.bytes ?? 0), sha256: file?.sha256 ?? '' };
			})
	}));
}

export function trimViews(rows: DocketRows): DocketView['trims'] {
	const labels = labelsOf(rows);
	return rows.trims.map((row) => ({
		id: row.id,
		logger: labels.get(row.traceId) ?? '?',
		fromAt: row.fromAt.toISOString(),
		toAt: row.toAt.toISOString(),
		reason: row.reason,
		by: nameOf(rows, row.madeBy)
	}));
}

export function clockCorrectionViews(rows: DocketRows): DocketView['clockCorrections'] {
	const labels = labelsOf(rows);
	return rows.clockCorrections.map((correction) => {
		const trace = rows.traces.find(({ readId, isAssessed }) => readId === correction.readId && isAssessed);
		return { ...correction, logger: labels.get(trace?.id ?? '') ?? '?' };
	});
}

export function holdView(rows: DocketRows): DocketView['hold'] {
	const hold = rows.holds.find((row) => row.liftedAt === null);
	return hold
		? {
				sinceAt: hold.putAt.toISOString(),
				by: nameOf(rows, hold.putBy),
				reason: hold.reason,
				awaited: hold.awaited,
				untilAt: hold.untilAt?.toISOString() ?? null
			}
		: null;
}
