import { getDocket } from '$lib/server/dockets/get-docket';
import { may } from '$lib/server/policies';
import { contextOf, orError } from '$lib/server/request';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, depends }) => {
	depends('app:docket');
	const ctx = contextOf(locals);
	const docket = await orError(getDocket(ctx, params.docket));

	return {
		docket,
		may: {
			sign: may(ctx.actor, 'disposition.sign'),
			log: may(ctx.actor, 'arrival.log'),
			hold: may(ctx.actor, 'hold.put'),
			lift: may(ctx.actor, 'hold.lift'),
			upload: may(ctx.actor, 'read.upload'),
			trim: may(ctx.actor, 'trim.make'),
			claim: may(ctx.actor, 'claim.work')
		},
		back: { href: '/arrivals', word: docket.number.split('-').at(-1) ?? '', title: docket.title }
	};
};
