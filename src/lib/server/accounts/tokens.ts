import { randomBytes } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { Op } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { Token } from '../db/models/token';
import { sha256Hex } from '../storage/sha256';

export type TokenKind = 'sign-in' | 'invitation' | 'notice';

interface TokenSubject {
	kind: TokenKind;
	userId?: string;
	contactId?: string;
	shipmentId?: string;
	noticeId?: string;
	validMs: number;
}

/** A secret for a mail; make it before the transaction, which may run twice. */
export function newSecret(): string {
	return randomBytes(24).toString('base64url');
}

/** Keeps the hash of `secret`; the secret itself exists in the mail only. */
export async function saveToken(
	secret: string,
	subject: TokenSubject,
	now: Date,
	transaction?: Transaction
): Promise<void> {
	await Token.create(
		{
			id: uuid(),
			kind: subject.kind,
			tokenSha256: sha256Hex(secret),
			userId: subject.userId ?? null,
			contactId: subject.contactId ?? null,
			shipmentId: subject.shipmentId ?? null,
			noticeId: subject.noticeId ?? null,
			createdAt: now,
			expiresAt: new Date(now.getTime() + subject.validMs)
		},
		{ transaction }
	);
}

/** The token as it stands, used or not; null when there is none of that secret. */
export function findToken(secret: string): Promise<Token | null> {
	return Token.findOne({ where: { tokenSha256: sha256Hex(secret) } });
}

/** Uses a token up. One update decides, so of many at once only one gets it. @returns null when used, run out or unknown. */
export async function useToken(
	secret: string,
	kinds: readonly TokenKind[],
	now: Date,
	transaction?: Transaction
): Promise<Token | null> {
	const tokenSha256 = sha256Hex(secret);
	const [used] = await Token.update(
		{ usedAt: now },
		{
			where: { tokenSha256, kind: { [Op.in]: [...kinds] }, usedAt: null, expiresAt: { [Op.gt]: now } },
			transaction
		}
	);
	return used === 1 ? Token.findOne({ where: { tokenSha256 }, transaction }) : null;
}
