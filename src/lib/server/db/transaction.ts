import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { appendEvents } from '../audit/append';
import { event, type AuditEvent, type ChainName, type EventData, type EventType } from '../audit/catalogue';
import type { Context } from '../context';
import { Job } from './models/job';
import { database } from './sequelize';

/** What a use case writes with: the transaction, and the facts and jobs that go in with it. */
export interface Writing {
	transaction: Transaction;
	/** Writes an audit entry with this transaction; entries are appended last. */
	record<Type extends EventType>(type: Type, chain: ChainName, data: EventData[Type]): void;
	/** Writes a job with this transaction. A key makes it happen once however often it is asked for. */
	enqueue(kind: string, payload: Record<string, unknown>, dedupeKey?: string): void;
}

const deadlock = 1213;
const lockTimeout = 1205;
const triesOnDeadlock = 4;

function isRetryable(error: unknown): boolean {
	const parent = error instanceof Error && 'parent' in error ? error.parent : null;
	const number = parent && typeof parent === 'object' && 'errno' in parent ? parent.errno : null;
	return number === deadlock || number === lockTimeout;
}

async function run<Result>(ctx: Context, write: (w: Writing) => Promise<Result>): Promise<Result> {
	return database().transaction(async (transaction) => {
		const events: AuditEvent[] = [];
		const jobs: { kind: string; payload: Record<string, unknown>; dedupeKey: string | null }[] = [];
		const result = await write({
			transaction,
			record: (type, chain, data) => void events.push(event(type, chain, data)),
			enqueue: (kind, payload, dedupeKey) => void jobs.push({ kind, payload, dedupeKey: dedupeKey ?? null })
		});
		for (const { kind, payload, dedupeKey } of jobs) {
			await Job.create(
				{ id: uuid(), kind, payload: JSON.stringify(payload), dedupeKey, runAt: ctx.now, createdAt: ctx.now },
				{ transaction }
			);
		}
		await appendEvents(ctx, events, transaction);
		return result;
	});
}

/**
 * Runs `write` in one transaction with its audit entries and jobs: all of it happens or none.
 * A deadlock reruns the closure, so it holds no effects, makes no ids and asks no clock.
 */
export async function inTransaction<Result>(
	ctx: Context,
	write: (w: Writing) => Promise<Result>
): Promise<Result> {
	for (let attempt = 1; ; attempt++) {
		try {
			return await run(ctx, write);
		} catch (error) {
			if (attempt >= triesOnDeadlock || !isRetryable(error)) throw error;
		}
	}
}
