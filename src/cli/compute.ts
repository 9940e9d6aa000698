/** `npm run compute -- <json file>`: what the compute call of the API answers, on one line; no server, no database. */
import { readFileSync } from 'node:fs';
import { computeLifeOf } from '../lib/server/specs/compute-life';
import { parseBoundedJson } from '../lib/server/specs/bounded-json';
import { InvalidFields } from '../lib/server/shipments/invalid-fields';
import { Refusal } from '../lib/server/refusals';

/** The refusal as the API words it, on standard error, so that standard output holds an answer or nothing. */
function refuse(refusal: { code: string; message: string; issues?: Record<string, string> }): void {
	process.stderr.write(`${JSON.stringify(refusal)}\n`);
	process.exitCode = 1;
}

function main(path: string | undefined): void {
	if (path === undefined) {
		return refuse({ code: 'invalid', message: 'Name a JSON file: npm run compute -- question.json.' });
	}
	try {
		const text = readFileSync(path === '-' ? 0 : path, 'utf8');
		process.stdout.write(`${JSON.stringify(computeLifeOf(parseBoundedJson(text)))}\n`);
	} catch (error) {
		if (error instanceof InvalidFields)
			return refuse({ code: error.code, message: error.message, issues: error.issues });
		if (error instanceof Refusal) return refuse({ code: error.code, message: error.message });
		if (error instanceof Error && 'syscall' in error)
			return refuse({ code: 'invalid', message: `${path} cannot be read: ${error.message}.` });
		throw error;
	}
}

main(process.argv[2]);
