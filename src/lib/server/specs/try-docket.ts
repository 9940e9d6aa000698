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

/** Judges the asked lines of one docket again with a version, from what their stored assessments rest on. */
export async function tryDocket(
	shipment: Shipment,
	lineIds: ReadonlySet<string>,
	draft: SignedSpec,
	now: Date
): Promise<Pick<Trial, 'tried' | 'untold' | 'differing'>> {
	const evidence = await loadEvidence(shipment);
	const where = { shipmentId: shipment.id };
	const rows = await AssessmentRow.findAll({ where: { ...where, isCurrent: true } });
	const recommendations = await LineRecommendation.findAll({ where });
	const result: Pick<Trial, 'tried' | 'untold' | 'differing'> = { tried: 0, untold: 0, differing: [] };
	for (const line of evidence.lines.filter(({ id }) => lineIds.has(id))) {
		const stored = rows
			.filter(({ lineId }) => lineId === line.id)
			.map((row) => ({ row, figures: parseFigures(row.figures) }));
		const recommended = recommendations.find(({ lineId }) => lineId === line.id)?.recommended;
		const old = await specOfLine(line, stored, shipment, now);
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
	const lastOn = await findLastBestBefore(line, evidence.shipment, now);
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
	const isDated = evidence.products.some(
		({ id, isNotOlderThanLast }) => id === line.productId && isNotOlderThanLast
	);
	const found = lineEvidence(line, spec, assessed, evidence, now, isDated ? lastOn : null);
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
	now: Date
): Promise<SignedSpec | null> {
	const pinned = stored[0]?.row.specVersionId;
	return pinned ? findSpecVersion(pinned) : findSpecInForce(line, shipment.arrivedAt ?? now);
}
