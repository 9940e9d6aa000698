import type { AssessInput, Handover, OpeningBalance, Trim } from '../../domain/receiving/assessment';
import type { Spec } from '../../domain/shelf-life/spec';
import type { Placement, Trace } from '../../domain/trace/trace';
import { sha256Hex } from '../storage/sha256';

/**
 * What an assessment rests on, by name and hash: kept beside its figures, so that the same digits can be made again
 * whatever has become of the docket since.
 */
export interface PinnedInputs {
	engineVersion: string;
	specVersionId: string;
	specSha256: string;
	traceSha256: string;
	fileSha256: string;
	layoutFingerprint: string | null;
	clockShiftMs: number;
	accuracyCelsius: number;
	placement: Placement;
	opening: OpeningBalance;
	handovers: Handover[];
	trims: Trim[];
	neededHours: number;
}

/** The hash of the stored text; keys stand in the order in which the object was built. */
export function inputsSha256(inputs: PinnedInputs): string {
	return sha256Hex(JSON.stringify(inputs));
}

/** The engine's input: the pinned facts with the spec and the trace they name. */
export function assessInputOf(pinned: PinnedInputs, spec: Spec, trace: Trace): AssessInput {
	const { accuracyCelsius, placement, opening, handovers, trims, neededHours, clockShiftMs } = pinned;
	return {
		spec,
		trace: shifted(trace, clockShiftMs),
		accuracyCelsius,
		placement,
		opening,
		handovers,
		trims,
		neededHours
	};
}

/** The trace with its clock put right. */
export function shifted(trace: Trace, clockShiftMs: number): Trace {
	if (clockShiftMs === 0) return trace;
	return { ...trace, times: trace.times.map((ms) => ms + clockShiftMs) };
}
