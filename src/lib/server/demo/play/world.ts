import { v7 as uuid } from 'uuid';
import type { Actor, Context } from '../../context';
import type { Staff } from '../cast/open-sites';

/** Everything the loads are played with. */
export interface World extends Omit<Staff, 'addOutsiders'> {
	anchor: Date;
	partnerIds: ReadonlyMap<string, string>;
	productIds: ReadonlyMap<string, string>;
}

/** Something somebody did at a moment; all of the demo's are done in the order of time. */
export interface Step {
	atMs: number;
	act: () => Promise<void>;
}

function contextFor(actor: Actor, atMs: number): Context {
	return { actor, now: new Date(atMs), requestId: `demo-${uuid().slice(-12)}`, address: '127.0.0.1' };
}

/** The context of one of the staff at a moment of the past. */
export function contextOf(world: World, person: string, atMs: number): Context {
	return contextFor(known(world.actors, person), atMs);
}

/** The context of a contact who came by the link of a notice. */
export function linkContext(
	contact: { id: string; name: string; email: string; duty: string; partnerId: string },
	shipmentId: string,
	atMs: number
): Context {
	const { id, name, email, duty: title, partnerId } = contact;
	const actor: Actor = {
		...{ kind: 'link', id, name, title, email, partnerId, shipmentId },
		roles: ['supplier'],
		siteIds: [],
		temperatureUnit: null
	};
	return contextFor(actor, atMs);
}

/** What stands under a key; a key that is nowhere is a slip of the pen in the demo's own lists. */
export function known<Value>(map: ReadonlyMap<string, Value>, key: string): Value {
	const found = map.get(key);
	if (found === undefined) throw new Error(`The demo speaks of ${key}, which it does not have.`);
	return found;
}
