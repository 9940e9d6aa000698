import { v7 as uuid } from 'uuid';
import { msPerMinute } from '../../../domain/units';
import { loadActor } from '../../accounts/load-actor';
import { hashPassword } from '../../accounts/password';
import { systemContext, type Actor } from '../../context';
import { Organisation } from '../../db/models/organisation';
import { User } from '../../db/models/user';
import { UserSite } from '../../db/models/user-site';
import { inTransaction } from '../../db/transaction';
import { addSite } from '../../sites/save-site';
import { admin, demoPassword, people, type DemoPerson } from './people';
import { organisationName, sites, type SiteKey } from './sites';

interface Entry {
	passwordHash: string;
	siteIds: readonly string[];
	partnerId: string | null;
	at: Date;
}

/** An account as if its invitation had been accepted: without the mails, which would reach nobody. */
async function addPerson(
	person: DemoPerson,
	{ passwordHash, siteIds, partnerId, at }: Entry
): Promise<string> {
	const id = uuid();
	const { email, name, title, roles, isQualifiedPerson = false } = person;
	const hasPassword = !person.isInvited && !roles.includes('supplier');
	await inTransaction(systemContext(at, 'demo-people'), async ({ transaction, record }) => {
		await User.create(
			{
				...{ id, email, name, title, roles, partnerId, isQualifiedPerson },
				passwordHash: hasPassword ? passwordHash : null,
				createdAt: at,
				invitedAt: at
			},
			{ transaction }
		);
		for (const siteId of siteIds) await UserSite.create({ userId: id, siteId }, { transaction });
		const chain = { scope: 'account', id } as const;
		record('account.invited', chain, { userId: id, email, roles });
		if (hasPassword) record('account.password-set', chain, { userId: id });
	});
	return id;
}

async function actorOf(userId: string, at: Date): Promise<Actor> {
	const actor = await loadActor({ kind: 'user', subjectId: userId, tokenVersion: 0 }, at);
	if (!actor) throw new Error('Somebody of the demo cannot sign in.');
	return actor;
}

/** The people of the demo by their keys, and the sites they work at. */
export interface Staff {
	actors: Map<string, Actor>;
	siteIds: Record<SiteKey, string>;
	/** Adds those who belong to a firm, once the firms are there. */
	addOutsiders(partnerIds: ReadonlyMap<string, string>): Promise<void>;
}

/** Founds the organisation with its two sites and the people who work there. */
export async function openSites(at: Date): Promise<Staff> {
	await Organisation.create({ id: uuid(), name: organisationName, countryCode: 'NL', createdAt: at });
	// One hash for all: the password is one and printed on the sign-in page.
	const passwordHash = await hashPassword(demoPassword);
	const entry = { passwordHash, siteIds: [] as string[], partnerId: null, at };
	const adminId = await addPerson(admin, entry);
	const founder = { ...systemContext(at, 'demo-sites'), actor: await actorOf(adminId, at) };
	// The older site is the one people see first.
	const later = { ...founder, now: new Date(at.getTime() + 10 * msPerMinute) };
	const siteIds = { PS: await addSite(founder, sites.PS), HM: await addSite(later, sites.HM) };

	const actors = new Map([[admin.key, await actorOf(adminId, at)]]);
	for (const person of people.filter(({ partner }) => !partner)) {
		const id = await addPerson(person, { ...entry, siteIds: [siteIds.PS, siteIds.HM] });
		actors.set(person.key, await actorOf(id, at));
	}
	return {
		actors,
		siteIds,
		async addOutsiders(partnerIds) {
			for (const person of people.filter(({ partner }) => partner))
				await addPerson(person, { ...entry, partnerId: partnerIds.get(person.partner ?? '') ?? null });
		}
	};
}
