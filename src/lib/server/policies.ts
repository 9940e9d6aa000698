import type { Actor, Context, Role } from './context';
import { Refusal } from './refusals';
import { noteRefusedAct } from './request-scope';

const staff = ['dock', 'qa', 'claims', 'admin'] as const;

/** Who may do what. A role that is not named may not. */
const acts = {
	'shipment.view': ['dock', 'qa', 'claims', 'admin', 'supplier'],
	/** The whole docket with notes, papers and every party; suppliers have a view of their own. */
	'docket.view': staff,
	'shipment.list': staff,
	/** Figures for another program; nothing is looked up or kept. */
	'life.compute': staff,
	'shipment.create': ['dock', 'qa', 'admin'],
	'shipment.change': ['dock', 'qa', 'admin'],
	'arrival.log': ['dock', 'qa'],
	'read.upload': ['dock', 'qa'],
	'read.withdraw': ['qa'],
	/** An answer holds for coming files only when somebody who answers for it says so. */
	'layout.confirm': ['qa', 'admin'],
	/** The rows of an export as text, for holding a figure against; the file itself is `raw-file.open`. */
	'raw-line.view': staff,
	/** A file is read for the caller and nothing is kept. */
	'read.inspect': staff,
	'note.write': staff,
	'photo.add': ['dock', 'qa'],
	'hold.put': ['dock', 'qa'],
	'hold.lift': ['qa'],
	'trim.make': ['qa'],
	'clock.correct': ['qa'],
	'disposition.sign': ['qa'],
	/** Accepting what no finding holds, where the product permits it; the authority table says the rest. */
	'disposition.accept-at-dock': ['dock'],
	'determination.write': staff,
	'report.open': ['dock', 'qa', 'claims', 'admin', 'supplier'],
	'raw-file.open': ['qa', 'claims', 'admin', 'supplier'],
	'load.list': ['supplier'],
	'notice.answer': ['supplier'],
	'claim.view': ['claims', 'qa', 'admin'],
	'claim.work': ['claims'],
	'bundle.take': ['claims', 'qa', 'admin'],
	'catalogue.view': staff,
	'catalogue.change': ['admin'],
	'spec.sign': ['admin'],
	'account.manage': ['admin'],
	'certificate.manage': ['admin'],
	'audit.view': ['qa', 'admin'],
	/** Everything about a docket as one file, for an inspector. */
	'copy.take': ['qa', 'admin'],
	'retention.manage': ['admin'],
	'mailbox.view': staff
} as const satisfies Record<string, readonly Role[]>;

export type Act = keyof typeof acts;

/** Whether one of the actor's roles may do this at all. */
export function may(actor: Actor, act: Act): boolean {
	const allowed: readonly Role[] = acts[act];
	return actor.roles.some((role) => allowed.includes(role));
}

/** What a docket's visibility depends on. */
export interface ShipmentScope {
	id: string;
	siteId: string;
	supplierId: string;
}

/** Whether the docket lies within what the actor sees: own sites, or own loads of one's own firm. */
export function isWithinSight(actor: Actor, shipment: ShipmentScope): boolean {
	if (actor.roles.includes('supplier')) {
		const isOwnLoad = actor.partnerId !== null && actor.partnerId === shipment.supplierId;
		return isOwnLoad && (actor.shipmentId === null || actor.shipmentId === shipment.id);
	}
	return actor.siteIds.includes(shipment.siteId);
}

/** Refuses an act the actor's roles do not allow. */
export function authorize({ actor }: Context, act: Act): void {
	if (may(actor, act)) return;
	noteRefusedAct({ act, why: 'not-allowed', shipmentId: null });
	throw new Refusal('not-allowed');
}

/** Refuses likewise, and a docket out of sight as if it did not exist: a guess learns nothing. */
export function authorizeShipment(
	ctx: Context,
	act: Act,
	shipment: ShipmentScope | null
): asserts shipment is ShipmentScope {
	if (!shipment || !isWithinSight(ctx.actor, shipment)) {
		if (shipment) noteRefusedAct({ act, why: 'out-of-sight', shipmentId: shipment.id });
		throw new Refusal('not-found');
	}
	if (may(ctx.actor, act)) return;
	noteRefusedAct({ act, why: 'not-allowed', shipmentId: shipment.id });
	throw new Refusal('not-allowed');
}
