import { assess } from '../../domain/receiving/assess';
import { recommend } from '../../domain/receiving/recommend';
import type { Recommended } from '../../domain/receiving/recommendation';
import { assessInputOf } from '../assessments/assessment-inputs';
import { governingOf, type LineAssessment } from '../assessments/assess-line';
import { findLastBestBefore } from '../assessments/last-date';
import { lineEvidence } from '../assessments/line-evidence';
import { loadEvidence, type DocketEvidence } from '../assessments/load-evidence';
import { parseFigures, type StoredFigures } from '../assessments/stored-figures';
import { AssessmentRow } from '../db/models/assessment-row';
import { LineRecommendation } from '../db/models/line-recommendation';
import type { Shipment } from '../db/models/shipment';
import type { ShipmentLine } from '../db/models/shipment-line';
import { findSpecInForce, findSpecVersion, type SignedSpec } from './find-spec-in-force';
import type { Judgement, Trial, TriedLine } from './try-version';

interface Stored {
	row: AssessmentRow;
	figures: StoredFigures;
}

/** What a batch of dockets is judged again with, loaded once for all of them. */
export interface TrialBatch {
	lineIds: ReadonlySet<string>;
	draft: SignedSpec;
	now: Date;
	/** Current assessments and recommendations of every docket of the batch. */
	rows: readonly AssessmentRow[];
	recommendations: readonly LineRecommendation[];
	/** Versions that assessments pinned, by id. */
	pinned: ReadonlyMap<string, SignedSpec>;
}

/** Loads what the dockets of a batch have in common, or would each ask for alone. */
export async function loadTrialBatch(
	shipmentIds: string[],
	given: Pick<TrialBatch, 'lineIds' | 'draft' | 'now'>
): Promise<TrialBatch> {
	const where = { shipmentId: shipmentIds };
	const rows = await AssessmentRow.findAll({ where: { ...where, isCurrent: true } });
	const recommendations = await LineRecommendation.findAll({ where });
	const pinned = new Map<string, SignedSpec>();
	for (const id of new Set(rows.map(({ specVersionId }) => specVersionId))) {
		const spec = await findSpecVersion(id);
		if (spec) pinned.set(id, spec);
	}
	return { ...given, rows, recommendations, pinned };
}

/** Judges the asked lines of one docket again with a version, from what their stored assessments rest on. */
export async function tryDocket(
	shipment: Shipment,
	batch: TrialBatch
): Promise<Pick<Trial, 'tried' | 'untold' | 'differing'>> {
	const { lineIds, draft, now, rows, recommendations } = batch;
	const evidence = await loadEvidence(shipment);
	const result: Pick<Trial, 'tried' | 'untold' | 'differing'> = { tried: 0, untold: 0, differing: [] };
	for (const line of evidence.lines.filter(({ id }) => lineIds.has(id))) {
		const stored = rows
			.filter(({ lineId }) => lineId === line.id)
			.map((row) => ({ row, figures: parseFigures(row.figures) }));
		const recommended = recommendations.find(({ lineId }) => lineId === line.id)?.recommended;
		const old = await specOfLine(line, stored, shipment, batch);
		const isWhole = stored.every(({ row }) => evidence.traces.some(({ id }) => id === row.traceId));
		if (!recommended || !old || !isWhole) {
			result.untold += 1;
			continue;
		}
		result.tried += 1;
		const found = await tryLine(line, stored, { evidence, old, draft, now, recommended });
		if (found) result.differing.push(found);
	}
	return result;
}

interface Bench {
	evidence: DocketEvidence;
	old: SignedSpec;
	draft: SignedSpec;
	now: Date;
	recommended: Recommended;
}

/** The line if the version changes what is recommended; null if it does not. */
async function tryLine(line: ShipmentLine, stored: Stored[], bench: Bench): Promise<TriedLine | null> {
	const { evidence, old, draft, now, recommended } = bench;
	const isDated = evidence.products.some(
		({ id, isNotOlderThanLast }) => id === line.productId && isNotOlderThanLast
	);
	const lastOn = isDated ? await findLastBestBefore(line, evidence.shipment, now) : null;
	const judge = (spec: SignedSpec) => judged(line, again(line, stored, spec, evidence), spec, bench, lastOn);
	const judgement = judge(draft);
	if (judgement.recommended === recommended) return null;
	// What was found since, such as a calibration that ran out, is not this version's doing.
	if (judge(old).recommended === judgement.recommended) return null;
	const governing = stored.find(({ row }) => row.isGoverning);
	const { shipment, siteZone } = evidence;
	return {
		docket: shipment.number,
		arrivedAt: (shipment.arrivedAt ?? now).toISOString(),
		zone: siteZone,
		line: line.ordinal,
		lot: line.lot,
		specNumber: old.number,
		isSigned: shipment.decidedAt !== null,
		then: {
			recommended,
			remainingHours: governing?.figures.remainingHours ?? null,
			neededHours: governing?.figures.neededHours ?? line.neededHours ?? old.figures.neededHours,
			fullLifeHours: old.figures.fullLifeHours
		},
		now: judgement
	};
}

/** The stored assessments of a line worked out by another version: the same trace, trims, clock and handovers. */
function again(
	line: ShipmentLine,
	stored: readonly Stored[],
	spec: SignedSpec,
	{ traces }: DocketEvidence
): LineAssessment[] {
	return stored.flatMap(({ row, figures: { inputs: pinned, trimmedHours } }) => {
		const trace = traces.find(({ id }) => id === row.traceId);
		if (!trace) return [];
		const inputs = {
			...pinned,
			specVersionId: spec.id,
			specSha256: spec.figuresSha256,
			neededHours: line.neededHours ?? spec.figures.neededHours
		};
		const assessment = assess(assessInputOf(inputs, spec.figures, trace.trace));
		return [{ trace, inputs, assessment, trimmedHours }];
	});
}

function judged(
	line: ShipmentLine,
	assessed: readonly LineAssessment[],
	spec: SignedSpec,
	{ evidence, now }: Bench,
	lastOn: string | null
): Judgement {
	const found = lineEvidence(line, spec, assessed, evidence, now, lastOn);
	return {
		recommended: recommend(found).recommended,
		remainingHours: governingOf(assessed)?.assessment.remainingHours ?? null,
		neededHours: found.neededHours,
		fullLifeHours: spec.figures.fullLifeHours
	};
}

/** The version a line was judged by: the one its assessments pinned, else the one in force when it arrived. */
async function specOfLine(
	line: ShipmentLine,
	stored: readonly Stored[],
	shipment: Shipment,
	{ pinned, now }: TrialBatch
): Promise<SignedSpec | null> {
	const id = stored[0]?.row.specVersionId;
	return id ? (pinned.get(id) ?? null) : findSpecInForce(line, shipment.arrivedAt ?? now);
}
