import { Op } from 'sequelize';
import { AssessmentRow } from '../db/models/assessment-row';
import { Clock } from '../db/models/clock';
import { Disposition } from '../db/models/disposition';
import { DispositionLine } from '../db/models/disposition-line';
import { ExcursionRow } from '../db/models/excursion-row';
import { Hold } from '../db/models/hold';
import { LoggerRead } from '../db/models/logger-read';
import { LoggerTrip } from '../db/models/logger-trip';
import { Partner } from '../db/models/partner';
import { Product } from '../db/models/product';
import type { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { SpecVersion } from '../db/models/spec-version';
import { parseSpecFigures } from '../specs/stored-spec';
import { rejectClockName } from './reject-clock';

function grouped<Row>(rows: readonly Row[], keyOf: (row: Row) => string): Map<string, Row[]> {
	const groups = new Map<string, Row[]>();
	for (const row of rows) {
		const group = groups.get(keyOf(row));
		if (group) group.push(row);
		else groups.set(keyOf(row), [row]);
	}
	return groups;
}

const byShipment = (row: { shipmentId: string }) => row.shipmentId;

async function findPeople(shipments: readonly Shipment[]) {
	const ids = shipments.flatMap((shipment) => [shipment.supplierId, shipment.carrierId]);
	const partners = await Partner.findAll({
		where: { id: { [Op.in]: [...new Set(ids.filter((id) => id !== null))] } },
		attributes: ['id', 'name']
	});
	return new Map(partners.map((partner) => [partner.id, partner.name]));
}

async function findAssessed(where: { shipmentId: { [Op.in]: string[] } }) {
	const assessments = await AssessmentRow.findAll({
		where: { ...where, isCurrent: true, isGoverning: true },
		// Without the figures: they are large, and the board needs none of them.
		attributes: { exclude: ['figures'] }
	});
	const [specs, excursions] = await Promise.all([
		SpecVersion.findAll({
			where: { id: { [Op.in]: [...new Set(assessments.map((row) => row.specVersionId))] } }
		}),
		ExcursionRow.findAll({ where: { assessmentId: { [Op.in]: assessments.map((row) => row.id) } } })
	]);
	return {
		assessments: grouped(assessments, byShipment),
		fullHours: new Map(specs.map((spec) => [spec.id, parseSpecFigures(spec.figures).fullLifeHours])),
		excursions: grouped(excursions, (row) => row.assessmentId)
	};
}

/** Everything the board says of these loads, in one query a table, however many loads there are. */
export async function findBoardFacts(shipments: readonly Shipment[]) {
	const where = { shipmentId: { [Op.in]: shipments.map((shipment) => shipment.id) } };
	const [lines, trips, reads, holds, clocks, dispositions, partners, assessed] = await Promise.all([
		ShipmentLine.findAll({ where, order: ['ordinal'] }),
		LoggerTrip.findAll({ where }),
		LoggerRead.findAll({
			where: { ...where, state: ['ok', 'question'] },
			attributes: ['id', 'shipmentId', 'state', 'keptAt', 'askedQaAt', 'fileName']
		}),
		Hold.findAll({ where: { ...where, liftedAt: null } }),
		Clock.findAll({ where: { ...where, name: rejectClockName, metAt: null } }),
		Disposition.findAll({
			where,
			order: ['version'],
			attributes: ['id', 'shipmentId', 'version', 'signedName', 'signedAt']
		}),
		findPeople(shipments),
		findAssessed(where)
	]);
	const [products, outcomes] = await Promise.all([
		Product.findAll({
			where: { id: { [Op.in]: [...new Set(lines.map((line) => line.productId))] } }
		}),
		DispositionLine.findAll({ where: { dispositionId: { [Op.in]: dispositions.map((row) => row.id) } } })
	]);
	return {
		...assessed,
		partners,
		products: new Map(products.map((product) => [product.id, product])),
		lines: grouped(lines, byShipment),
		trips: grouped(trips, byShipment),
		reads: grouped(reads, byShipment),
		holds: grouped(holds, byShipment),
		clocks: grouped(clocks, byShipment),
		dispositions: grouped(dispositions, byShipment),
		outcomes: grouped(outcomes, (row) => row.dispositionId)
	};
}

/** The facts of all loads on the board, by docket. */
export type BoardFacts = Awaited<ReturnType<typeof findBoardFacts>>;
