import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { run } from './run.mjs';
import { SetupFault, step } from './say.mjs';

const searchPath = `${process.env.PATH ?? ''}${delimiter}/usr/sbin${delimiter}/usr/local/sbin`;

/**
 * Where a program lies, or null. Debian keeps servers in /usr/sbin, which is not on every PATH.
 * @param {string} program
 */
export function findProgram(program) {
	for (const folder of searchPath.split(delimiter)) {
		try {
			accessSync(join(folder, program), constants.X_OK);
			return join(folder, program);
		} catch {
			continue;
		}
	}
	return null;
}

/**
 * Installs from Debian what is missing.
 * @param {Record<string, string[]>} needs program → Debian packages that bring it
 */
export async function ensurePrograms(needs) {
	const missing = Object.keys(needs).filter((program) => !findProgram(program));
	if (missing.length === 0) return;
	const packages = [...new Set(missing.flatMap((program) => needs[program] ?? []))];
	const command = `apt-get install -y --no-install-recommends ${packages.join(' ')}`;
	if (process.getuid?.() !== 0)
		throw new SetupFault(
			`${missing.join(', ')} is missing and this account may not install it. Run:\n  sudo ${command}\nthen start again.`
		);
	if (!findProgram('apt-get'))
		throw new SetupFault(
			`${missing.join(', ')} is missing and there is no apt-get here. Install ${packages.join(', ')} with your system's own tools.`
		);
	await step(`Installing ${packages.join(', ')} from Debian`, async () => {
		const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
		await run('apt-get', ['update', '-q'], { env });
		await run('apt-get', command.split(' ').slice(1), { env });
	});
}

export const databasePrograms = {
	mariadbd: ['mariadb-server-core', 'mariadb-client-core'],
	'mariadb-install-db': ['mariadb-server-core', 'mariadb-client-core'],
	my_print_defaults: ['mariadb-client-core']
};

/** What backing up and restoring call. */
export const backupPrograms = {
	'mariadb-dump': ['mariadb-client'],
	mariadb: ['mariadb-client']
};

export const testPrograms = {
	...backupPrograms,
	chromium: ['chromium'],
	pdfsig: ['poppler-utils'],
	pdftotext: ['poppler-utils'],
	qpdf: ['qpdf'],
	openssl: ['openssl']
};
