/** Writes a backup into the folder given; `backup.mjs` starts it where the product runs. */
import { BackupFault } from '../lib/server/backups/manifest';
import { makeBackup } from '../lib/server/backups/make-backup';
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { env } from '../lib/server/env';

const [folder = ''] = process.argv.slice(2);
openDatabase(env().databaseUrl);
try {
	const { parts, checkpoint } = await makeBackup(folder, new Date());
	const bytes = parts.reduce((sum, part) => sum + part.bytes, 0);
	console.log(`${folder}: ${parts.length} parts, ${(bytes / 1e6).toFixed(1)} MB`);
	if (checkpoint) console.log(`Write this down elsewhere: checkpoint ${checkpoint.seq}:${checkpoint.sha256}`);
	console.log('It holds the keys that seal reports. Keep it as you keep those.');
} catch (error) {
	if (!(error instanceof BackupFault)) throw error;
	console.error(error.message);
	process.exitCode = 1;
} finally {
	await closeDatabase();
}
