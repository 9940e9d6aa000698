import type { Calibration } from '../db/models/calibration';
import type { Logger } from '../db/models/logger';
import { revisionOf } from '../catalogue/revision';

/** What the form changes, and what the audit trail keeps of a change. */
export function loggerFields(logger: Logger) {
	const { serial, kind, ownerId, accuracyCelsius, startDelayMinutes, calibrationDueOn, note } = logger;
	return { serial, kind, ownerId, accuracyCelsius, startDelayMinutes, calibrationDueOn, note };
}

export interface CalibrationView {
	id: string;
	calibratedOn: string;
	dueOn: string;
	certificateNumber: string;
	laboratory: string;
	errorCelsius: number | null;
}

export function calibrationView(calibration: Calibration): CalibrationView {
	const { id, calibratedOn, dueOn, certificateNumber, laboratory, errorCelsius } = calibration;
	return { id, calibratedOn, dueOn, certificateNumber, laboratory, errorCelsius };
}

export interface LoggerView extends ReturnType<typeof loggerFields> {
	id: string;
	ownerName: string | null;
	/** Its next calibration was due before today. */
	isOverdue: boolean;
	switchedOffAt: string | null;
	revision: string;
}

export function loggerView(logger: Logger, ownerName: string | null, todayOn: string): LoggerView {
	const fields = loggerFields(logger);
	return {
		id: logger.id,
		...fields,
		ownerName,
		isOverdue: logger.calibrationDueOn !== null && logger.calibrationDueOn < todayOn,
		switchedOffAt: logger.switchedOffAt?.toISOString() ?? null,
		revision: revisionOf(fields)
	};
}
