import { Contact } from '../db/models/contact';
import { Notice } from '../db/models/notice';
import { Shipment } from '../db/models/shipment';
import { User } from '../db/models/user';
import { rolesOf } from './load-actor';
import type { LinkMailKind } from '../../messages/en/link-mails';

/** Who gets a mailed link, and what it opens. */
export interface LinkRecipient {
	kind: LinkMailKind;
	name: string;
	email: string;
	userId: string | null;
	contactId: string | null;
	partnerId: string | null;
	shipment: Shipment | null;
	noticeId: string | null;
}

function ofUser(kind: LinkMailKind, user: User | null): LinkRecipient | null {
	if (!user || user.switchedOffAt) return null;
	// A link signs suppliers in; for staff it would go round the password.
	if (kind !== 'invitation' && !rolesOf(user).includes('supplier')) return null;
	const { id: userId, name, email, partnerId } = user;
	return { kind, name, email, userId, contactId: null, partnerId, shipment: null, noticeId: null };
}

async function ofContact(
	contact: Contact | null,
	shipmentId: string | null,
	noticeId: string | null
): Promise<LinkRecipient | null> {
	if (!contact || contact.switchedOffAt || !shipmentId) return null;
	const shipment = await Shipment.findByPk(shipmentId);
	if (!shipment || shipment.supplierId !== contact.partnerId) return null;
	const { id: contactId, name, email, partnerId } = contact;
	return { kind: 'notice', name, email, userId: null, contactId, partnerId, shipment, noticeId };
}

/** A supplier's user of that address; else a listed contact, for the docket they were last written to about. */
async function ofAddress(email: string): Promise<LinkRecipient | null> {
	const user = ofUser('sign-in', await User.findOne({ where: { email } }));
	if (user) return user;
	const contacts = await Contact.findAll({ where: { email, switchedOffAt: null } });
	const notice = await Notice.findOne({
		where: { contactId: contacts.map(({ id }) => id) },
		order: [['createdAt', 'desc']]
	});
	const contact = contacts.find(({ id }) => id === notice?.contactId) ?? null;
	return ofContact(contact, notice?.shipmentId ?? null, notice?.id ?? null);
}

/** Reads a `mail-link` job; null where there is nobody to write to any more. */
export async function findLinkRecipient(payload: Record<string, string>): Promise<LinkRecipient | null> {
	const { kind, userId, contactId, email } = payload;
	if (kind === 'notice')
		return ofContact(
			contactId ? await Contact.findByPk(contactId) : null,
			payload.shipmentId ?? null,
			payload.noticeId ?? null
		);
	if (kind === 'sign-in' && email) return ofAddress(email);
	if (kind === 'sign-in' || kind === 'welcome' || kind === 'invitation')
		return ofUser(kind, userId ? await User.findByPk(userId) : null);
	throw new Error(`There is no mailed link of the kind ${kind}.`);
}
