import { z } from 'zod';
import {
	decimalField,
	neededDay,
	neededText,
	optionalDay,
	optionalText,
	revisionField,
	wholeField
} from './field';
import { choice, listQuery } from './list';

export const loggerKinds = ['reusable', 'one-trip'] as const;

export const loggerForm = z.object({
	serial: neededText(60, 'Enter the serial, as it stands in the export.'),
	kind: z.enum(loggerKinds, 'Choose what kind it is.'),
	ownerId: z
		.union([z.literal(''), z.uuid('Choose an owner from the list.')])
		.default('')
		.transform((id) => id || null),
	accuracyCelsius: decimalField('Enter the accuracy from its data sheet, from 0.01 to 5 °C.', {
		min: 0.01,
		max: 5
	}).transform((value, context) => {
		if (value !== null) return value;
		// Never a default: an accuracy nobody stated would narrow or widen every figure of its loads.
		context.addIssue({
			code: 'custom',
			message: 'Enter the accuracy from its data sheet, from 0.01 to 5 °C.'
		});
		return z.NEVER;
	}),
	startDelayMinutes: wholeField('Whole minutes, 0 to 10,080.', { min: 0, max: 10_080 }),
	calibrationDueOn: optionalDay,
	note: optionalText(300),
	revision: revisionField
});
export type LoggerForm = z.output<typeof loggerForm>;

export const calibrationForm = z
	.object({
		calibratedOn: neededDay,
		dueOn: neededDay,
		certificateNumber: neededText(60, 'Enter the certificate’s number.'),
		laboratory: neededText(120, 'Enter who calibrated it.'),
		errorCelsius: decimalField('Degrees Celsius from −10 to 10, or empty.', { min: -10, max: 10 })
	})
	.refine((form) => form.dueOn > form.calibratedOn, {
		path: ['dueOn'],
		message: 'The next one is due before or on the day of this one.'
	});
export type CalibrationForm = z.output<typeof calibrationForm>;

export const loggerQuery = listQuery(['serial', 'due', 'accuracy']).extend({
	state: choice(['in-use', 'overdue', 'off', 'all']),
	kind: choice(['any', ...loggerKinds])
});
export type LoggerQuery = z.output<typeof loggerQuery>;
