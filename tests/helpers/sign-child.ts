/** A process of its own that signs a docket or works off jobs when told to, so that a test can kill it meanwhile. */
import type { DispositionInput } from '../../src/lib/schemas/disposition';
import { loadActor } from '../../src/lib/server/accounts/load-actor';
import { openDatabase } from '../../src/lib/server/db/sequelize';
import { env } from '../../src/lib/server/env';
import { runDueJobs } from '../../src/lib/server/jobs/run-jobs';

export type Order =
	{ act: 'sign'; number: string; userId: string; input: DispositionInput } | { act: 'work' };

async function obey(order: Order): Promise<void> {
	openDatabase(env().databaseUrl);
	if (order.act === 'work') {
		// What makes reports and mails takes long to load; a signature needs none of it.
		const { registerAllJobs } = await import('../../src/lib/server/jobs/register-all');
		registerAllJobs();
		await runDueJobs(`${process.pid}`);
		return;
	}
	const now = new Date();
	const actor = await loadActor({ kind: 'user', subjectId: order.userId, tokenVersion: 0 }, now);
	if (!actor) throw new Error('There is no such signer.');
	const ctx = { actor, now, requestId: `child-${process.pid}`, address: '127.0.0.1' };
	const { signDisposition } = await import('../../src/lib/server/dispositions/sign-disposition');
	await signDisposition(ctx, order.number, order.input);
}

process.on('message', (order: Order) => {
	obey(order).then(
		() => process.send?.('done'),
		(error: unknown) =>
			process.send?.(error instanceof Error ? (error.stack ?? error.message) : String(error))
	);
});
process.send?.('ready');
