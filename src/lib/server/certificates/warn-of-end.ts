import { Certificate } from '../db/models/certificate';
import { User } from '../db/models/user';
import { rolesOf } from '../accounts/load-actor';
import type { Context } from '../context';
import { inTransaction } from '../db/transaction';
import { findCurrentCertificate } from './register';

/** So long before a certificate ends its admins hear of it: time to order the next. */
export const warnDaysAhead = 60;
const dayMs = 86_400_000;

/** Tells every admin by mail, once per certificate, that the one in use ends within sixty days. @returns whether it did */
export async function warnOfEnd(ctx: Context): Promise<boolean> {
	const current = await findCurrentCertificate();
	if (!current || current.warnedAt) return false;
	if (current.validUntil.getTime() - ctx.now.getTime() >= warnDaysAhead * dayMs) return false;
	const people = await User.findAll({ where: { switchedOffAt: null } });
	const admins = people.filter((person) => rolesOf(person).includes('admin'));
	return inTransaction(ctx, async ({ transaction, record, enqueue }) => {
		const locked = await Certificate.findByPk(current.id, {
			transaction,
			lock: transaction.LOCK.UPDATE,
			rejectOnEmpty: true
		});
		if (locked.warnedAt || locked.retiredAt) return false;
		await locked.update({ warnedAt: ctx.now }, { transaction });
		record(
			'certificate.ending',
			{ scope: 'organisation', id: locked.organisationId },
			{ certificateId: locked.id, validUntil: locked.validUntil.toISOString(), told: admins.length }
		);
		for (const { id } of admins)
			enqueue(
				'certificate-ending',
				{ certificateId: locked.id, userId: id },
				`certificate ${locked.id} ends, tell ${id}`
			);
		return true;
	});
}
