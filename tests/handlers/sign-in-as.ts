import { v7 as uuid } from 'uuid';
import { newSecret, saveToken } from '../../src/lib/server/accounts/tokens';
import type { User } from '../../src/lib/server/db/models/user';
import { testPassword } from '../helpers/factories';
import { Visitor, type Product } from '../helpers/product';

/** A visitor who has signed in: with the password, or, as suppliers do, with a mailed link. */
export async function signInAs({ address }: Product, user: User): Promise<Visitor> {
	const visitor = new Visitor(address);
	if (user.passwordHash) {
		await visitor.post('/sign-in?/signIn', { email: user.email, password: testPassword });
		return visitor;
	}
	const secret = newSecret();
	await saveToken(secret, { kind: 'sign-in', userId: user.id, validMs: 600_000 }, new Date());
	await visitor.post(`/link/${secret}?/use`, { id: uuid() });
	return visitor;
}
