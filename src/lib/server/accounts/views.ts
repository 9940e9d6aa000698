import type { User } from '../db/models/user';
import { rolesOf } from './load-actor';
import { revisionOf } from '../catalogue/revision';
import type { Role } from '../context';
import { hasSecondFactor } from './second-factor/check-code';

/** What an admin's form changes, and what the audit trail keeps of a change. */
export interface AccountFields extends Record<string, unknown> {
	name: string;
	title: string;
	roles: Role[];
	siteIds: string[];
	partnerId: string | null;
	isQualifiedPerson: boolean;
}

export function accountFields(user: User, siteIds: readonly string[]): AccountFields {
	const { name, title, partnerId, isQualifiedPerson } = user;
	return { name, title, roles: rolesOf(user), siteIds: [...siteIds].sort(), partnerId, isQualifiedPerson };
}

export type AccountState = 'active' | 'invited' | 'locked' | 'off';

/** Off counts before locked, locked before invited: each needs another act of an admin. */
export function stateOf(user: User): AccountState {
	if (user.switchedOffAt) return 'off';
	if (user.lockedAt) return 'locked';
	const hasSignedIn = user.passwordHash !== null || user.lastSignInAt !== null;
	return hasSignedIn ? 'active' : 'invited';
}

export interface AccountView extends AccountFields {
	id: string;
	email: string;
	state: AccountState;
	hasSecondFactor: boolean;
	siteNames: string[];
	partnerName: string | null;
	invitedAt: string | null;
	lastSignInAt: string | null;
	revision: string;
}

export function accountView(
	user: User,
	sites: readonly { id: string; name: string }[],
	partnerName: string | null
): AccountView {
	const fields = accountFields(
		user,
		sites.map(({ id }) => id)
	);
	return {
		id: user.id,
		email: user.email,
		...fields,
		state: stateOf(user),
		hasSecondFactor: hasSecondFactor(user),
		siteNames: sites.map(({ name }) => name).sort(),
		partnerName,
		invitedAt: user.invitedAt?.toISOString() ?? null,
		lastSignInAt: user.lastSignInAt?.toISOString() ?? null,
		revision: revisionOf(fields)
	};
}
