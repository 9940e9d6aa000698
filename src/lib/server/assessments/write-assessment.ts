import { v7 as uuid } from 'uuid';
import type { Transaction } from 'sequelize';
import { AssessmentRow } from '../db/models/assessment-row';
import { ExcursionRow } from '../db/models/excursion-row';
import { LegUseRow } from '../db/models/leg-use-row';
import { inputsSha256 } from './assessment-inputs';
import type { LineAssessment } from './assess-line';
import { figuresText } from './stored-figures';

interface Place {
	shipmentId: string;
	lineId: string;
	isGoverning: boolean;
	madeAt: Date;
}

/** Writes one assessment with its excursions and legs; one that rests on the same inputs stands as it is. */
export async function writeAssessment(
	{ trace, inputs, assessment, trimmedHours }: LineAssessment,
	{ shipmentId, lineId, isGoverning, madeAt }: Place,
	transaction: Transaction
): Promise<string> {
	const hash = inputsSha256(inputs);
	const where = { lineId, traceId: trace.id, inputsSha256: hash, isCurrent: true };
	const standing = await AssessmentRow.findOne({ where, transaction });
	if (standing) {
		if (standing.isGoverning !== isGoverning) await standing.update({ isGoverning }, { transaction });
		return standing.id;
	}
	const { remainingHours } = assessment;
	const row = await AssessmentRow.create(
		{
			id: uuid(),
			shipmentId,
			lineId,
			traceId: trace.id,
			specVersionId: inputs.specVersionId,
			engineVersion: assessment.engineVersion,
			inputsSha256: hash,
			figures: figuresText(assessment, inputs, trimmedHours),
			remainingHours: remainingHours.value,
			remainingLowHours: remainingHours.low,
			remainingHighHours: remainingHours.high,
			neededHours: assessment.neededHours,
			isGoverning,
			isCurrent: true,
			madeAt
		},
		{ transaction }
	);
	await writeParts(row.id, { trace, inputs, assessment, trimmedHours }, transaction);
	return row.id;
}

async function writeParts(
	assessmentId: string,
	{ assessment }: LineAssessment,
	transaction: Transaction
): Promise<void> {
	await ExcursionRow.bulkCreate(
		assessment.excursions.map((excursion, index) => ({
			id: uuid(),
			assessmentId,
			ordinal: index + 1,
			kind: excursion.kind,
			severity: excursion.severity,
			fromAt: new Date(excursion.fromMs),
			toAt: new Date(excursion.toMs),
			extremeCelsius: excursion.extremeCelsius,
			costHours: excursion.costHours
		})),
		{ transaction }
	);
	await LegUseRow.bulkCreate(
		assessment.legs.map((leg) => ({
			id: uuid(),
			assessmentId,
			handoverId: leg.handoverId,
			ordinal: leg.ordinal,
			allowedHours: leg.allowedHours,
			usedHours: leg.usedHours,
			tooWarmHours: leg.tooWarmHours,
			tooLateHours: leg.tooLateHours
		})),
		{ transaction }
	);
}
