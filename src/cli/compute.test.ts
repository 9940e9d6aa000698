import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { computeLifeOf } from '../lib/server/specs/compute-life';

const program = join(import.meta.dirname, '../../build/node/compute.js');
const question = {
	model: { kind: 'q10', q10: 3, referenceCelsius: 0, lifeHours: 336 },
	readings: [
		['2026-04-03T06:00:00Z', 0],
		['2026-04-03T16:00:00Z', 10]
	],
	limits: { above: [5], below: [] },
	accuracyCelsius: 0.5
};
let folder = '';

beforeAll(() => {
	folder = mkdtempSync(join(tmpdir(), 'compute-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

/** Runs the built program with no environment: it must need neither database nor server. */
function run(text: string | null, ...more: string[]) {
	const path = join(folder, 'question.json');
	if (text !== null) writeFileSync(path, text);
	const args = text === null ? more : [path, ...more];
	return spawnSync(process.execPath, [program, ...args], { env: {}, encoding: 'utf8' });
}

describe('the compute program', () => {
	it('prints what the API answers, on one line and nothing else', () => {
		const { stdout, stderr, status } = run(JSON.stringify(question));
		expect(stdout).toBe(`${JSON.stringify(computeLifeOf(question))}\n`);
		expect([stderr, status]).toEqual(['', 0]);
	});

	it('finds a file named from the folder npm was called in', () => {
		writeFileSync(join(folder, 'question.json'), JSON.stringify(question));
		const env = { INIT_CWD: folder };
		const { stdout } = spawnSync(process.execPath, [program, 'question.json'], { env, encoding: 'utf8' });
		expect(JSON.parse(stdout)).toEqual(computeLifeOf(question));
	});

	it.each([
		['a faulty figure', JSON.stringify({ ...question, accuracyCelsius: -1 }), ['accuracyCelsius']],
		['no JSON', '{"model":', undefined]
	])('refuses %s on standard error, naming the field', (_, text, fields) => {
		const { stdout, stderr, status } = run(text);
		const refusal: { code: string; message: string; issues?: Record<string, string> } = JSON.parse(stderr);
		expect([stdout, status, refusal.code]).toEqual(['', 1, 'invalid']);
		expect(refusal.message).toMatch(/\.$/);
		expect(refusal.issues && Object.keys(refusal.issues)).toEqual(fields);
	});

	it.each([
		['no file at all', [], /Name a JSON file/],
		['a file that is not there', ['nowhere.json'], /nowhere\.json cannot be read/],
		['a folder', [tmpdir()], /cannot be read/]
	])('refuses %s', (_, args, words) => {
		const { stdout, stderr, status } = run(null, ...args);
		expect([stdout, status]).toEqual(['', 1]);
		expect(JSON.parse(stderr).message).toMatch(words);
	});
});
