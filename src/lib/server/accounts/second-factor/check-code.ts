import { Secret, TOTP } from 'otpauth';
import { Op } from 'sequelize';
import { User } from '../../db/models/user';
import { Refusal } from '../../refusals';
import { isWithinLimit } from '../rate-limit';
import { openSecret } from './sealed-secret';

/** RFC 6238 with the values every authenticator knows: SHA-1, six digits, thirty seconds. */
export const periodSeconds = 30;
/** A phone's clock may be this many periods off. */
const stepsOff = 1;
const guesses = { attempts: 8, windowMs: 15 * 60_000 };

export function totpOf(secret: string, label: string): TOTP {
	return new TOTP({
		issuer: 'Wharfinger',
		label,
		secret: Secret.fromBase32(secret),
		algorithm: 'SHA1',
		digits: 6,
		period: periodSeconds
	});
}

/** The step a code belongs to, near `now`; null when it belongs to none. */
export function stepOfCode(secret: string, code: string, now: Date): number | null {
	const token = code.replace(/\s/g, '');
	if (!/^\d{6}$/.test(token)) return null;
	const offset = totpOf(secret, '').validate({ token, timestamp: now.getTime(), window: stepsOff });
	return offset === null ? null : Math.floor(now.getTime() / 1000 / periodSeconds) + offset;
}

/** Whether the account asks for a code at all. */
export function hasSecondFactor(user: User): boolean {
	return user.secondFactorSealed !== null && user.secondFactorSince !== null;
}

/**
 * Holds a code against the account's second factor and uses it up: the same code does not open twice.
 * @throws Refusal `code-needed`, `wrong-code`, `too-many-attempts`
 */
export async function useCode(user: User, code: string | null, now: Date): Promise<void> {
	if (!user.secondFactorSealed || !user.secondFactorSince) return;
	if (!code) throw new Refusal('code-needed');
	if (!(await isWithinLimit(`code of ${user.id}`, guesses, now))) throw new Refusal('too-many-attempts');
	const step = stepOfCode(openSecret(user.secondFactorSealed), code, now);
	if (step === null) throw new Refusal('wrong-code');
	const isNewer = { [Op.or]: [{ secondFactorStep: null }, { secondFactorStep: { [Op.lt]: step } }] };
	const [used] = await User.update({ secondFactorStep: step }, { where: { id: user.id, ...isNewer } });
	if (used === 0) throw new Refusal('wrong-code', 'This code has been used. Wait for the next one.');
}
