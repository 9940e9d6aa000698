/** Brings the schema to the newest version: DATABASE_OWNER_URL migrates, DATABASE_URL gets its grants. */
import { migrate } from '../lib/server/db/migrate';
import { env } from '../lib/server/env';

try {
	const ran = await migrate(env().databaseOwnerUrl, env().databaseUrl);
	console.log(ran.length === 0 ? 'The schema is up to date.' : `Ran ${ran.length} migrations.`);
} catch (error) {
	console.error(error instanceof Error ? error.message : error);
	process.exit(1);
}
