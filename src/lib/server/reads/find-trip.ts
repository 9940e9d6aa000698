import { v7 as uuid } from 'uuid';
import { accuracyNeeded, type KeepForm } from '../../schemas/read';
import { organisationChain } from '../catalogue/organisation-chain';
import type { Context } from '../context';
import { Logger } from '../db/models/logger';
import { LoggerTrip } from '../db/models/logger-trip';
import type { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { TraceRow } from '../db/models/trace-row';
import type { Writing } from '../db/transaction';
import { Refusal } from '../refusals';
import { compartmentIdOf } from '../shipments/compartments';

/** The register's entry of a serial; one that is not on it is put there with the accuracy given. */
async function loggerOf(ctx: Context, form: KeepForm, w: Writing): Promise<Logger> {
	const { transaction } = w;
	const known = await Logger.findOne({ where: { serial: form.serial }, transaction });
	if (known) return known;
	// Never a default: an accuracy nobody stated would narrow or widen every figure of this load.
	if (form.accuracyCelsius === null) throw new Refusal('invalid', accuracyNeeded);
	const made = await Logger.create(
		{
			id: uuid(),
			serial: form.serial,
			kind: 'one-trip',
			ownerId: null,
			accuracyCelsius: form.accuracyCelsius,
			startDelayMinutes: 0,
			calibrationDueOn: null,
			note: 'Registered when its export was kept',
			createdAt: ctx.now,
			switchedOffAt: null
		},
		{ transaction }
	);
	w.record('logger.saved', await organisationChain(transaction), loggerEntry(made));
	return made;
}

function loggerEntry({ id, serial, accuracyCelsius }: Logger) {
	return { loggerId: id, before: null, after: { serial, kind: 'one-trip', accuracyCelsius } };
}

/** The logger's trip on this docket, found: the expected one, or a new one. @throws Refusal `invalid`, `in-use` */
export async function tripFound(
	ctx: Context,
	shipment: Shipment,
	form: KeepForm,
	w: Writing
): Promise<LoggerTrip> {
	const { transaction } = w;
	const shipmentId = shipment.id;
	await checkLine(shipmentId, form.lineId, w);
	const logger = await loggerOf(ctx, form, w);
	const where = { shipmentId, serial: form.serial };
	const facts = {
		loggerId: logger.id,
		lineId: form.lineId,
		...(await compartmentOf(shipment, form, w)),
		position: form.position,
		placement: form.placement,
		status: 'found' as const
	};
	const expected = await LoggerTrip.findOne({ where, transaction });
	if (!expected) {
		const ordinal =
			1 + Number((await LoggerTrip.max('ordinal', { where: { shipmentId }, transaction })) ?? 0);
		return LoggerTrip.create({ id: uuid(), ...where, ordinal, palletId: null, ...facts }, { transaction });
	}
	const hasTrace = await TraceRow.count({ where: { tripId: expected.id, isAssessed: true }, transaction });
	if (hasTrace > 0)
		throw new Refusal('in-use', 'Another read of this logger has been kept. QA can withdraw that one first.');
	return expected.update(facts, { transaction });
}

/** A logger with a line is where its line is, so only one without is put somewhere. */
async function compartmentOf(
	shipment: Shipment,
	{ compartment, lineId }: KeepForm,
	{ transaction }: Writing
) {
	if (compartment === undefined) return {};
	const name = lineId === null ? compartment : null;
	return { compartmentId: await compartmentIdOf(shipment, name, transaction) };
}

async function checkLine(shipmentId: string, lineId: string | null, { transaction }: Writing): Promise<void> {
	if (lineId === null) return;
	const line = await ShipmentLine.findByPk(lineId, { transaction });
	if (line?.shipmentId !== shipmentId) throw new Refusal('invalid', 'Choose a line of this docket.');
}
