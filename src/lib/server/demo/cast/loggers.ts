import { DateTime } from 'luxon';
import type { Context } from '../../context';
import { addLogger } from '../../loggers/save-logger';
import { recordCalibration } from '../../loggers/record-calibration';
import { chanceOf } from '../chance';

/** How many of the reusable instruments there are; each rides about every other week. */
const poolSize = 26;
const accuracies = [0.3, 0.5, 0.5] as const;

export interface DemoLogger {
	serial: string;
	kind: 'reusable' | 'one-trip';
	accuracyCelsius: number;
	/** Days from the anchor to the next calibration; a negative one is overdue. */
	dueInDays: number;
}

/** The register: the first are overdue or nearly so, the others spread over the year. */
export const loggers: readonly DemoLogger[] = Array.from({ length: poolSize }, (_, nth) => ({
	serial: `SB-${30_418 + nth * 3}`,
	kind: 'reusable',
	accuracyCelsius: accuracies[nth % accuracies.length] ?? 0.5,
	dueInDays: nth < 3 ? -9 - nth * 14 : nth * 13 - 34
}));

/** Enters the instruments with their last calibration. */
export async function enterLoggers(ctx: Context, anchor: Date): Promise<void> {
	const chance = chanceOf('loggers');
	const today = DateTime.fromJSDate(anchor, { zone: 'utc' });
	for (const { serial, kind, accuracyCelsius, dueInDays } of loggers) {
		const id = await addLogger(ctx, {
			...{ serial, kind, accuracyCelsius },
			ownerId: null,
			startDelayMinutes: 0,
			calibrationDueOn: null,
			note: '',
			revision: ''
		});
		const due = today.plus({ days: dueInDays });
		const done = due.minus({ days: 365 });
		await recordCalibration(
			ctx,
			id,
			{
				calibratedOn: done.toFormat('yyyy-MM-dd'),
				dueOn: due.toFormat('yyyy-MM-dd'),
				certificateNumber: `KRL-${done.year}-${chance.whole(1000, 9899)}`,
				laboratory: 'Kelland Reference Laboratory',
				errorCelsius: chance.whole(-20, 20) / 100
			},
			done.toFormat('yyyy-MM-dd')
		);
	}
}
