import type { Transaction } from 'sequelize';
import { Arrival } from '../db/models/arrival';
import { AssessmentRow } from '../db/models/assessment-row';
import { Calibration } from '../db/models/calibration';
import { Claim } from '../db/models/claim';
import { Clock } from '../db/models/clock';
import { Disposition } from '../db/models/disposition';
import { DispositionLine } from '../db/models/disposition-line';
import { Handover } from '../db/models/handover';
import { Hold } from '../db/models/hold';
import { Lane } from '../db/models/lane';
import { LineRecommendation } from '../db/models/line-recommendation';
import { Logger } from '../db/models/logger';
import { LoggerRead } from '../db/models/logger-read';
import { LoggerTrip } from '../db/models/logger-trip';
import { Note } from '../db/models/note';
import { NoteFile } from '../db/models/note-file';
import { Notice } from '../db/models/notice';
import { Pallet } from '../db/models/pallet';
import { Partner } from '../db/models/partner';
import { Photo } from '../db/models/photo';
import { Product } from '../db/models/product';
import { PulpReading } from '../db/models/pulp-reading';
import { Report } from '../db/models/report';
import type { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { Site } from '../db/models/site';
import { SpecVersion } from '../db/models/spec-version';
import { StoredFile } from '../db/models/stored-file';
import { TraceRow } from '../db/models/trace-row';
import { TrimRow } from '../db/models/trim-row';
import { User } from '../db/models/user';
import { Variety } from '../db/models/variety';
import { clockCorrectionsOf } from '../traces/clock-views';

/** Every row a docket is drawn from. Packed readings stay in the database. */
export type DocketRows = Awaited<ReturnType<typeof loadDocketRows>>;

const ids = (values: readonly (string | null | undefined)[]) => [
	...new Set(values.filter((value) => value !== null && value !== undefined))
];

function ofShipment(shipmentId: string, transaction?: Transaction) {
	const where = { shipmentId };
	const scope = { where, transaction };
	return Promise.all([
		ShipmentLine.findAll({ ...scope, order: ['ordinal'] }),
		Handover.findAll({ ...scope, order: ['ordinal'] }),
		LoggerTrip.findAll({ ...scope, order: ['ordinal'] }),
		LoggerRead.findAll({ ...scope, order: ['uploadedAt'] }),
		TraceRow.findAll({ ...scope, attributes: { exclude: ['packed'] }, order: ['firstAt', 'ordinal'] }),
		AssessmentRow.findAll({ where: { shipmentId, isCurrent: true }, transaction }),
		LineRecommendation.findAll(scope),
		Arrival.findOne(scope),
		PulpReading.findAll({ ...scope, order: ['takenAt', 'id'] }),
		Photo.findAll({ ...scope, order: ['takenAt'] }),
		Note.findAll({ ...scope, order: ['writtenAt'] }),
		Hold.findAll({ ...scope, order: ['putAt'] }),
		Clock.findAll({ ...scope, order: ['deadlineAt'] }),
		Disposition.findAll({ ...scope, attributes: { exclude: ['frozen'] }, order: ['version'] }),
		Report.findAll(scope),
		Notice.findAll({ ...scope, order: ['number'] }),
		Claim.findOne({ ...scope, order: [['openedAt', 'DESC']] })
	]);
}

/** Reads a docket's rows in two rounds of queries, however many lines it has. */
export async function loadDocketRows(shipment: Shipment, transaction?: Transaction) {
	const [
		lines,
		handovers,
		trips,
		reads,
		traces,
		assessments,
		recommendations,
		arrival,
		pulp,
		photos,
		notes,
		holds,
		clocks,
		dispositions,
		reports,
		notices,
		claim
	] = await ofShipment(shipment.id, transaction);
	const byId = <Key extends string>(key: Key, values: string[]) => ({
		where: { [key]: values },
		transaction
	});
	const trims = await TrimRow.findAll({
		where: { traceId: traces.map((row) => row.id), undoneAt: null },
		order: ['fromAt'],
		transaction
	});
	const clockCorrections = await clockCorrectionsOf(
		reads.map((row) => row.id),
		transaction
	);
	const noteFiles = await NoteFile.findAll({
		where: { noteId: notes.map((row) => row.id) },
		order: ['ordinal'],
		transaction
	});
	const userIds = ids([
		...trims.map((row) => row.madeBy),
		arrival?.loggedBy,
		...holds.map((row) => row.putBy),
		...notes.map((row) => row.writtenBy),
		...photos.map((row) => row.takenBy)
	]);
	const [site, partners, products, varieties, pallets, loggers, specs, files, outcomes, users] =
		await Promise.all([
			Site.findByPk(shipment.siteId, { transaction, rejectOnEmpty: true }),
			Partner.findAll(
				byId('id', ids([shipment.supplierId, shipment.carrierId, ...notices.map((row) => row.partnerId)]))
			),
			Product.findAll(byId('id', ids(lines.map((row) => row.productId)))),
			Variety.findAll(byId('id', ids(lines.map((row) => row.varietyId)))),
			Pallet.findAll({ ...byId('lineId', ids(lines.map((row) => row.id))), order: ['ordinal'] }),
			Logger.findAll(byId('serial', ids(trips.map((row) => row.serial)))),
			SpecVersion.findAll(byId('id', ids(assessments.map((row) => row.specVersionId)))),
			StoredFile.findAll(
				byId(
					'id',
					ids([
						...reads.map((row) => row.fileId),
						...reports.map((row) => row.fileId),
						...photos.map((row) => row.fileId),
						...noteFiles.map((row) => row.fileId)
					])
				)
			),
			DispositionLine.findAll({
				...byId('dispositionId', ids(dispositions.map((row) => row.id))),
				order: ['ordinal']
			}),
			User.findAll({ ...byId('id', userIds), attributes: ['id', 'name'] })
		]);
	const lane = shipment.laneId ? await Lane.findByPk(shipment.laneId, { transaction }) : null;
	const calibrations = await Calibration.findAll({
		where: { loggerId: loggers.map((row) => row.id) },
		transaction,
		order: ['calibratedOn']
	});
	return {
		shipment,
		site,
		lane,
		partners,
		lines,
		products,
		varieties,
		pallets,
		handovers,
		trips,
		loggers,
		calibrations,
		reads,
		traces,
		trims,
		clockCorrections,
		assessments,
		specs,
		recommendations,
		arrival,
		pulp,
		photos,
		notes,
		noteFiles,
		holds,
		clocks,
		dispositions,
		outcomes,
		reports,
		notices,
		claim,
		files,
		users
	};
}
