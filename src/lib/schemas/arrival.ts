import { z } from 'zod';
import {
	optionalCount,
	optionalFlag,
	optionalId,
	optionalNumber,
	optionalText,
	rowsOf,
	wallTime
} from './shipment-parts';

export const sealStates = ['as-on-papers', 'other', 'broken', 'none'] as const;
export const pulpUnits = ['celsius', 'fahrenheit'] as const;

const pulp = z
	.object({
		lineId: optionalId,
		position: optionalText(80),
		caseLabel: optionalText(80),
		degrees: optionalNumber(-80, 250, 'degrees'),
		unit: z.enum(pulpUnits, { error: '°C or °F.' }).default('celsius'),
		instrument: optionalText(80),
		/** A person has looked at a figure that seemed to be in the other unit, and means it. */
		isMeant: optionalFlag
	})
	.superRefine((row, ctx) => {
		const { degrees, unit } = row;
		if (degrees === null)
			ctx.addIssue({ code: 'custom', path: ['degrees'], message: 'What did the probe read?' });
		else if (row.isMeant !== true) {
			const doubt = doubtfulUnit(degrees, unit);
			if (doubt !== null) ctx.addIssue({ code: 'custom', path: ['degrees'], message: doubt });
		}
	});

/** The warmest pulp of a chilled load that is believed in °C without asking; in °F it would be just above freezing. */
const warmestBelievedCelsius = 30;
/** Colder than this in °F is a frozen load: more likely a chilled one written in °C. */
const coldestBelievedFahrenheit = 20;

/**
 * A pulp figure that only makes sense in the other unit is asked about. Frozen goods are 0 to 10 °F, so only small
 * positive figures are in doubt on that side, and negative ones are left alone.
 */
export function doubtfulUnit(degrees: number, unit: (typeof pulpUnits)[number]): string | null {
	if (unit === 'celsius' && degrees > warmestBelievedCelsius)
		return `${degrees} °C? Did you mean °F? Choose °F, or tick that it is meant.`;
	if (unit === 'fahrenheit' && degrees > 0 && degrees < coldestBelievedFahrenheit)
		return `${degrees} °F is hard frozen. Did you mean °C? Choose °C, or tick that it is meant.`;
	return null;
}

const pulpRows = rowsOf(pulp, { most: 100, ignore: ['unit', 'instrument', 'lineId', 'isMeant'] });

/** What was seen at the door. Temperatures of the unit are in the unit that is named with them. */
export const arrivalInput = z
	.object({
		/** Made by the client: sending twice logs one arrival. */
		id: optionalId,
		arrived: wallTime.refine((value) => value !== null, 'When did it arrive?'),
		dock: optionalText(40),
		seal: z.enum(sealStates, { error: 'How was the seal?' }),
		sealFound: optionalText(60),
		setPointDegrees: optionalNumber(-80, 150, 'degrees'),
		returnAirDegrees: optionalNumber(-80, 150, 'degrees'),
		unit: z.enum(pulpUnits).default('celsius'),
		counts: rowsOf(z.object({ lineId: z.uuid(), received: optionalCount(1_000_000) }), {
			most: 200,
			ignore: ['lineId']
		}),
		pulp: pulpRows,
		conditionNote: optionalText(2_000),
		reservation: optionalText(2_000),
		driverName: optionalText(120),
		/** Drawn with the finger, as a PNG data URL. */
		driverSignature: optionalText(400_000)
	})
	.superRefine((seen, ctx) => {
		if (seen.seal === 'other' && seen.sealFound === null)
			ctx.addIssue({ code: 'custom', path: ['sealFound'], message: 'Which number is on it?' });
	});
export type ArrivalInput = z.output<typeof arrivalInput>;
export type PulpInput = ArrivalInput['pulp'][number];

/** Further probe readings, after the arrival was logged. */
export const pulpInput = z.object({
	pulp: pulpRows.refine((rows) => rows.length > 0, 'Write at least one reading.')
});
