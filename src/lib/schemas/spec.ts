import { z } from 'zod';
import type { Spec } from '../domain/shelf-life/spec';

const figure = z.number();
const absent = z.number().nullable();

const lifeNeed = z.object({ hours: figure, celsius: figure });
const lifePoint = z.object({ celsius: figure, lifeHours: figure });

const rateModel = z.discriminatedUnion('kind', [
	z.object({ kind: z.literal('constant-q10'), q10: figure }),
	z.object({ kind: z.literal('two-lives'), lower: lifePoint, upper: lifePoint }),
	z.object({
		kind: z.literal('banded-q10'),
		bands: z.array(z.object({ fromCelsius: figure, toCelsius: figure, q10: figure }))
	}),
	z.object({ kind: z.literal('arrhenius'), activationEnergyKilojoulesPerMole: figure }),
	z.object({ kind: z.literal('life-table'), points: z.array(lifePoint) }),
	z.object({ kind: z.literal('square-root'), minCelsius: figure })
]);

const limit = z.object({
	celsius: figure,
	graceMinutes: figure,
	graceMinutesInAll: figure,
	hysteresisCelsius: figure,
	majorMinutes: figure,
	criticalMinutes: figure,
	airGraceMinutes: figure.optional(),
	airGraceMinutesInAll: figure.optional()
});

/**
 * The shape in which a version's figures are stored and sent. Whether they make sense together is `validateSpec`'s
 * to say; the keys are in one order, so that the same figures always give the same text and hash.
 */
export const specSchema = z.object({
	referenceCelsius: figure,
	fullLifeHours: figure,
	fullLifeUncertaintyHours: figure,
	model: rateModel,
	validFromCelsius: figure,
	validToCelsius: figure,
	chillingCelsius: absent,
	freezingCelsius: absent,
	ceilingCelsius: absent,
	upper: limit.nullable(),
	lower: limit.nullable(),
	neededHours: figure,
	openingDefaultHours: figure,
	mkt: z.object({
		activationEnergyKilojoulesPerMole: absent,
		windowHours: absent,
		limitCelsius: absent
	}),
	sources: z.array(z.object({ text: z.string(), point: lifePoint.nullable(), lifeHoursHigh: absent })),
	caution: z.string().nullable(),
	// Younger than the first signed versions, whose text and hash know nothing of them.
	sensitivityPlusMinus: figure.optional(),
	neededAtDock: lifeNeed.optional(),
	neededAtCustomer: lifeNeed.optional()
}) satisfies z.ZodType<Spec>;
