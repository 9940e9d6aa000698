import { v7 as uuid } from 'uuid';
import { systemContext } from '../context';
import { Organisation } from '../db/models/organisation';
import { Site } from '../db/models/site';
import { User } from '../db/models/user';
import { UserSite } from '../db/models/user-site';
import { inTransaction } from '../db/transaction';

interface FirstAdmin {
	userId: string;
	email: string;
	name: string;
	organisation: string;
	countryCode: string;
	zone: string;
	now: Date;
}

/** Sets up an empty installation: the organisation, a first site to be filled in, and its first admin. */
export async function createFirstAdmin(first: FirstAdmin): Promise<void> {
	const { userId, email, name, now } = first;
	const [organisationId, siteId] = [uuid(), uuid()];
	if (await User.count({ where: { email: email.toLowerCase() } }))
		throw new Error(`${email} has an account already. Invite others from Settings, Users.`);
	await inTransaction(systemContext(now, 'create-admin'), async ({ transaction, record }) => {
		const organisation =
			(await Organisation.findOne({ transaction })) ??
			(await Organisation.create(
				{ id: organisationId, name: first.organisation, countryCode: first.countryCode, createdAt: now },
				{ transaction }
			));
		const site =
			(await Site.findOne({ transaction })) ??
			(await Site.create(
				{
					id: siteId,
					organisationId: organisation.id,
					code: 'A',
					name: first.organisation,
					address: '',
					zone: first.zone,
					temperatureUnit: 'celsius',
					pageSize: 'a4',
					currency: 'EUR',
					opening: {},
					docks: ['Dock 1'],
					createdAt: now
				},
				{ transaction }
			));
		await User.create(
			{
				id: userId,
				email: email.toLowerCase(),
				name,
				title: 'Quality manager',
				roles: ['admin'],
				createdAt: now,
				invitedAt: now
			},
			{ transaction }
		);
		await UserSite.create({ userId, siteId: site.id }, { transaction });
		record('account.invited', { scope: 'account', id: userId }, { userId, email, roles: ['admin'] });
	});
}
