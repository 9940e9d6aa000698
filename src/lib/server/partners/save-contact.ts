import { v7 as uuid } from 'uuid';
import type { ContactForm } from '../../schemas/partner';
import { orDuplicate } from '../catalogue/duplicate';
import { organisationChain } from '../catalogue/organisation-chain';
import { assertUnchanged } from '../catalogue/revision';
import type { Context } from '../context';
import { Contact } from '../db/models/contact';
import { LinkSession } from '../db/models/link-session';
import { Partner } from '../db/models/partner';
import { Token } from '../db/models/token';
import { inTransaction, type Writing } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { contactFields } from './views';

const taken = 'This firm has a contact with that e-mail address already.';

async function lockContact({ transaction }: Writing, partnerId: string, contactId: string): Promise<Contact> {
	const contact = await Contact.findOne({
		where: { id: contactId, partnerId },
		transaction,
		lock: transaction.LOCK.UPDATE
	});
	if (!contact) throw new Refusal('not-found');
	return contact;
}

async function recordChange(
	{ transaction, record }: Writing,
	contact: Contact,
	before: Record<string, unknown> | null,
	after: Record<string, unknown>
): Promise<void> {
	const { id: contactId, partnerId } = contact;
	record('contact.saved', await organisationChain(transaction), { contactId, partnerId, before, after });
}

/** Adds a person to a firm, or changes one. @throws Refusal `not-found`, `not-allowed`, `duplicate`, `changed-meanwhile` */
export async function saveContact(ctx: Context, partnerId: string, form: ContactForm): Promise<void> {
	authorize(ctx, 'catalogue.change');
	const { contactId, revision, ...fields } = form;
	const newId = uuid();
	const writing = inTransaction(ctx, async (w) => {
		const { transaction } = w;
		if (contactId) {
			const contact = await lockContact(w, partnerId, contactId);
			const before = contactFields(contact);
			assertUnchanged(revision, before);
			// A link belongs to whoever reads that mailbox: with another address the old one's links end.
			if (contact.email !== fields.email) await endLinks(ctx, w, contact.id);
			await contact.update(fields, { transaction });
			return recordChange(w, contact, before, contactFields(contact));
		}
		if (!(await Partner.findByPk(partnerId, { transaction }))) throw new Refusal('not-found');
		const contact = await Contact.create({ id: newId, partnerId, ...fields }, { transaction });
		return recordChange(w, contact, null, contactFields(contact));
	});
	await orDuplicate(writing, taken);
}

async function endLinks({ now }: Context, { transaction }: Writing, contactId: string): Promise<void> {
	await LinkSession.update({ revokedAt: now }, { where: { contactId, revokedAt: null }, transaction });
	await Token.update({ usedAt: now }, { where: { contactId, usedAt: null }, transaction });
}

/** Ends a person's mails and links, or lets them begin again. @throws Refusal `not-found`, `not-allowed` */
export async function switchContact(
	ctx: Context,
	partnerId: string,
	contactId: string,
	isOn: boolean
): Promise<void> {
	authorize(ctx, 'catalogue.change');
	await inTransaction(ctx, async (w) => {
		const contact = await lockContact(w, partnerId, contactId);
		if ((contact.switchedOffAt === null) === isOn) return;
		await contact.update({ switchedOffAt: isOn ? null : ctx.now }, { transaction: w.transaction });
		if (!isOn) await endLinks(ctx, w, contactId);
		await recordChange(w, contact, { isInUse: !isOn }, { isInUse: isOn });
	});
}
