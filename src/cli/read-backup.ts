/** Restores the backup in the folder given, then verifies what it restored; `restore.mjs` starts it. */
import { chainFaultText, checkpointFaultText, unrecordedText } from '../lib/messages/en/chain-faults';
import { checkRestored } from '../lib/server/backups/check-restored';
import { BackupFault } from '../lib/server/backups/manifest';
import { restoreBackup } from '../lib/server/backups/restore-backup';
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { readEnv } from '../lib/server/env';
import { storeOf } from '../lib/server/storage/store';

async function main(folder: string): Promise<number> {
	// Named here so that no fresh key is made where those of the backup belong.
	const silent = { AUTH_SECRET: 'x'.repeat(32), CERTIFICATE_PASSPHRASE: 'x' };
	const env = readEnv({ ...silent, ...process.env });
	const place = { env, store: await storeOf(env.storage) };
	const manifest = await restoreBackup(folder, place, process.env.RESTORE_REPLACES_EVERYTHING === 'yes');
	openDatabase(env.databaseUrl);
	const { chains, faults, checkpointFault, unrecorded, damagedFiles } = await checkRestored(manifest);
	const lines = [
		...faults.map(chainFaultText),
		...(checkpointFault ? [checkpointFaultText(checkpointFault)] : []),
		...unrecorded.map(unrecordedText),
		...damagedFiles.map((sha256) => `file ${sha256} is missing or damaged`)
	];
	for (const line of lines) console.log(line);
	console.log(`Restored what was kept at ${manifest.madeAt}: ${chains} chains, ${lines.length} faults`);
	return lines.length === 0 ? 0 : 1;
}

try {
	process.exitCode = await main(process.argv[2] ?? '');
} catch (error) {
	if (!(error instanceof BackupFault)) throw error;
	console.error(error.message);
	process.exitCode = 1;
} finally {
	await closeDatabase();
}
