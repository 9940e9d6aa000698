import { systemContext } from '../context';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import type { RequestScope } from '../request-scope';
import { isWithinLimit } from './rate-limit';
import { findToken } from './tokens';

const quarterHourMs = 15 * 60_000;
const perAddress = { attempts: 20, windowMs: quarterHourMs };
const perSubject = { attempts: 3, windowMs: quarterHourMs };

async function ask(subject: string, payload: Record<string, unknown>, scope: RequestScope): Promise<void> {
	const isAllowed =
		(await isWithinLimit(`link from ${scope.address}`, perAddress, scope.now)) &&
		(await isWithinLimit(`link for ${subject}`.slice(0, 160), perSubject, scope.now));
	if (!isAllowed) throw new Refusal('too-many-attempts');
	const ctx = { ...systemContext(scope.now, scope.requestId), address: scope.address };
	await inTransaction(ctx, async ({ enqueue }) => enqueue('mail-link', payload));
}

/**
 * Has a link mailed to a supplier's address. Who that is, is looked up by the job only: known and unknown addresses
 * get the same answer in the same time. @throws Refusal `too-many-attempts`
 */
export async function requestLink(email: string, scope: RequestScope): Promise<void> {
	await ask(email, { kind: 'sign-in', email }, scope);
}

/** Mails the owner of a used, run-out or forwarded link a fresh one. @throws Refusal `not-found`, `too-many-attempts` */
export async function requestFreshLink(secret: string, scope: RequestScope): Promise<void> {
	const token = await findToken(secret);
	if (!token || token.kind === 'invitation') throw new Refusal('not-found');
	const { kind, userId, contactId, shipmentId, noticeId } = token;
	const subject = Object.fromEntries(
		Object.entries({ userId, contactId, shipmentId, noticeId }).filter(([, id]) => id !== null)
	);
	await ask(userId ?? contactId ?? token.id, { kind, ...subject }, scope);
}
