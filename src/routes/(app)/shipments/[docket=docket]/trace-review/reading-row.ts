import type { Assessment, Excursion } from '$lib/domain/receiving/assessment';
import type { AssessedBasis } from '$lib/schemas/trace-basis';
import { leftAt, type WholeTrace } from './whole-trace';

/** Why a reading does not count; `counted` if it does, `not-assessed` where nothing was. */
export type Counting = 'counted' | 'trimmed' | 'before-custody' | 'after-custody' | 'not-assessed';

/** A reading with all that the table says of it. */
export interface ReadingRow {
	ms: number;
	celsius: number;
	counting: Counting;
	/** Ordinal of its leg and who held it. */
	leg: { ordinal: number; holder: string } | null;
	/** Since the first reading that counts, h at the reference temperature. */
	usedHours: number | null;
	leftHours: number | null;
	/** Place among the excursions as the docket numbers them, from 1. */
	excursion: { number: number; kind: Excursion['kind']; severity: Excursion['severity'] } | null;
	/** Minutes without a reading just before this one. */
	gapMinutes: number | null;
}

/** What a trace was assessed to. */
export interface Assessed {
	assessment: Assessment;
	basis: AssessedBasis;
}

export function readingRow(whole: WholeTrace, assessed: Assessed | null, index: number): ReadingRow {
	const ms = whole.trace.times[index] ?? 0;
	const bare = { ms, celsius: whole.celsius[index] ?? 0 };
	if (!assessed) return { ...bare, ...nothing, counting: 'not-assessed' };
	const { assessment, basis } = assessed;
	const left = leftAt(assessment, basis, ms);
	if (!left) return { ...bare, ...nothing, counting: whyNot(assessed, ms) };
	const gap = assessment.gaps.find(({ toMs }) => toMs === ms);
	return {
		...bare,
		counting: 'counted',
		leg: legAt(assessment, ms),
		usedHours: left.usedHours,
		leftHours: left.value,
		excursion: excursionAt(assessment, ms),
		gapMinutes: gap ? (gap.toMs - gap.fromMs) / 60_000 : null
	};
}

const nothing = { leg: null, usedHours: null, leftHours: null, excursion: null, gapMinutes: null };

function whyNot({ assessment, basis }: Assessed, ms: number): Counting {
	if (basis.trims.some(({ fromMs, toMs }) => ms >= fromMs && ms <= toMs)) return 'trimmed';
	return ms < assessment.windowFromMs ? 'before-custody' : 'after-custody';
}

/** A handover's instant belongs to the leg it begins; the last one's to the leg it ends. */
function legAt({ legs }: Assessment, ms: number): ReadingRow['leg'] {
	const leg =
		legs.find(({ fromMs, toMs }) => fromMs <= ms && ms < toMs) ?? legs.find(({ toMs }) => toMs === ms);
	return leg ? { ordinal: leg.ordinal, holder: leg.holder } : null;
}

function excursionAt({ excursions }: Assessment, ms: number): ReadingRow['excursion'] {
	const at = excursions.findIndex(({ fromMs, toMs }) => fromMs <= ms && ms <= toMs);
	const found = excursions[at];
	return found ? { number: at + 1, kind: found.kind, severity: found.severity } : null;
}
