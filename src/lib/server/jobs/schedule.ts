import { v7 as uuid } from 'uuid';
import { database } from '../db/sequelize';
import { log } from '../log';

const hourMs = 3_600_000;

/** Work that comes round by itself, and how often. */
const rounds = [
	{ kind: 'audit-checkpoint', everyMs: hourMs },
	{ kind: 'retention', everyMs: 24 * hourMs }
] as const;

/** Writes the jobs of the round that `now` falls in; a second server, or a second call, adds none. */
export async function enqueueRounds(now: Date): Promise<void> {
	for (const { kind, everyMs } of rounds) {
		const key = `${kind} ${Math.floor(now.getTime() / everyMs)}`;
		await database().query(
			`INSERT IGNORE INTO jobs (id, kind, payload, dedupe_key, run_at, created_at) VALUES (:id, :kind, '{}', :key, :now, :now)`,
			{ replacements: { id: uuid(), kind, key, now } }
		);
	}
}

const lookEveryMs = 60_000;

/** Looks every minute whether a new round has begun. */
export function startSchedule(): { stop: () => void } {
	const look = () =>
		void enqueueRounds(new Date()).catch((error: unknown) =>
			log().warn({ err: error }, 'the next round waits for the database')
		);
	look();
	const timer = setInterval(look, lookEveryMs);
	return { stop: () => clearInterval(timer) };
}
