import type { Spec } from '../domain/shelf-life/spec';
import { specFromStarting, type StartingSpec } from '../domain/starting-specs/starting-spec';
import type { TemperatureUnit } from '../domain/units';
import { specFormValues, type SpecFormValues } from './spec-form-values';

/** A starting spec's figures for a picture of them: nothing is needed and no limit stands. Never to be kept. */
export function startingPicture(starting: StartingSpec): Spec {
	return specFromStarting(starting, { neededHours: 0, openingDefaultHours: 0, upper: null, lower: null });
}

/** The editor's fields with the published figures in them; what only the receiver can say is left to be entered. */
export function startingValues(starting: StartingSpec, unit: TemperatureUnit): SpecFormValues {
	return { ...specFormValues(startingPicture(starting), unit), needed: '', openingDefault: '' };
}

/** What a draft made from a starting spec says about itself until somebody signs it with a reason of their own. */
export function copiedFromText(starting: StartingSpec): string {
	return `Copied from the starting spec “${starting.product}”.`;
}
