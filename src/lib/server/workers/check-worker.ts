import { parentPort, workerData } from 'node:worker_threads';
import { BatchChecker } from '../assessments/check-batch';
import { connectPlainly } from '../db/plain-connection';

// Batch for batch until the thread is stopped; its connection and its memory are its own.
const checker = connectPlainly(String(workerData)).then((database) => new BatchChecker(database));
parentPort?.on('message', (ids: string[]) => {
	void checker
		.then((ready) => ready.check(ids))
		.then(
			(checked) => parentPort?.postMessage(checked),
			(error: unknown) => {
				setImmediate(() => {
					throw error;
				});
			}
		);
});
