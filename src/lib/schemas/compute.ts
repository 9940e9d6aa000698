import { z } from 'zod';
import type { LifeComputed, LifeQuestion } from '../domain/shelf-life/compute-life';
import { computeModel, modelOf, type ModelFault } from './compute-model';
import { orderedReadings, type OrderedReadings, type ReadingFault } from './compute-readings';

const number = z.number({ error: 'Send a number.' });
const celsius = number.gt(-273.15, 'No temperature is that cold. Send °C, above absolute zero.');
const limits = z
	.array(celsius, { error: 'Send a list of temperatures in °C.' })
	.max(100, 'Send 100 temperatures at most.')
	.default([]);

/** All but the readings, which are too many to be read with a schema. */
const computeInput = z.strictObject(
	{
		model: computeModel,
		limits: z
			.strictObject({ above: limits, below: limits }, { error: 'Send { "above": […], "below": […] }.' })
			.default({ above: [], below: [] }),
		accuracyCelsius: number
			.min(0, 'Send 0 or more.')
			.max(100, 'Send 100 or less: no instrument is that far off.')
			.default(0),
		mkt: z
			.strictObject(
				{
					deltaHKjPerMol: number
						.positive('Send more than 0 kJ/mol.')
						.max(1e6, 'Send 1000000 kJ/mol or less.')
						.optional()
				},
				{ error: 'Send { "deltaHKjPerMol": … }.' }
			)
			.default({}),
		readings: z.unknown()
	},
	{ error: 'Send a JSON object with model and readings.' }
);

/** What was asked, ready for the engine, with what the answer needs to speak as the question did. */
export interface ComputeRequest {
	readonly question: LifeQuestion;
	readonly readings: OrderedReadings;
}

/** A figure that cannot be used: by a schema's own sentence, or by a code that messages put in words. */
export type ComputeFault =
	| { readonly field: string; readonly sentence: string }
	| { readonly field: string; readonly code: ModelFault['code'] | ReadingFault | 'beyond-numbers' };

/** Reads what another program sent; on any fault all that were found, and no request. */
export function readComputeRequest(input: unknown): ComputeRequest | readonly ComputeFault[] {
	const faults: ComputeFault[] = [];
	const parsed = computeInput.safeParse(input);
	if (!parsed.success) for (const issue of parsed.error.issues) faults.push(...faultsOf(issue));
	const isObject = typeof input === 'object' && input !== null && !Array.isArray(input);
	const sent: unknown = isObject && 'readings' in input ? input.readings : undefined;
	const readings = isObject ? orderedReadings(sent, (field, code) => faults.push({ field, code })) : null;
	if (!parsed.success) return faults;
	const model = modelOf(parsed.data.model, (fault) => faults.push(fault));
	if (!model || !readings) return faults;
	const { accuracyCelsius, mkt } = parsed.data;
	return {
		readings,
		question: {
			rate: {
				model: model.model,
				referenceCelsius: model.referenceCelsius,
				validFromCelsius: -Infinity,
				validToCelsius: Infinity,
				chillingCelsius: null
			},
			lifeHours: model.lifeHours,
			timesMs: readings.timesMs,
			celsius: readings.celsius,
			aboveCelsius: parsed.data.limits.above,
			belowCelsius: parsed.data.limits.below,
			accuracyCelsius,
			deltaHKilojoulesPerMole: mkt.deltaHKjPerMol ?? null
		}
	};
}

function faultsOf(issue: z.core.$ZodIssue): ComputeFault[] {
	const path = issue.path.join('.');
	if (issue.code !== 'unrecognized_keys') return [{ field: path || 'form', sentence: issue.message }];
	return issue.keys.map((key) => ({
		field: path ? `${path}.${key}` : key,
		sentence: 'There is no such key here. Take it out, or spell it as documented.'
	}));
}

/** What is answered; every key is always there. */
export interface ComputeAnswer {
	usedFraction: number;
	usedHours: number;
	usedFractionAtReading: number[];
	lowUsedFraction: number;
	highUsedFraction: number;
	mktCelsius: number;
	meanCelsius: number;
	secondsAbove: Record<string, number>;
	secondsBelow: Record<string, number>;
	secondsOutsideModel: number;
	exhaustedAt: string | null;
}

/** The engine's figures as the asking program reads them: fractions of the full life, readings in the order sent. */
export function computeAnswer({ question, readings }: ComputeRequest, computed: LifeComputed): ComputeAnswer {
	const { lifeHours, aboveCelsius, belowCelsius } = question;
	const { exhaustedAfterMs } = computed;
	const fractions = new Array<number>(readings.celsius.length);
	for (let i = 0; i < fractions.length; i++)
		fractions[readings.sentAt?.[i] ?? i] = (computed.usedHoursAtReading[i] ?? 0) / lifeHours;
	const firstMs = (readings.first.seconds + readings.first.fraction) * 1000;
	return {
		usedFraction: computed.usedHours / lifeHours,
		usedHours: computed.usedHours,
		usedFractionAtReading: fractions,
		lowUsedFraction: computed.lowUsedHours / lifeHours,
		highUsedFraction: computed.highUsedHours / lifeHours,
		mktCelsius: computed.mktCelsius,
		meanCelsius: computed.meanCelsius,
		secondsAbove: byLimit(aboveCelsius, computed.secondsAbove),
		secondsBelow: byLimit(belowCelsius, computed.secondsBelow),
		secondsOutsideModel: computed.secondsOutsideModel,
		exhaustedAt:
			exhaustedAfterMs === null ? null : new Date(Math.round(firstMs + exhaustedAfterMs)).toISOString()
	};
}

function byLimit(limitsCelsius: readonly number[], seconds: readonly number[]): Record<string, number> {
	return Object.fromEntries(limitsCelsius.map((limit, i) => [String(limit), seconds[i] ?? 0]));
}
