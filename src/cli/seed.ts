/** Loads the demo into the database of the settings, once; only where the settings say that it is a demo. */
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { demoLoadedAt, loadDemo } from '../lib/server/demo/load-demo';
import { env } from '../lib/server/env';
import { readInPlace } from '../lib/server/reads/run-reader';

try {
	if (!env().isDemo)
		throw new Error('This is not a demo (IS_DEMO is not true): nothing invented is put into it.');
	openDatabase(env().databaseUrl);
	readInPlace();
	const before = await demoLoadedAt();
	if (before) console.log(`The demo was loaded on ${before.slice(0, 10)} already.`);
	else await loadDemo(new Date(), (line) => console.log(line));
	await closeDatabase();
} catch (error) {
	console.error(error instanceof Error ? error.message : error);
	process.exit(1);
}
