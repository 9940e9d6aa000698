import { Op } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { engineVersion } from '../../domain/receiving/engine-version';
import { recommend } from '../../domain/receiving/recommend';
import type { Recommendation } from '../../domain/receiving/recommendation';
import type { Context } from '../context';
import { AssessmentRow } from '../db/models/assessment-row';
import { Disposition } from '../db/models/disposition';
import { LineRecommendation } from '../db/models/line-recommendation';
import { Shipment } from '../db/models/shipment';
import type { ShipmentLine } from '../db/models/shipment-line';
import type { Writing } from '../db/transaction';
import { Refusal } from '../refusals';
import { findLastBestBefore } from './last-date';
import { inputsSha256 } from './assessment-inputs';
import { assessLine, governingOf, type LineAssessment } from './assess-line';
import { lineEvidence } from './line-evidence';
import { loadEvidence, type DocketEvidence } from './load-evidence';
import { findSpecInForce } from '../specs/find-spec-in-force';
import { writeAssessment } from './write-assessment';

interface JudgedLine {
	line: ShipmentLine;
	assessed: LineAssessment[];
	/** Null without a spec in force: nothing can be recommended then. */
	recommendation: Recommendation | null;
}

/**
 * Works a docket's assessments and recommendations out again from what is known now, in the transaction of whatever
 * changed. @throws Refusal `already-signed`: a signed docket keeps what was signed.
 */
export async function reassess(w: Writing, ctx: Context, shipmentId: string): Promise<void> {
	const { transaction } = w;
	const shipment = await Shipment.findByPk(shipmentId, { transaction, lock: transaction.LOCK.UPDATE });
	if (!shipment) throw new Refusal('not-found');
	const signed = await Disposition.count({ where: { shipmentId }, transaction });
	if (signed > 0 || shipment.decidedAt) throw new Refusal('already-signed');

	const evidence = await loadEvidence(shipment, transaction);
	const judged: JudgedLine[] = [];
	for (const line of evidence.lines) judged.push(await judge(line, evidence, ctx, w));

	const current: string[] = [];
	for (const one of judged) {
		current.push(...(await writeLine(one, ctx, w)));
		await writeRecommendation(one, ctx, w);
	}
	const isPast = { shipmentId, isCurrent: true, id: { [Op.notIn]: current } };
	await AssessmentRow.update({ isCurrent: false, isGoverning: false }, { where: isPast, transaction });
	w.record('assessment.made', { scope: 'shipment', id: shipmentId }, entryOf(judged));
}

async function judge(
	line: ShipmentLine,
	evidence: DocketEvidence,
	ctx: Context,
	{ transaction }: Writing
): Promise<JudgedLine> {
	const spec = await findSpecInForce(line, evidence.shipment.arrivedAt ?? ctx.now, transaction);
	if (!spec) return { line, assessed: [], recommendation: null };
	const assessed = assessLine(line, spec, evidence);
	const isDated = evidence.products.some(
		({ id, isNotOlderThanLast }) => id === line.productId && isNotOlderThanLast
	);
	const lastOn = isDated ? await findLastBestBefore(line, evidence.shipment, ctx.now, transaction) : null;
	const found = lineEvidence(line, spec, assessed, evidence, ctx.now, lastOn);
	return { line, assessed, recommendation: recommend(found) };
}

async function writeLine(
	{ line, assessed }: JudgedLine,
	ctx: Context,
	{ transaction }: Writing
): Promise<string[]> {
	const governing = governingOf(assessed);
	const ids: string[] = [];
	for (const one of assessed) {
		const isGoverning = one === governing;
		const place = { shipmentId: line.shipmentId, lineId: line.id, isGoverning, madeAt: ctx.now };
		ids.push(await writeAssessment(one, place, transaction));
	}
	return ids;
}

async function writeRecommendation(
	{ line, recommendation }: JudgedLine,
	ctx: Context,
	{ transaction }: Writing
): Promise<void> {
	await LineRecommendation.destroy({ where: { lineId: line.id }, transaction });
	if (!recommendation) return;
	await LineRecommendation.create(
		{
			id: uuid(),
			shipmentId: line.shipmentId,
			lineId: line.id,
			recommended: recommendation.recommended,
			reasons: JSON.stringify(recommendation.reasons),
			madeAt: ctx.now
		},
		{ transaction }
	);
}

function entryOf(judged: readonly JudgedLine[]) {
	return {
		engineVersion,
		assessments: judged.flatMap(({ line, assessed }) =>
			assessed.map(({ trace, inputs, assessment }) => ({
				lineId: line.id,
				traceId: trace.id,
				inputsSha256: inputsSha256(inputs),
				remainingHours: assessment.remainingHours.value,
				remainingLowHours: assessment.remainingHours.low
			}))
		),
		recommended: Object.fromEntries(
			judged.flatMap(({ line, recommendation }) =>
				recommendation ? [[line.id, recommendation.recommended]] : []
			)
		)
	};
}
