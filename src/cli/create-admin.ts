/** Invites the first admin of an installation: prints a link with which they set their password. */
import { v7 as uuid } from 'uuid';
import { newSecret, saveToken } from '../lib/server/accounts/tokens';
import { createFirstAdmin } from '../lib/server/accounts/create-first-admin';
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { env } from '../lib/server/env';

const [email, name, organisation = 'Our organisation', countryCode = 'NL', zone = 'Europe/Amsterdam'] =
	process.argv.slice(2);
if (!email?.includes('@') || !name || !/^[A-Z]{2}$/.test(countryCode)) {
	console.error(
		'Say who: npm run create-admin -- you@example.org "Your Name" "Your Organisation" NL Europe/Amsterdam'
	);
	process.exit(1);
}
openDatabase(env().databaseUrl);
try {
	const now = new Date();
	const userId = uuid();
	await createFirstAdmin({ userId, email, name, organisation, countryCode, zone, now });
	const secret = newSecret();
	await saveToken(secret, { kind: 'invitation', userId, validMs: 24 * 3_600_000 }, now);
	console.log(`Open within a day and set a password:\n${env().origin}/invitation/${secret}`);
} catch (error) {
	console.error(error instanceof Error ? error.message : error);
	process.exitCode = 1;
} finally {
	await closeDatabase();
}
