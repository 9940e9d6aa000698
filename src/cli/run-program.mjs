/**
 * `npm run compute -- <file>` and the like: a program whose standard output is its answer and nothing else. Installs
 * and builds first where that is needed, saying so on standard error.
 */
import { join } from 'node:path';
import { preparePrograms, projectFolder } from './setup/project.mjs';
import { endWith, sayOnStandardError } from './setup/say.mjs';

const [name = ''] = process.argv.splice(2, 1);
sayOnStandardError();
try {
	await preparePrograms();
	await import(join(projectFolder, `build/node/${name}.js`));
} catch (error) {
	endWith(error);
}
