import { redirect } from '@sveltejs/kit';
import { contextOf } from '$lib/server/request';
import type { PageServerLoad } from './$types';

/** The root leads each role to its day's work. */
export const load: PageServerLoad = ({ locals }) => {
	const { actor } = contextOf(locals);
	if (actor.roles.includes('supplier'))
		redirect(303, actor.shipmentId ? `/loads/${actor.shipmentId}` : '/loads');
	const [role] = actor.roles.length === 1 ? actor.roles : [];
	redirect(303, role === 'claims' ? '/claims' : role === 'qa' ? '/shipments/waiting' : '/arrivals');
};
