import type { Transaction } from 'sequelize';
import { z } from 'zod';
import { AssessmentRow } from '../db/models/assessment-row';
import { LineRecommendation } from '../db/models/line-recommendation';

const standing = z.record(z.string(), z.object({ recommended: z.string(), lowHours: z.number().nullable() }));
const moved = z.object({ before: standing, after: standing });

/** What is recommended for each line, and on which low figure. */
export type Standing = z.output<typeof standing>;
export type MovedRecommendation = z.output<typeof moved>;

/** What stands recommended on a docket now. */
export async function standingOf(shipmentId: string, transaction: Transaction): Promise<Standing> {
	const where = { shipmentId };
	const recommendations = await LineRecommendation.findAll({ where, transaction });
	const governing = await AssessmentRow.findAll({
		where: { ...where, isCurrent: true, isGoverning: true },
		attributes: ['lineId', 'remainingLowHours'],
		transaction
	});
	return Object.fromEntries(
		recommendations.map(({ lineId, recommended }) => [
			lineId,
			{ recommended, lowHours: governing.find((row) => row.lineId === lineId)?.remainingLowHours ?? null }
		])
	);
}

/** Both standings as they are kept beside the correction that moved one to the other; null when it moved nothing. */
export function movedText(before: Standing, after: Standing): string | null {
	const ids = new Set([...Object.keys(before), ...Object.keys(after)]);
	const isSame = [...ids].every((id) => before[id]?.recommended === after[id]?.recommended);
	return isSame ? null : JSON.stringify({ before, after });
}

export function parseMoved(text: string): MovedRecommendation {
	return moved.parse(JSON.parse(text));
}
