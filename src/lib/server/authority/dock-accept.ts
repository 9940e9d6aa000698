import { signingNeeds, type Need } from '../../domain/authority/authority';
import type { DocketView } from '../../schemas/docket';
import type { Context } from '../context';
import { may } from '../policies';
import { signingFacts, signingStanding } from './signing-standing';

/** What speaks against the actor's accepting the whole load as it came in; empty when nothing does. */
export async function dockAcceptNeeds(ctx: Context, docket: DocketView): Promise<Need[]> {
	const lines = docket.lines.map(({ id }) => ({
		lineId: id,
		outcome: 'accept' as const,
		condition: null,
		reason: null
	}));
	return signingNeeds(signingFacts(ctx, await signingStanding(ctx, docket), lines));
}

/** Whether the dock may accept this load by itself: it stands at the door, and the authority table asks nothing more. */
export async function mayAcceptAtDock(ctx: Context, docket: DocketView): Promise<boolean> {
	if (!may(ctx.actor, 'disposition.accept-at-dock') || docket.stage !== 'at-the-door') return false;
	return (await dockAcceptNeeds(ctx, docket)).length === 0;
}
