import { Contact } from '../db/models/contact';
import { LinkSession } from '../db/models/link-session';
import { User } from '../db/models/user';
import { UserSite } from '../db/models/user-site';
import { roles, type Actor, type Role } from '../context';
import type { Claims } from './sign-in';

/** Reads the roles column; what is not a role is not one. */
export function rolesOf(user: User): Role[] {
	const kept: unknown[] = Array.isArray(user.roles) ? user.roles : [];
	return roles.filter((role) => kept.includes(role));
}

async function loadUser({ subjectId, tokenVersion, sessionId }: Claims): Promise<Actor | null> {
	const user = await User.findByPk(subjectId);
	// A raised version ends every session opened before: after switching off, a new password, changed roles.
	if (!user || user.switchedOffAt || user.tokenVersion !== tokenVersion) return null;
	return actorOfUser(user, sessionId);
}

/** A user as an actor, with the sites they work at now; a program that acts for them has no session. */
export async function actorOfUser(user: User, sessionId: string | null = null): Promise<Actor> {
	const sites = await UserSite.findAll({ where: { userId: user.id } });
	return {
		kind: 'user',
		id: user.id,
		name: user.name,
		title: user.title,
		email: user.email,
		roles: rolesOf(user),
		siteIds: sites.map((site) => site.siteId),
		partnerId: user.partnerId,
		shipmentId: null,
		temperatureUnit: user.temperatureUnit,
		sessionId
	};
}

async function loadLink({ subjectId }: Claims, now: Date): Promise<Actor | null> {
	const session = await LinkSession.findByPk(subjectId);
	if (!session || session.revokedAt || session.expiresAt <= now) return null;
	const contact = await Contact.findByPk(session.contactId);
	if (!contact || contact.switchedOffAt) return null;
	return {
		kind: 'link',
		id: contact.id,
		name: contact.name,
		title: contact.duty,
		email: contact.email,
		roles: ['supplier'],
		siteIds: [],
		partnerId: session.partnerId,
		shipmentId: session.shipmentId,
		temperatureUnit: null
	};
}

/** Who a session's claims speak of, as of now; null once the session has ended. */
export function loadActor(claims: Claims, now: Date): Promise<Actor | null> {
	return claims.kind === 'link' ? loadLink(claims, now) : loadUser(claims);
}
