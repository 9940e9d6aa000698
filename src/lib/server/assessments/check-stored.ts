import { assess } from '../../domain/receiving/assess';
import { engineVersion } from '../../domain/receiving/engine-version';
import type { Spec } from '../../domain/shelf-life/spec';
import type { Room } from '../../domain/trace/room';
import type { Trace } from '../../domain/trace/trace';
import { assessInputOf, inputsSha256 } from './assessment-inputs';
import { figureDifferences, largestRelative, type FigureDifference } from './figure-differences';
import { figuresText, parseInputs } from './stored-figures';

/** An assessment as it lies in the database, with the trace and the spec it names. */
export interface StoredAssessment {
	id: string;
	engineVersion: string;
	inputsSha256: string;
	figures: string;
	traceSha256: string;
	trace: Trace;
	specSha256: string;
	spec: Spec;
}

/** Why a stored assessment could not be recomputed: what it names is not what is there. */
export type CheckFault = 'inputs-altered' | 'trace-replaced' | 'spec-replaced';

export interface CheckedAssessment {
	id: string;
	engineVersion: string;
	readings: number;
	fault: CheckFault | null;
	differences: FigureDifference[];
	largestRelative: number;
}

/** Recomputes one stored assessment from what it names and compares every digit of what was stored. */
export function checkStored(stored: StoredAssessment, room: Room): CheckedAssessment {
	const { id, engineVersion: made, trace } = stored;
	const checked = { id, engineVersion: made, readings: trace.times.length };
	const { inputs, trimmedHours } = parseInputs(stored.figures);
	const fault = faultOf(stored, inputs);
	if (fault !== null) return { ...checked, fault, differences: [], largestRelative: 0 };
	const again = assess(assessInputOf(inputs, stored.spec, trace), room);
	const text = figuresText({ ...again, engineVersion: made }, inputs, trimmedHours);
	if (text === stored.figures) return { ...checked, fault, differences: [], largestRelative: 0 };
	// Another version may have stored fewer figures; what it did not know it cannot have got wrong.
	const isWhole = made === engineVersion;
	const differences = figureDifferences(JSON.parse(stored.figures), JSON.parse(text), isWhole);
	return { ...checked, fault, differences, largestRelative: largestRelative(differences) };
}

function faultOf(
	stored: StoredAssessment,
	inputs: ReturnType<typeof parseInputs>['inputs']
): CheckFault | null {
	if (inputsSha256(inputs) !== stored.inputsSha256) return 'inputs-altered';
	if (inputs.traceSha256 !== stored.traceSha256) return 'trace-replaced';
	return inputs.specSha256 === stored.specSha256 ? null : 'spec-replaced';
}
