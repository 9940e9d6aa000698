import { redirect } from '@sveltejs/kit';
import { contextOf } from '$lib/server/request';
import type { PageServerLoad } from './$types';

/** The root leads each role to its day's work. */
export const load: PageServerLoad = ({ locals }) => {
	const { actor } = contextOf(locals);
	if (actor.roles.includes('supplier'))
		redirect(303, actor.shipmentId ? `/loads/${actor.shipmentId}` : '/loads');
	redirect(303, actor.roles.includes('claims') && actor.roles.length === 1 ? '/claims' : '/arrivals');
};
