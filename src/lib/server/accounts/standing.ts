import { Op } from 'sequelize';
import type { AccountRole } from '../../schemas/account';
import { Partner } from '../db/models/partner';
import { Site } from '../db/models/site';
import { User } from '../db/models/user';
import { UserSite } from '../db/models/user-site';
import type { Writing } from '../db/transaction';
import { Refusal } from '../refusals';
import { rolesOf } from './load-actor';

/** Refuses sites or a firm that are not there. @throws Refusal `not-found` */
export async function assertPlaces(
	{ transaction }: Writing,
	siteIds: readonly string[],
	partnerId: string | null
): Promise<void> {
	const ids = [...new Set(siteIds)];
	if ((await Site.count({ where: { id: ids }, transaction })) !== ids.length)
		throw new Refusal('not-found', 'One of those sites is not there any more. Choose again.');
	if (partnerId && !(await Partner.findByPk(partnerId, { transaction })))
		throw new Refusal('not-found', 'That firm is not among the partners any more. Choose again.');
}

/** Makes these the sites somebody works at, and no others. */
export async function setSites(
	{ transaction }: Writing,
	userId: string,
	siteIds: readonly string[]
): Promise<void> {
	await UserSite.destroy({ where: { userId, siteId: { [Op.notIn]: [...siteIds] } }, transaction });
	const known = await UserSite.findAll({ where: { userId }, transaction });
	const have = new Set(known.map(({ siteId }) => siteId));
	for (const siteId of new Set(siteIds))
		if (!have.has(siteId)) await UserSite.create({ userId, siteId }, { transaction });
}

/**
 * Refuses to leave nobody who can manage accounts. Locks every account in one order, so that of two admins who
 * demote each other at once only one succeeds. @throws Refusal `last-admin`
 */
export async function assertAdminRemains(
	{ transaction }: Writing,
	changedId: string,
	rolesAfter: readonly AccountRole[] | null
): Promise<void> {
	const users = await User.findAll({
		where: { switchedOffAt: null },
		order: ['id'],
		transaction,
		lock: transaction.LOCK.UPDATE
	});
	const isAdmin = (user: User) => rolesOf(user).includes('admin') && user.passwordHash !== null;
	const changed = users.find(({ id }) => id === changedId);
	if (!changed || !isAdmin(changed) || rolesAfter?.includes('admin')) return;
	if (!users.some((user) => user.id !== changedId && isAdmin(user) && !user.lockedAt))
		throw new Refusal('last-admin');
}
