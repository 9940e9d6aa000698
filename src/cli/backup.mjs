/** `npm run backup -- <folder>`: database, files and keys into an empty folder. */
import { resolve } from 'node:path';
import { backupPrograms } from './setup/debian.mjs';
import { runInPlace } from './setup/place.mjs';
import { SetupFault, endWith } from './setup/say.mjs';

async function main() {
	const [folder] = process.argv.slice(2);
	if (!folder) throw new SetupFault('Say where to: npm run backup -- /var/backups/wharfinger-2026-04-03');
	process.exitCode = await runInPlace('write-backup', [resolve(folder)], backupPrograms);
}

main().catch(endWith);
