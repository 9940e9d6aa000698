import type { Contact } from '../db/models/contact';
import type { Partner } from '../db/models/partner';
import { partnerDuties, type PartnerDuty } from '../../schemas/partner';
import { revisionOf } from '../catalogue/revision';

/** What the forms change, and what the audit trail keeps of a change. */
export function partnerFields(partner: Partner) {
	const { name, isSupplier, isCarrier, isStore, isCustomer, gln, address, countryCode, note } = partner;
	return { name, isSupplier, isCarrier, isStore, isCustomer, gln, address, countryCode, note };
}

export function contactFields(contact: Contact) {
	const { name, email, phone, duty, isNotified } = contact;
	return { name, email, phone, duty, isNotified };
}

const dutyColumns = {
	supplier: 'isSupplier',
	carrier: 'isCarrier',
	store: 'isStore',
	customer: 'isCustomer'
} as const satisfies Record<PartnerDuty, keyof Partner>;

export function dutyColumn(duty: PartnerDuty): (typeof dutyColumns)[PartnerDuty] {
	return dutyColumns[duty];
}

export interface ContactView extends ReturnType<typeof contactFields> {
	id: string;
	switchedOffAt: string | null;
	revision: string;
}

export function contactView(contact: Contact): ContactView {
	const fields = contactFields(contact);
	return {
		id: contact.id,
		...fields,
		switchedOffAt: contact.switchedOffAt?.toISOString() ?? null,
		revision: revisionOf(fields)
	};
}

export interface PartnerView extends ReturnType<typeof partnerFields> {
	id: string;
	duties: PartnerDuty[];
	createdAt: string;
	switchedOffAt: string | null;
	revision: string;
}

export function partnerView(partner: Partner): PartnerView {
	const fields = partnerFields(partner);
	return {
		id: partner.id,
		...fields,
		duties: partnerDuties.filter((duty) => partner[dutyColumns[duty]]),
		createdAt: partner.createdAt.toISOString(),
		switchedOffAt: partner.switchedOffAt?.toISOString() ?? null,
		revision: revisionOf(fields)
	};
}
