import { readdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { Op } from 'sequelize';
import type { RetentionPeriods } from '../../schemas/retention';
import { Job } from '../db/models/job';
import { env } from '../env';

/** So many calendar months before, as the database counts them for the other kinds. */
function monthsBefore(now: Date, months: number): Date {
	const before = new Date(now);
	before.setUTCMonth(before.getUTCMonth() - months);
	return before;
}

/** Takes away mails that the local stand-in kept longer than people are kept; a real mail server keeps its own rules. */
async function removeMails(before: Date): Promise<number> {
	const folder = env().mailFolder;
	const names = await readdir(folder).catch((error: NodeJS.ErrnoException) => {
		if (error.code === 'ENOENT') return [];
		throw error;
	});
	let removed = 0;
	for (const name of names.filter((one) => /\.(eml|id)$/.test(one))) {
		const path = join(folder, name);
		if ((await stat(path)).mtime >= before) continue;
		await rm(path, { force: true });
		if (name.endsWith('.eml')) removed++;
	}
	return removed;
}

/** Work that is done names addresses in its orders: it goes with the mails it sent. Open work stays. */
export async function removeOldMail(
	now: Date,
	{ people }: RetentionPeriods
): Promise<{ mails: number; jobs: number }> {
	const before = monthsBefore(now, people);
	const jobs = await Job.destroy({ where: { doneAt: { [Op.lt]: before } } });
	return { mails: await removeMails(before), jobs };
}
