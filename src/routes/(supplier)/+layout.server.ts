import { contextOf } from '$lib/server/request';
import type { LayoutServerLoad } from './$types';

export const load: LayoutServerLoad = ({ locals }) => {
	const { actor, now } = contextOf(locals);
	return { viewer: { name: actor.name, isLink: actor.kind === 'link' }, nowAt: now.toISOString() };
};
