/** `npm run compute -- <json file>`: what the compute call of the API answers, on one line; no server, no database. */
import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { answerCompute } from '../lib/server/specs/answer-compute';
import { InvalidFields } from '../lib/server/shipments/invalid-fields';

/** The refusal as the API words it, on standard error, so that standard output holds an answer or nothing. */
function refuse(refusal: { code: string; message: string; issues?: Record<string, string> }): void {
	process.stderr.write(`${JSON.stringify(refusal)}\n`);
	process.exitCode = 1;
}

/** npm runs programs in the project's folder; the file is named from where it was called. */
function textOf(path: string): string {
	return readFileSync(path === '-' ? 0 : resolve(process.env.INIT_CWD ?? '', path), 'utf8');
}

function main(path: string | undefined): void {
	if (path === undefined)
		return refuse({ code: 'invalid', message: 'Name a JSON file: npm run compute -- question.json.' });
	let text: string;
	try {
		text = textOf(path);
	} catch (error) {
		const why = error instanceof Error ? error.message : String(error);
		return refuse({ code: 'invalid', message: `${path} cannot be read: ${why}.` });
	}
	const outcome = answerCompute(text);
	if ('json' in outcome) process.stdout.write(`${outcome.json}\n`);
	else if ('refused' in outcome) refuse({ code: outcome.refused, message: outcome.message });
	else {
		const { code, message, issues } = new InvalidFields(outcome.issues);
		refuse({ code, message, issues });
	}
}

main(process.argv[2]);
