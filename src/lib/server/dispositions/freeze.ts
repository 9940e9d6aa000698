import type { DocketView, FrozenDocket, FrozenSignature, SeriesView } from '../../schemas/docket';
import { engineVersion } from '../../domain/receiving/engine-version';
import { sha256Hex } from '../storage/sha256';
import type { CorrectionView, DeterminationView, ReviewView, SigningStanding } from '../../schemas/signing';
import { decisionSha256 } from '../authority/decision-text';
import type { DispositionInput } from '../../schemas/disposition';
import { outcomeOf, type DecidedLine } from './decide-groups';

type Facts = FrozenDocket['docket'];

function factsOf(docket: DocketView): Facts {
	const { signatures: _s, notices: _n, clocks: _c, claimId: _i, record: _r, stage: _g, ...facts } = docket;
	return facts;
}

/**
 * The facts a decision rests on, as text: what the signer sees hashed, and what must still be so when the signature
 * falls. Earlier outcomes and verdicts are left out: they are what is being decided.
 */
export function evidenceText(docket: DocketView): string {
	const facts = factsOf(docket);
	const lines = facts.lines.map(({ outcome: _o, groups: _p, ...line }) => line);
	return JSON.stringify({ ...facts, lines, verdict: null, hold: null, engineVersion });
}

export function evidenceSha256(docket: DocketView): string {
	return sha256Hex(evidenceText(docket));
}

interface Decision {
	docket: DocketView;
	series: SeriesView[];
	decided: readonly DecidedLine[];
	verdict: DocketView['verdict'];
	signature: FrozenSignature;
	before: SignedBefore;
}

/** What was signed before the decision and belongs to it. */
export interface SignedBefore {
	reviews: ReviewView[];
	determinations: DeterminationView[];
	corrections: CorrectionView[];
}

/** The reviews of this very decision, the determinations of this very evidence, and what moved the recommendation. */
export function signedBefore(
	{ reviews, determinations, corrections }: SigningStanding,
	lines: DispositionInput['lines']
): SignedBefore {
	const decided = decisionSha256(lines);
	return {
		reviews: reviews.filter((review) => review.isOfThis && review.decisionSha256 === decided),
		determinations: determinations.filter(({ isOfThis }) => isOfThis),
		corrections
	};
}

/** The record as it will be kept: facts, outcomes and signature in one text, whose hash the report prints. */
export function freeze({ docket, series, decided, verdict, signature, before }: Decision): {
	text: string;
	sha256: string;
} {
	const facts = factsOf(docket);
	const lines = facts.lines.map((line) => ({
		...line,
		...outcomeOf(decided.find((one) => one.line.id === line.id)?.groups ?? [])
	}));
	const frozen: FrozenDocket = {
		docket: { ...facts, lines, verdict },
		series,
		engineVersion,
		frozenAt: signature.signedAt,
		evidenceSha256: evidenceSha256(docket),
		signature,
		...before
	};
	const text = JSON.stringify(frozen);
	return { text, sha256: sha256Hex(text) };
}
