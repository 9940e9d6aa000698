import { describe, expect, it } from 'vitest';
import { maxJsonValues } from '../bounds';
import { outlineFault } from './json-outline';
import { parseDocument } from './parse-document';

const megabytes = 1024 * 1024;
const rows = (count: number) => Array.from({ length: count }, (_, i) => `{"t":${i},"c":4.5}`).join(',');

/** Processor time, so that a busy machine fails nothing. */
function cpuMs(work: () => void): number {
	const before = process.cpuUsage();
	work();
	return process.cpuUsage(before).user / 1000;
}

describe('the outline of a long JSON text', () => {
	it.each([
		['ten million opening brackets', 'too-deep', '['.repeat(1e7)],
		['a million objects in each other', 'too-deep', '{"a":'.repeat(1e6)],
		['lists that open and close in each other', 'too-deep', '['.repeat(3e6) + ']'.repeat(3e6)],
		['a list that never ends', 'truncated', `[${'1,'.repeat(3e6)}`],
		['an object that never ends', 'truncated', `{${'"a":1,'.repeat(1e6)}`],
		['rows that never end', 'truncated', `{"rows":[${rows(300_000)}`],
		['a string that never ends', 'truncated', `{"a":"${'x'.repeat(5 * megabytes)}`],
		['more values than any reading needs', 'too-many-readings', `[${'1,'.repeat(maxJsonValues + 1)}1]`]
	] as const)('refuses %s as %s within two seconds', (_, code, text) => {
		let document: ReturnType<typeof parseDocument> | null = null;
		expect(cpuMs(() => (document = parseDocument(text)))).toBeLessThan(2000);
		expect(document).toMatchObject({ code });
	});

	it.each([
		['whole rows', `[${rows(300_000)}]`],
		['brackets and escaped quotes inside strings', `["${'[{\\"\\\\'.repeat(1e6)}"]`],
		['whole texts of which the last is cut', `${rows(300_000).replaceAll('},', '}\n')}\n{"t":1`],
		['a short text, whatever is wrong with it', '[[[[']
	])('finds no fault in %s', (_, text) => {
		expect(outlineFault(text)).toBeNull();
	});
});
