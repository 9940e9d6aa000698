import { v7 as uuid } from 'uuid';
import { Contact } from '../db/models/contact';
import { LinkSession } from '../db/models/link-session';
import { Notice } from '../db/models/notice';
import { Shipment } from '../db/models/shipment';
import { User } from '../db/models/user';
import { inTransaction } from '../db/transaction';
import type { Context } from '../context';
import type { RequestScope } from '../request-scope';
import { personContext } from './person-context';
import { openSession, type Claims } from './sign-in';
import { findToken, useToken } from './tokens';

const linkSessionMs = 30 * 24 * 3_600_000;

/** Opens the docket-scoped session a notice's link promises, in the transaction that uses the link up. */
async function openLinkSession(secret: string, ctx: Context): Promise<Claims | null> {
	const id = uuid();
	return inTransaction(ctx, async ({ transaction, record }) => {
		const token = await useToken(secret, ['notice'], ctx.now, transaction);
		if (!token?.contactId || !token.shipmentId) return null;
		const contact = await Contact.findByPk(token.contactId, { transaction });
		const shipment = await Shipment.findByPk(token.shipmentId, { transaction });
		if (!contact || contact.switchedOffAt || !shipment) return null;
		await LinkSession.create(
			{
				id,
				contactId: contact.id,
				partnerId: contact.partnerId,
				shipmentId: shipment.id,
				createdAt: ctx.now,
				expiresAt: new Date(ctx.now.getTime() + linkSessionMs)
			},
			{ transaction }
		);
		const chain = { scope: 'shipment', id: shipment.id } as const;
		record('link.used', chain, { kind: 'notice', contactId: contact.id, userId: null });
		if (token.noticeId) {
			await Notice.update(
				{ firstOpenedAt: ctx.now },
				{ where: { id: token.noticeId, firstOpenedAt: null }, transaction }
			);
			record('notice.opened', chain, { noticeId: token.noticeId });
		}
		return { kind: 'link', subjectId: id, tokenVersion: 0 };
	});
}

/** Uses a mailed link up and opens the session it stands for. @returns null when it was used, ran out or is unknown. */
export async function signInByLink(secret: string, scope: RequestScope): Promise<Claims | null> {
	const token = await useToken(secret, ['sign-in'], scope.now);
	if (!token) {
		const contactId = (await findToken(secret))?.contactId;
		return contactId
			? openLinkSession(secret, { ...personContext(scope, 'link', contactId), sessionKind: 'link' })
			: null;
	}
	const user = token.userId ? await User.findByPk(token.userId) : null;
	return user && !user.switchedOffAt ? openSession(user, scope, 'link') : null;
}
