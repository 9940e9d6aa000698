import { QueryTypes } from 'sequelize';
import { systemContext } from '../context';
import { Job } from '../db/models/job';
import { database } from '../db/sequelize';
import { log } from '../log';
import { findJobHandler } from './job-kinds';

const leaseMs = 5 * 60_000;
const attemptsAllowed = 12;
const firstPauseMs = 2_000;
const longestPauseMs = 30 * 60_000;

/** Somebody may be waiting for a younger job; an older one is backlog, after an outage or a load of old data. */
const backlogAfterMs = 60 * 60_000;

/** Leases one due job, committed before its work begins: no row lock is held through an effect. */
async function lease(owner: string, now: Date): Promise<Job | null> {
	return database().transaction(async (transaction) => {
		const [due] = await database().query<{ id: string }>(
			`SELECT id FROM jobs WHERE done_at IS NULL AND failed_at IS NULL AND run_at <= :now
			 AND (leased_until IS NULL OR leased_until < :now) ORDER BY run_at < :backlog, run_at
			 LIMIT 1 FOR UPDATE SKIP LOCKED`,
			{
				replacements: { now, backlog: new Date(now.getTime() - backlogAfterMs) },
				transaction,
				type: QueryTypes.SELECT
			}
		);
		if (!due) return null;
		const job = await Job.findByPk(due.id, { transaction });
		await job?.update(
			{ leasedBy: owner, leasedUntil: new Date(now.getTime() + leaseMs), attempts: job.attempts + 1 },
			{ transaction }
		);
		return job;
	});
}

/** Later and later: 2 s, 4 s, 8 s … half an hour. */
function pauseMs(attempts: number): number {
	return Math.min(longestPauseMs, firstPauseMs * 2 ** (attempts - 1));
}

async function fail(job: Job, error: unknown): Promise<void> {
	const lastError = error instanceof Error ? error.message : String(error);
	const now = new Date();
	const isLast = job.attempts >= attemptsAllowed;
	log().error({ job: job.id, kind: job.kind, attempts: job.attempts, err: error }, 'job failed');
	await job.update({
		lastError,
		leasedBy: null,
		leasedUntil: null,
		...(isLast ? { failedAt: now } : { runAt: new Date(now.getTime() + pauseMs(job.attempts)) })
	});
}

/** Runs one due job, if there is any. @returns whether there was. */
export async function runNextJob(owner: string): Promise<boolean> {
	const now = new Date();
	const job = await lease(owner, now);
	if (!job) return false;
	try {
		const handler = findJobHandler(job.kind);
		if (!handler) throw new Error(`Nobody does jobs of the kind ${job.kind}.`);
		await handler(systemContext(now, `job-${job.id}`), JSON.parse(job.payload));
		await job.update({ doneAt: new Date(), leasedBy: null, leasedUntil: null });
	} catch (error) {
		await fail(job, error);
	}
	return true;
}

/** Runs every job that is due now. */
export async function runDueJobs(owner: string): Promise<number> {
	let ran = 0;
	while (await runNextJob(owner)) ran++;
	return ran;
}
