import { QueryTypes } from 'sequelize';
import { database } from '../db/sequelize';
import { version } from '../../../../package.json';

export interface Health {
	version: string;
	database: 'up' | 'away';
	queue: { waiting: number; failed: number } | null;
}

/** Whether the parts this process needs answer, and how much work waits. */
export async function checkHealth(): Promise<Health> {
	try {
		const [row] = await database().query<{ waiting: number; failed: number }>(
			`SELECT COUNT(CASE WHEN failed_at IS NULL THEN 1 END) AS waiting, COUNT(failed_at) AS failed
			 FROM jobs WHERE done_at IS NULL`,
			{ type: QueryTypes.SELECT }
		);
		return {
			version,
			database: 'up',
			queue: { waiting: Number(row?.waiting ?? 0), failed: Number(row?.failed ?? 0) }
		};
	} catch {
		// The one place that reports an outage as data: that is its question.
		return { version, database: 'away', queue: null };
	}
}
