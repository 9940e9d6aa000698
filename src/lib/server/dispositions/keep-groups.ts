import { v7 as uuid } from 'uuid';
import type { DocketView } from '../../schemas/docket';
import type { Context } from '../context';
import { DispositionLine } from '../db/models/disposition-line';
import { Hold } from '../db/models/hold';
import { LineGroup } from '../db/models/line-group';
import type { Writing } from '../db/transaction';
import { heldOf, type DecidedLine } from './decide-groups';

function placeRow(lineId: string, ordinal: number, group: DecidedLine['groups'][number]) {
	const { name = '', whereabouts, place, cases, pallets } = group;
	return {
		...{ id: uuid(), lineId, ordinal, name, cases, pallets },
		whereabouts: whereabouts ?? 'dock',
		place: place ?? ''
	};
}

/** Writes the signed outcomes, one row a group, and where each group of goods now is. */
export async function keepGroups(
	{ transaction }: Writing,
	docket: DocketView,
	dispositionId: string,
	decided: readonly DecidedLine[]
): Promise<void> {
	await LineGroup.destroy({ where: { lineId: decided.map(({ line }) => line.id) }, transaction });
	for (const { line, groups } of decided) {
		const assessment = docket.assessments.find((one) => one.lineId === line.id && one.isGoverning);
		for (const [index, group] of groups.entries()) {
			const { outcome, cases, pallets, reason, condition: conditionText } = group;
			await DispositionLine.create(
				{
					...{ id: uuid(), dispositionId, lineId: line.id, ordinal: index + 1, name: group.name ?? '' },
					...{ outcome, cases, pallets, reason, conditionText },
					conditionKind: group.conditionKind ?? null,
					whereabouts: group.whereabouts ?? null,
					place: group.place ?? null,
					awaited: group.awaited ?? null,
					untilAt: group.untilAt ? new Date(group.untilAt) : null,
					assessmentId: assessment?.id ?? null
				},
				{ transaction }
			);
			await LineGroup.create(placeRow(line.id, index + 1, group), { transaction });
		}
	}
}

/** Ends the open hold and, for the groups that are held, opens the one that says what is awaited and until when. */
export async function renewHold(
	{ transaction, record }: Writing,
	ctx: Context,
	shipmentId: string,
	decided: readonly DecidedLine[],
	holdId: string
): Promise<void> {
	await Hold.update(
		{ liftedAt: ctx.now, liftedBy: ctx.actor.id },
		{ where: { shipmentId, liftedAt: null }, transaction }
	);
	const held = heldOf(decided);
	if (!held) return;
	await Hold.create(
		{ id: holdId, shipmentId, putBy: ctx.actor.id, putAt: ctx.now, liftedBy: null, liftedAt: null, ...held },
		{ transaction }
	);
	const { reason, awaited, untilAt } = held;
	record(
		'hold.put',
		{ scope: 'shipment', id: shipmentId },
		{ reason, awaited, untilAt: untilAt?.toISOString() ?? null }
	);
}
