import type { Transaction } from 'sequelize';
import { msPerHour } from '../../domain/units';
import { Clock } from '../db/models/clock';
import type { Shipment } from '../db/models/shipment';

export const rejectClockName = 'Reject the goods';

/**
 * Sets the clock that the terms of sale start at the arrival: until when the goods can still be refused. Without a
 * term there is none, and one that a document has met stays as it is.
 */
export async function setRejectClock(
	shipment: Shipment,
	newId: string,
	transaction: Transaction
): Promise<void> {
	const where = { shipmentId: shipment.id, name: rejectClockName };
	const known = await Clock.findOne({ where, transaction });
	if (known?.metAt) return;
	const { arrivedAt, rejectWithinHours } = shipment;
	if (arrivedAt === null || rejectWithinHours === null) {
		await known?.destroy({ transaction });
		return;
	}
	const figures = {
		basis: shipment.rejectBasis ?? 'Terms of sale, from arrival',
		startsAt: arrivedAt,
		deadlineAt: new Date(arrivedAt.getTime() + rejectWithinHours * msPerHour)
	};
	if (known) await known.update(figures, { transaction });
	else
		await Clock.create({ ...where, ...figures, id: newId, noticeId: null, claimId: null }, { transaction });
}
