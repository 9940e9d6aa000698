/** `npm run token -- --email <user>`: makes a token by which another program acts as that user, and prints it once. */
import { parseArgs } from 'node:util';
import { makeApiToken, newApiSecret } from '../lib/server/accounts/api-tokens';
import { systemContext } from '../lib/server/context';
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { env } from '../lib/server/env';

const usage = 'Say whose: npm run token -- --email qa@wharfinger.example';

function emailOf(): string {
	try {
		const { email } = parseArgs({ options: { email: { type: 'string' } } }).values;
		if (email?.includes('@')) return email;
	} catch {
		// An unknown option is answered as a missing one is.
	}
	process.stderr.write(`${usage}\n`);
	process.exit(2);
}

const email = emailOf();
openDatabase(env().databaseUrl);
try {
	const secret = newApiSecret();
	await makeApiToken(systemContext(new Date(), 'token'), email, secret);
	process.stderr.write('The token is shown this once; it can be revoked under Settings.\n');
	process.stdout.write(`${secret}\n`);
} catch (error) {
	process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
	process.exitCode = 1;
} finally {
	await closeDatabase();
}
