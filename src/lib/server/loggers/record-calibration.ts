import { v7 as uuid } from 'uuid';
import type { CalibrationForm } from '../../schemas/logger';
import { organisationChain } from '../catalogue/organisation-chain';
import type { Context } from '../context';
import { Calibration } from '../db/models/calibration';
import { Logger } from '../db/models/logger';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';

/** Enters a calibration; the newest one says when the next is due. @throws Refusal `not-found`, `not-allowed`, `invalid` */
export async function recordCalibration(
	ctx: Context,
	loggerId: string,
	form: CalibrationForm,
	todayOn: string
): Promise<void> {
	authorize(ctx, 'catalogue.change');
	if (form.calibratedOn > todayOn) throw new Refusal('invalid', 'That day has not come yet at your site.');
	const id = uuid();
	await inTransaction(ctx, async ({ transaction, record }) => {
		const logger = await Logger.findByPk(loggerId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!logger) throw new Refusal('not-found');
		const newest = await Calibration.findOne({
			where: { loggerId },
			order: [['calibratedOn', 'desc']],
			transaction
		});
		const before = { calibrationDueOn: logger.calibrationDueOn };
		await Calibration.create({ id, loggerId, ...form, fileId: null }, { transaction });
		if (!newest || newest.calibratedOn <= form.calibratedOn)
			await logger.update({ calibrationDueOn: form.dueOn }, { transaction });
		const after = { calibrationDueOn: logger.calibrationDueOn, calibration: form };
		record('logger.saved', await organisationChain(transaction), { loggerId, before, after });
	});
}
