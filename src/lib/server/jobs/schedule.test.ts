import { describe, expect, it } from 'vitest';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { Job } from '../db/models/job';
import { findJobHandler } from './job-kinds';
import { registerAllJobs } from './register-all';
import { enqueueRounds } from './schedule';

useTestDatabase();

const keys = async () => (await Job.findAll({ order: ['dedupeKey'] })).map(({ dedupeKey }) => dedupeKey);

describe('work that comes round by itself', () => {
	it('is queued once a round, however many servers look and however often', async () => {
		const now = new Date('2026-04-03T07:10:00Z');
		await Promise.all([1, 2, 3, 4].map(() => enqueueRounds(now)));
		const first = await keys();
		expect(first.length).toBeGreaterThan(0);
		await enqueueRounds(new Date('2026-04-03T07:59:59.999Z'));
		expect(await keys()).toEqual(first);
		await enqueueRounds(new Date('2026-04-03T08:00:00Z'));
		expect((await keys()).length).toBe(first.length + 1);
	});

	it('has somebody to do it', async () => {
		registerAllJobs();
		for (const { kind } of await Job.findAll()) expect(findJobHandler(kind), kind).not.toBeNull();
	});
});
