import { partQuantities } from '../../domain/receiving/quantities';
import type { BoardLife, BoardRow } from '../../schemas/board';
import type { Actor } from '../context';
import type { AssessmentRow } from '../db/models/assessment-row';
import type { ExcursionRow } from '../db/models/excursion-row';
import type { Shipment } from '../db/models/shipment';
import type { BoardFacts } from './board-facts';
import { nextAct } from './next-act';
import { stageOf } from './stage-of';

const severities = ['minor', 'major', 'critical'];

/** The line whose low is nearest to its need, or furthest below it, is the one that decides. */
function shortest(assessments: readonly AssessmentRow[]): AssessmentRow | null {
	const room = (row: AssessmentRow) => row.remainingLowHours - row.neededHours;
	return assessments.reduce<AssessmentRow | null>(
		(least, row) => (least === null || room(row) < room(least) ? row : least),
		null
	);
}

function gravest(excursions: readonly ExcursionRow[]): ExcursionRow | null {
	const weight = (row: ExcursionRow) => severities.indexOf(row.severity);
	return excursions.reduce<ExcursionRow | null>(
		(worst, row) =>
			worst === null ||
			weight(row) > weight(worst) ||
			(weight(row) === weight(worst) && row.costHours > worst.costHours)
				? row
				: worst,
		null
	);
}

function goodsOf(shipment: Shipment, facts: BoardFacts): BoardRow['goods'] {
	const lines = facts.lines.get(shipment.id) ?? [];
	const products = lines.map((line) => facts.products.get(line.productId));
	const names = [...new Set(products.map((product) => product?.name ?? ''))];
	return {
		product: names.length > 2 ? `${names[0]} and ${names.length - 1} more` : names.join(' and '),
		lots: lines.length,
		cases: lines.reduce((sum, line) => sum + (line.casesReceived ?? line.casesAdvised), 0),
		unit: products[0]?.countUnit ?? 'case'
	};
}

function readsOf(shipment: Shipment, facts: BoardFacts) {
	const reads = facts.reads.get(shipment.id) ?? [];
	const questions = reads.filter((read) => read.state === 'question');
	const kept = reads.filter((read) => read.keptAt !== null && read.state === 'ok').length;
	const trips = (facts.trips.get(shipment.id) ?? []).filter((trip) =>
		['expected', 'found'].includes(trip.status)
	);
	return {
		questions,
		reads: { due: Math.max(trips.length, kept), kept, questions: questions.length }
	};
}

function findingOf(
	questions: readonly { fileName: string }[],
	life: BoardLife | null,
	worst: ExcursionRow | null
): BoardRow['finding'] {
	if (questions[0]) return { kind: 'question', fileName: questions[0].fileName };
	if (worst && worst.severity !== 'minor') {
		const { ordinal, severity, extremeCelsius } = worst;
		return { kind: 'excursion', ordinal, severity, extremeCelsius };
	}
	const isShort = life !== null && life.lowHours < life.neededHours;
	return isShort ? { kind: 'short', lowHours: life.lowHours, neededHours: life.neededHours } : null;
}

/** One load as the board shows it to this person. */
export function boardRow(actor: Actor, shipment: Shipment, facts: BoardFacts): BoardRow {
	const { id, number, version, verdict, vehicle, dock } = shipment;
	const assessments = facts.assessments.get(id) ?? [];
	const least = shortest(assessments);
	const life = least && {
		hours: least.remainingHours,
		lowHours: least.remainingLowHours,
		highHours: least.remainingHighHours,
		neededHours: least.neededHours,
		fullHours: facts.fullHours.get(least.specVersionId) ?? least.remainingHighHours
	};
	const { reads, questions } = readsOf(shipment, facts);
	const worst = gravest(assessments.flatMap((row) => facts.excursions.get(row.id) ?? []));
	const signed = facts.dispositions.get(id)?.at(-1);
	const clock = facts.clocks.get(id)?.[0];
	const stage = stageOf({ ...shipment.get(), isHeld: facts.holds.has(id) });
	return {
		...{ id, number, version, stage, verdict, vehicle, dock, reads, life },
		dueAt: shipment.dueAt?.toISOString() ?? null,
		arrivedAt: shipment.arrivedAt?.toISOString() ?? null,
		supplier: facts.partners.get(shipment.supplierId) ?? '',
		carrier: shipment.carrierId === null ? null : (facts.partners.get(shipment.carrierId) ?? null),
		goods: goodsOf(shipment, facts),
		finding: findingOf(questions, life, worst),
		rejectBy:
			clock && stage !== 'done'
				? { startsAt: clock.startsAt.toISOString(), deadlineAt: clock.deadlineAt.toISOString() }
				: null,
		decided: signed ? { by: signed.signedName, at: signed.signedAt.toISOString() } : null,
		part:
			signed && verdict === 'part'
				? partQuantities((facts.outcomes.get(signed.id) ?? []).map((outcome) => ({ outcome })))
				: null,
		next: nextAct(actor, {
			...{ number, stage, reads },
			questionIds: questions.map((read) => read.id),
			isAskedOfQa: questions.some((read) => read.askedQaAt !== null)
		})
	};
}
