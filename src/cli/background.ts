/** What runs beside the server in one process: the job worker, and the local mailbox while no mail server is set. */
import { watchCertificate } from '../lib/server/certificates/watch-certificate';
import { closeDatabase, openDatabase } from '../lib/server/db/sequelize';
import { env, readEnv } from '../lib/server/env';
import { registerAllJobs } from '../lib/server/jobs/register-all';
import { startSchedule } from '../lib/server/jobs/schedule';
import { startWorker } from '../lib/server/jobs/work';
import { startMailbox } from '../lib/server/mail/local-mailbox';

/** Starts what belongs to this process. @throws Error naming every fault of the settings */
export async function startBackground(
	source: Record<string, string | undefined>
): Promise<{ stop: () => Promise<void> }> {
	readEnv(source);
	for (const [name, value] of Object.entries(source)) if (value !== undefined) process.env[name] = value;
	const settings = env();
	openDatabase(settings.databaseUrl);
	registerAllJobs();
	const mailbox = settings.isLocalMailbox
		? await startMailbox(settings.mailFolder, Number(new URL(settings.smtpUrl).port))
		: null;
	const schedule = startSchedule();
	const worker = startWorker(`${process.pid}`);
	const watch = watchCertificate();
	return {
		async stop() {
			schedule.stop();
			watch.stop();
			await worker.stop();
			await mailbox?.stop();
			await closeDatabase();
		}
	};
}
