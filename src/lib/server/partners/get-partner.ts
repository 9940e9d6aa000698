import type { Context } from '../context';
import { Contact } from '../db/models/contact';
import { Partner } from '../db/models/partner';
import { Shipment } from '../db/models/shipment';
import { Op } from 'sequelize';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { contactView, partnerView, type ContactView, type PartnerView } from './views';

export interface PartnerRecord extends PartnerView {
	contacts: ContactView[];
	/** Dockets at the reader's own sites that name this firm. */
	dockets: number;
}

/** One firm with its people. @throws Refusal `not-found`, `not-allowed` */
export async function getPartner(ctx: Context, partnerId: string): Promise<PartnerRecord> {
	authorize(ctx, 'catalogue.view');
	const partner = await Partner.findByPk(partnerId);
	if (!partner) throw new Refusal('not-found');
	const contacts = await Contact.findAll({ where: { partnerId }, order: [['name', 'asc']] });
	const dockets = await Shipment.count({
		where: {
			siteId: [...ctx.actor.siteIds],
			[Op.or]: [{ supplierId: partnerId }, { carrierId: partnerId }]
		}
	});
	return { ...partnerView(partner), contacts: contacts.map(contactView), dockets };
}
