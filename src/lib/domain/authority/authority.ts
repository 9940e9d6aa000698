import type { Grade, Outcome, Recommended } from '../receiving/recommendation';

/** Who wants to sign, by what the house lets them do. */
export interface Signer {
	readonly id: string;
	/** QA: decides anything that needs no further person. */
	readonly mayDecide: boolean;
	/** The dock: accepts what nothing speaks against. */
	readonly mayAcceptAtDock: boolean;
}

/** One line as it is about to be decided. */
export interface DecidedLine {
	readonly ordinal: number;
	readonly outcome: Outcome;
	readonly recommended: Recommended | null;
	/** Grades of the rules that fired. */
	readonly grades: readonly Grade[];
	/** An absolute stop (freezing point, food-safety ceiling) was reached. */
	readonly isOverStop: boolean;
	readonly dockMayAccept: boolean;
	readonly valueMinor: number | null;
	readonly currency: string | null;
	readonly severities: readonly string[];
}

/** A change of the evidence that moved what is recommended, and who made it. */
export interface Correction {
	readonly kind: 'trim' | 'clock' | 'handover' | 'papers' | 'pulp' | 'read';
	readonly madeById: string;
	readonly madeBy: string;
}

/** When a decision needs a second signature; null where a rule is not set. */
export interface SecondSignatureRules {
	readonly fromValue: { readonly minor: number; readonly currency: string } | null;
	readonly fromSeverity: 'major' | 'critical' | null;
}

export interface SigningFacts {
	readonly signer: Signer;
	readonly lines: readonly DecidedLine[];
	readonly corrections: readonly Correction[];
	readonly rules: SecondSignatureRules;
	/** Who has signed a review of this very decision on this very evidence. */
	readonly reviewerIds: readonly string[];
	/** A qualified person has written down, on this evidence, what the stop means for the goods. */
	readonly hasDetermination: boolean;
}

/** What is still missing before the signer may sign; the sentence comes from the message catalogue. */
export type Need =
	| {
			readonly code: 'qa-decides';
			readonly why: 'role' | 'not-accept' | 'finding' | 'product' | 'not-known';
			readonly line: number;
	  }
	| { readonly code: 'another-person'; readonly kind: Correction['kind']; readonly madeBy: string }
	| { readonly code: 'determination'; readonly lines: readonly number[] }
	| { readonly code: 'second-signature'; readonly why: 'value' | 'severity' };

const goodsTaken = (line: DecidedLine): boolean => line.outcome === 'accept' || line.outcome === 'conditions';

/** Why a line is not the dock's to accept; null where it is. */
function dockRefusal(line: DecidedLine): 'not-accept' | 'finding' | 'product' | 'not-known' | null {
	if (line.outcome !== 'accept') return 'not-accept';
	if (!line.dockMayAccept) return 'product';
	if (line.recommended === null) return 'not-known';
	const holds = line.grades.some((grade) => grade === 'hold' || grade === 'reject');
	return holds || line.recommended !== 'accept' || line.isOverStop ? 'finding' : null;
}

function roleNeeds({ signer, lines }: SigningFacts): Need[] {
	if (signer.mayDecide) return [];
	const [first] = lines;
	if (!signer.mayAcceptAtDock) return [{ code: 'qa-decides', why: 'role', line: first?.ordinal ?? 1 }];
	return lines.flatMap((line): Need[] => {
		const why = dockRefusal(line);
		return why === null ? [] : [{ code: 'qa-decides', why, line: line.ordinal }];
	});
}

/** Whoever made a correction that moved the recommendation does not judge by it alone. */
function correctionNeeds({ signer, corrections, reviewerIds }: SigningFacts): Need[] {
	const own = corrections.find(({ madeById }) => madeById === signer.id);
	const isSeenByAnother = reviewerIds.some((id) => id !== signer.id);
	return own && !isSeenByAnother ? [{ code: 'another-person', kind: own.kind, madeBy: own.madeBy }] : [];
}

function determinationNeeds({ lines, hasDetermination }: SigningFacts): Need[] {
	const over = lines.filter((line) => line.isOverStop && goodsTaken(line)).map(({ ordinal }) => ordinal);
	return over.length > 0 && !hasDetermination ? [{ code: 'determination', lines: over }] : [];
}

const severityRank = ['minor', 'major', 'critical'];

/** Which rule asks for a second signature on these lines; null when none does. */
export function secondSignatureReason(
	lines: readonly Pick<DecidedLine, 'valueMinor' | 'currency' | 'severities'>[],
	{ fromValue, fromSeverity }: SecondSignatureRules
): 'value' | 'severity' | null {
	const valueMinor = lines
		.filter(({ currency }) => currency === fromValue?.currency)
		.reduce((sum, line) => sum + (line.valueMinor ?? 0), 0);
	if (fromValue !== null && valueMinor >= fromValue.minor) return 'value';
	const least = fromSeverity === null ? Infinity : severityRank.indexOf(fromSeverity);
	const isGrave = lines.some(({ severities }) =>
		severities.some((one) => severityRank.indexOf(one) >= least)
	);
	return isGrave ? 'severity' : null;
}

function secondSignatureNeeds({ signer, lines, rules, reviewerIds }: SigningFacts): Need[] {
	const why = secondSignatureReason(lines, rules);
	return why !== null && !reviewerIds.some((id) => id !== signer.id)
		? [{ code: 'second-signature', why }]
		: [];
}

/**
 * The authority table: the dock accepts what no finding holds and the product permits; everything else is QA's; a
 * correction that moved the recommendation, a high value or a grave excursion needs a second person; goods over an
 * absolute stop are taken only on a qualified person's written determination.
 * @returns what is still missing; empty when the signer may sign
 */
export function signingNeeds(facts: SigningFacts): Need[] {
	return [
		...roleNeeds(facts),
		...correctionNeeds(facts),
		...determinationNeeds(facts),
		...secondSignatureNeeds(facts)
	];
}
