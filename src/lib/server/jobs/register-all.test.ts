import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { findJobHandler } from './job-kinds';
import { registerAllJobs } from './register-all';

const server = join(import.meta.dirname, '..');

it('has somebody for every kind of job that is ever queued', () => {
	const sources = readdirSync(server, { recursive: true, encoding: 'utf8' })
		.filter((path) => path.endsWith('.ts') && !path.endsWith('.test.ts'))
		.map((path) => readFileSync(join(server, path), 'utf8'));
	const queued = sources.flatMap((text) =>
		[...text.matchAll(/enqueue\(\s*'([\w-]+)'/g)].map(([, kind]) => kind)
	);
	expect(queued.length).toBeGreaterThanOrEqual(3);
	registerAllJobs();
	for (const kind of queued) expect(findJobHandler(kind ?? ''), kind).not.toBeNull();
});
