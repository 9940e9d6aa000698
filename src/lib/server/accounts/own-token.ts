import type { ApiTokenForm } from '../../schemas/api-token';
import type { Context } from '../context';
import { User } from '../db/models/user';
import { Refusal } from '../refusals';
import { makeApiToken, newApiSecret } from './api-tokens';
import { isPassword } from './password';
import { isWithinLimit } from './rate-limit';

const guesses = { attempts: 10, windowMs: 15 * 60_000 };

/**
 * Makes a token for the actor's own account, by password: whoever finds a screen unlocked gets no key from it.
 * @returns the secret, which is kept nowhere and so shown this once
 * @throws Refusal `wrong-password`, `too-many-attempts`, `not-allowed`
 */
export async function makeOwnToken(ctx: Context, { name, password }: ApiTokenForm): Promise<string> {
	const user = ctx.actor.kind === 'user' ? await User.findByPk(ctx.actor.id) : null;
	if (!user?.passwordHash) throw new Refusal('not-allowed', 'Only an account with a password has tokens.');
	if (!(await isWithinLimit(`password of ${user.id}`, guesses, ctx.now)))
		throw new Refusal('too-many-attempts');
	if (!(await isPassword(password, user.passwordHash)))
		throw new Refusal('wrong-password', 'That is not your password. No token was made.');
	const secret = newApiSecret();
	await makeApiToken(ctx, user.email, secret, name);
	return secret;
}
