import { Op, type Transaction, type WhereOptions } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { Compartment } from '../db/models/compartment';

/** What says which chambers a docket may name: those of its papers, and of the truck it came on. */
export interface CompartmentScope {
	id: string;
	visitId: string | null;
}

function ofDocket({ id, visitId }: CompartmentScope): WhereOptions<Compartment> {
	return visitId ? { [Op.or]: [{ shipmentId: id }, { visitId }] } : { shipmentId: id };
}

/** The chambers of a docket, by name. */
export async function listCompartments(
	shipment: CompartmentScope,
	transaction?: Transaction
): Promise<Compartment[]> {
	return Compartment.findAll({ where: ofDocket(shipment), order: ['name', 'id'], transaction });
}

/**
 * The chamber of that name on a docket, made where there is none: equal names are one chamber, as the database
 * compares them. The docket is locked, or not there for others yet.
 */
export async function compartmentIdOf(
	shipment: CompartmentScope,
	name: string | null,
	transaction: Transaction
): Promise<string | null> {
	if (name === null) return null;
	const where = { [Op.and]: [ofDocket(shipment), { name }] };
	const known = await Compartment.findOne({ where, order: ['id'], transaction });
	if (known) return known.id;
	const made = { id: uuid(), visitId: null, shipmentId: shipment.id, name };
	const facts = { setPointCelsius: null, supplyAirCelsius: null, returnAirCelsius: null };
	return (await Compartment.create({ ...made, ...facts }, { transaction })).id;
}

/** Rows with the id of the chamber they name. */
export async function inCompartments<Row extends { compartment: string | null }>(
	shipment: CompartmentScope,
	rows: readonly Row[],
	transaction: Transaction
): Promise<(Omit<Row, 'compartment'> & { compartmentId: string | null })[]> {
	const placed = [];
	for (const { compartment, ...row } of rows)
		placed.push({ ...row, compartmentId: await compartmentIdOf(shipment, compartment, transaction) });
	return placed;
}
