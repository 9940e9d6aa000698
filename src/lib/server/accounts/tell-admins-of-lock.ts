import { dayOfYear, time, zoneName } from '../../format-time';
import { lockMailWords } from '../../messages/en/lock-mail';
import { isSystem } from '../context';
import { Organisation } from '../db/models/organisation';
import { Site } from '../db/models/site';
import { User } from '../db/models/user';
import type { Writing } from '../db/transaction';
import { env } from '../env';
import type { JobHandler } from '../jobs/job-kinds';
import { renderMail } from '../mail/layout';
import { sendMail } from '../mail/send-mail';
import { rolesOf } from './load-actor';

/** Writes a mail to every admin as jobs, in the transaction that locks the account. */
export async function tellAdminsOfLock(
	{ transaction, enqueue }: Pick<Writing, 'transaction' | 'enqueue'>,
	locked: User,
	now: Date
): Promise<void> {
	const users = await User.findAll({ where: { switchedOffAt: null }, transaction });
	for (const admin of users.filter((user) => rolesOf(user).includes('admin'))) {
		const payload = { adminId: admin.id, userId: locked.id, lockedAt: now.toISOString() };
		enqueue('lock-mail', payload, `lock ${locked.id} ${now.toISOString()} ${admin.id}`);
	}
}

/** Mails one admin that an account was locked at signing, and where to unlock it. */
export const mailLock: JobHandler = async (ctx, { adminId, userId, lockedAt }) => {
	if (!isSystem(ctx.actor)) throw new Error('Such mails are sent by jobs only.');
	const [admin, locked] = await Promise.all([User.findByPk(adminId ?? ''), User.findByPk(userId ?? '')]);
	if (!admin || admin.switchedOffAt || !locked || !lockedAt) return;
	const organisation = (await Organisation.findOne())?.name ?? 'Wharfinger';
	const zone = (await Site.findOne({ order: [['createdAt', 'asc']] }))?.zone ?? 'UTC';
	const words = lockMailWords({
		organisation,
		admin: admin.name,
		name: locked.name,
		email: locked.email,
		at: `${dayOfYear(lockedAt, zone, 'en')}, ${time(lockedAt, zone)} ${zoneName(lockedAt, zone)}`
	});
	await sendMail({
		to: { name: admin.name, address: admin.email },
		fromName: organisation,
		subject: words.subject,
		...renderMail({
			...words.content,
			button: { ...words.content.button, href: `${env().origin}/settings/users/${locked.id}` }
		}),
		messageId: `<lock-${ctx.requestId}@${new URL(env().origin).hostname}>`
	});
};
