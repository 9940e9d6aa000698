import { QueryTypes } from 'sequelize';
import { database } from '../db/sequelize';

export interface Limit {
	attempts: number;
	windowMs: number;
}

/** Counts an attempt; false once there were too many in the window. */
export async function isWithinLimit(name: string, limit: Limit, now: Date): Promise<boolean> {
	return (await countAttempt(name, limit, now)) <= limit.attempts;
}

/** Counts an attempt. Kept in a table: the app holds no state. @returns how many there were in the window */
export async function countAttempt(name: string, { windowMs }: Limit, now: Date): Promise<number> {
	const expired = new Date(now.getTime() - windowMs);
	await database().query(
		`INSERT INTO rate_limits (name, window_started_at, attempts) VALUES (:name, :now, 1)
		 ON DUPLICATE KEY UPDATE attempts = IF(window_started_at < :expired, 1, attempts + 1),
			window_started_at = IF(window_started_at < :expired, :now, window_started_at)`,
		{ replacements: { name, now, expired } }
	);
	const [row] = await database().query<{ attempts: number }>(
		'SELECT attempts FROM rate_limits WHERE name = :name',
		{
			replacements: { name },
			type: QueryTypes.SELECT
		}
	);
	return row?.attempts ?? 0;
}

export async function clearLimit(name: string): Promise<void> {
	await database().query('DELETE FROM rate_limits WHERE name = :name', { replacements: { name } });
}
