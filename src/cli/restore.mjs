/** `npm run restore -- <folder>`: brings a backup back into an empty place. */
import { resolve } from 'node:path';
import { backupPrograms } from './setup/debian.mjs';
import { runInPlace } from './setup/place.mjs';
import { SetupFault, endWith } from './setup/say.mjs';

async function main() {
	const [folder] = process.argv.slice(2);
	if (!folder) throw new SetupFault('Say which: npm run restore -- /var/backups/wharfinger-2026-04-03');
	process.exitCode = await runInPlace('read-backup', [resolve(folder)], backupPrograms);
}

main().catch(endWith);
