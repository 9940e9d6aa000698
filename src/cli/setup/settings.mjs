import { existsSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { projectFolder } from './project.mjs';

/** Settings in .env count where the environment is silent. */
export function readDotEnv() {
	const path = join(projectFolder, '.env');
	if (!existsSync(path)) return;
	for (const line of readFileSync(path, 'utf8').split('\n')) {
		const match = /^\s*([A-Z0-9_]+)\s*=\s*(.*?)\s*$/.exec(line);
		if (match?.[1] && process.env[match[1]] === undefined)
			process.env[match[1]] = match[2]?.replace(/^"(.*)"$/, '$1');
	}
}

/** Where files, keys and the private database lie. */
export function dataFolder() {
	return resolve(projectFolder, process.env.WHARFINGER_DATA || '.data');
}
