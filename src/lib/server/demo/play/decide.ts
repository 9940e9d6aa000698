import type { DocketLineView, DocketView } from '../../../schemas/docket';
import type { DispositionInput } from '../../../schemas/disposition';
import { demoPassword } from '../cast/people';
import type { Context } from '../../context';
import { evidenceSha256 } from '../../dispositions/freeze';
import { signDisposition } from '../../dispositions/sign-disposition';
import { getDocket } from '../../dockets/get-docket';
import type { LoadPlan } from '../loads/load';

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

function departs(docket: DocketView, lines: DispositionInput['lines']): boolean {
	return docket.lines.some((line, at) => {
		const recommended = line.recommendation?.recommended ?? 'accept';
		return lines[at]?.outcome !== recommended;
	});
}

/** Decides as QA would, by the recommendation unless the plan says otherwise, and signs. */
export async function decide(ctx: Context, number: string, plan: Decided): Promise<void> {
	const docket = await getDocket(ctx, number);
	const lines = docket.lines.map((line, at) => lineDecision(line, at, plan));
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
