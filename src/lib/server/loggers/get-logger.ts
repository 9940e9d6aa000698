import type { Context } from '../context';
import { Calibration } from '../db/models/calibration';
import { Logger } from '../db/models/logger';
import { LoggerTrip } from '../db/models/logger-trip';
import { Partner } from '../db/models/partner';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { calibrationView, loggerView, type CalibrationView, type LoggerView } from './views';

export interface LoggerRecord extends LoggerView {
	calibrations: CalibrationView[];
	trips: number;
}

/** One instrument with its calibrations, newest first. @throws Refusal `not-found`, `not-allowed` */
export async function getLogger(ctx: Context, loggerId: string, todayOn: string): Promise<LoggerRecord> {
	authorize(ctx, 'catalogue.view');
	const logger = await Logger.findByPk(loggerId);
	if (!logger) throw new Refusal('not-found');
	const owner = logger.ownerId ? await Partner.findByPk(logger.ownerId) : null;
	const calibrations = await Calibration.findAll({ where: { loggerId }, order: [['calibratedOn', 'desc']] });
	const trips = await LoggerTrip.count({ where: { loggerId } });
	return {
		...loggerView(logger, owner?.name ?? null, todayOn),
		calibrations: calibrations.map(calibrationView),
		trips
	};
}
