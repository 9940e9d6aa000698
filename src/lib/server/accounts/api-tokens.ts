import { randomBytes } from 'node:crypto';
import { Op } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { ApiTokenView } from '../../schemas/api-token';
import type { Actor, Context } from '../context';
import { ApiToken } from '../db/models/api-token';
import { User } from '../db/models/user';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import type { RequestScope } from '../request-scope';
import { sha256Hex } from '../storage/sha256';
import { actorOfUser, rolesOf } from './load-actor';

/** Marks the secret as ours where it is found in a log or a repository. */
const prefix = 'whf_';

/** A use is noted once in this time: a busy program must not write a row at every call. */
const notedEveryMs = 60_000;

/** The secret of a new token; make it before the transaction, which may run twice. */
export function newApiSecret(): string {
	return prefix + randomBytes(30).toString('base64url');
}

/**
 * Makes a token for the user of an address; only its hash is kept.
 * @throws Refusal `not-found`, `switched-off`, `not-allowed` for suppliers, who come by mailed links
 */
export async function makeApiToken(
	ctx: Context,
	email: string,
	secret: string,
	name = ''
): Promise<{ id: string }> {
	const id = uuid();
	await inTransaction(ctx, async ({ transaction, record }) => {
		const user = await User.findOne({ where: { email: email.trim().toLowerCase() }, transaction });
		if (!user) throw new Refusal('not-found', `Nobody has an account under ${email}.`);
		if (user.switchedOffAt) throw new Refusal('switched-off');
		if (rolesOf(user).includes('supplier'))
			throw new Refusal('not-allowed', 'Suppliers have no tokens: they come by mailed links.');
		await ApiToken.create(
			{ id, userId: user.id, tokenSha256: sha256Hex(secret), createdAt: ctx.now, name },
			{ transaction }
		);
		record('account.token-made', { scope: 'account', id: user.id }, { userId: user.id, tokenId: id, name });
	});
	return { id };
}

/** Who a token speaks for, as of now; null where it is unknown or revoked, or its user is switched off. */
export async function findTokenActor(secret: string, { now }: RequestScope): Promise<Actor | null> {
	const token = await ApiToken.findOne({ where: { tokenSha256: sha256Hex(secret), revokedAt: null } });
	const user = token && (await User.findByPk(token.userId));
	if (!token || !user || user.switchedOffAt || user.lockedAt) return null;
	const stale = new Date(now.getTime() - notedEveryMs);
	if (!token.lastUsedAt || token.lastUsedAt < stale)
		await ApiToken.update(
			{ lastUsedAt: now },
			{ where: { id: token.id, lastUsedAt: { [Op.or]: [null, { [Op.lt]: stale }] } } }
		);
	return actorOfUser(user);
}

/** The actor's own tokens that still work, the newest first. */
export async function listApiTokens({ actor }: Context): Promise<{ items: ApiTokenView[]; total: number }> {
	const tokens =
		actor.kind === 'user'
			? await ApiToken.findAll({
					where: { userId: actor.id, revokedAt: null },
					order: [['createdAt', 'DESC']]
				})
			: [];
	const items = tokens.map(({ id, name, createdAt, lastUsedAt }) => ({
		id,
		name,
		createdAt: createdAt.toISOString(),
		lastUsedAt: lastUsedAt?.toISOString() ?? null
	}));
	return { items, total: items.length };
}

/** Ends one of the actor's own tokens at once; a second time changes nothing. @throws Refusal `not-found` */
export async function revokeApiToken(ctx: Context, tokenId: string): Promise<void> {
	const userId = ctx.actor.id;
	await inTransaction(ctx, async ({ transaction, record }) => {
		const token = await ApiToken.findOne({
			where: { id: tokenId, userId },
			transaction,
			lock: transaction.LOCK.UPDATE
		});
		if (!token || ctx.actor.kind !== 'user') throw new Refusal('not-found');
		if (token.revokedAt) return;
		await token.update({ revokedAt: ctx.now }, { transaction });
		record('account.token-revoked', { scope: 'account', id: userId }, { userId, tokenId });
	});
}
