/** Reads every kept report again and checks its bytes and its seal: `npm run reports:verify`. */
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { env } from '../lib/server/env';
import { checkKeptReports } from '../lib/server/reports/check-kept-reports';

openDatabase(env().databaseUrl);
let checked = 0;
let faulty = 0;
for await (const { fileName, reportId, fault } of checkKeptReports()) {
	checked++;
	if (fault === null) continue;
	faulty++;
	console.error(`${fileName} (${reportId}): ${fault}`);
}
await closeDatabase();
console.log(`${checked} reports checked, ${faulty} faulty`);
process.exitCode = faulty > 0 ? 1 : 0;
