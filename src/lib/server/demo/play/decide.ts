import { msPerHour } from '../../../domain/units';
import type { DocketLineView, DocketView } from '../../../schemas/docket';
import type { DispositionInput } from '../../../schemas/disposition';
import { demoPassword } from '../cast/people';
import type { Context } from '../../context';
import { evidenceSha256 } from '../../dispositions/freeze';
import { signDisposition } from '../../dispositions/sign-disposition';
import { getDocket } from '../../dockets/get-docket';
import type { LoadPlan, PlannedGroup } from '../loads/load';

type Decided = NonNullable<LoadPlan['decided']>;

const usualCondition = 'Ship first.';

function lineDecision(line: DocketLineView, at: number, plan: Decided): DispositionInput['lines'][number] {
	const recommended = line.recommendation?.recommended ?? 'accept';
	const outcome = plan.outcomes?.[at] ?? (recommended === 'hold' ? 'conditions' : recommended);
	return {
		lineId: line.id,
		outcome,
		condition: outcome === 'conditions' ? (plan.condition ?? usualCondition) : null,
		reason: outcome === 'reject' ? (plan.reasons ?? 'No life for the order is left.') : null
	};
}

/** A line by its groups; cases go with the pallets, and the last group takes what is left over. */
function groupDecisions(
	line: DocketLineView,
	groups: readonly PlannedGroup[],
	now: Date
): DispositionInput['lines'] {
	const received = line.casesReceived ?? line.casesAdvised;
	const perPallet = Math.floor(received / Math.max(1, line.pallets));
	const before = groups.slice(0, -1).reduce((sum, { pallets }) => sum + pallets * perPallet, 0);
	return groups.map(({ name, pallets, outcome, words, awaited, whereabouts, place }, at) => ({
		...{ lineId: line.id, outcome, name, pallets },
		cases: at === groups.length - 1 ? received - before : pallets * perPallet,
		condition: outcome === 'conditions' ? (words ?? usualCondition) : null,
		reason: outcome === 'reject' || outcome === 'hold' ? (words ?? null) : null,
		...(awaited && {
			awaited: awaited.what,
			until: new Date(now.getTime() + awaited.hours * msPerHour).toISOString()
		}),
		...(whereabouts && { whereabouts }),
		...(place && { place })
	}));
}

function departs(docket: DocketView, lines: DispositionInput['lines']): boolean {
	return lines.some(({ lineId, outcome }) => {
		const line = docket.lines.find(({ id }) => id === lineId);
		return outcome !== (line?.recommendation?.recommended ?? 'accept');
	});
}

/** Decides as QA would, by the recommendation unless the plan says otherwise, and signs. */
export async function decide(ctx: Context, number: string, plan: Decided): Promise<void> {
	const docket = await getDocket(ctx, number);
	const lines = docket.lines.flatMap((line, at) =>
		plan.groups && at === 0 ? groupDecisions(line, plan.groups, ctx.now) : [lineDecision(line, at, plan)]
	);
	const usual = departs(docket, lines) ? 'Looked at with the evidence; the goods are as the pulp says.' : '';
	await signDisposition(ctx, number, {
		lines,
		reasons: plan.reasons ?? usual,
		meaning: 'approval',
		password: demoPassword,
		evidenceSha256: evidenceSha256(docket),
		amendmentReason: null,
		notify: plan.notify ?? false
	});
}
