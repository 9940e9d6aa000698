/** `npm run inspect -- <file> [--zone …]`: prints what is understood of an export as JSON. No server, no database. */
import { readFileSync, statSync } from 'node:fs';
import { resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { maxFileBytes } from '../lib/domain/ingest/bounds';
import { inspectAnswers } from '../lib/schemas/inspect';
import { inspect, refusedAnswer } from '../lib/server/reads/inspect-export';

const usage = `Say which file: npm run inspect -- <file> [--zone Europe/Amsterdam] [--date-order DMY|MDY|YMD]
  [--unit Cel|[degF]|K] [--column <head>] [--start <instant>] [--interval-seconds <n>] [--part first|second|before|joined]`;

function endWith(message: string): never {
	process.stderr.write(`${message}\n`);
	process.exit(2);
}

/** `--zone -05:00` as `--zone=-05:00`: what begins with a sign and a digit is a value. */
function joined(args: readonly string[]): string[] {
	const out: string[] = [];
	for (const arg of args) {
		const last = out.at(-1);
		if (/^-\d/.test(arg) && last !== undefined && /^--[a-z-]+$/.test(last))
			out[out.length - 1] = `${last}=${arg}`;
		else out.push(arg);
	}
	return out;
}

function parsed(): { path: string; given: Record<string, string | undefined> } {
	const text = { type: 'string' } as const;
	try {
		const { positionals, values } = parseArgs({
			args: joined(process.argv.slice(2)),
			allowPositionals: true,
			options: {
				zone: text,
				'date-order': text,
				unit: text,
				column: text,
				start: text,
				'interval-seconds': text,
				part: text
			}
		});
		const [path, ...more] = positionals;
		if (path === undefined || more.length > 0) endWith(usage);
		const { 'date-order': dateOrder, 'interval-seconds': intervalSeconds, ...rest } = values;
		// npm runs programs in the project's folder; the file is named from where it was called.
		return {
			path: resolve(process.env.INIT_CWD ?? '', path),
			given: { ...rest, dateOrder, intervalSeconds }
		};
	} catch (error) {
		return endWith(`${error instanceof Error ? error.message : String(error)}\n${usage}`);
	}
}

const { path, given } = parsed();
const answers = inspectAnswers.safeParse(given);
if (!answers.success) endWith(answers.error.issues.map(({ message }) => message).join('\n'));
let bytes: number;
try {
	({ size: bytes } = statSync(path));
} catch (error) {
	endWith(`${path} cannot be read: ${error instanceof Error ? error.message : String(error)}`);
}
const { answer, faults } =
	bytes > maxFileBytes
		? { answer: refusedAnswer({ code: 'too-large', line: null, found: String(bytes) }), faults: {} }
		: inspect({
				bytes: readFileSync(path),
				answers: answers.data,
				siteZone: null,
				nowMs: Date.now()
			});
if (Object.keys(faults).length > 0) endWith(Object.values(faults).join('\n'));
process.stdout.write(`${JSON.stringify(answer, null, '\t')}\n`);
