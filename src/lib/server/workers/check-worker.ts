import { parentPort, workerData } from 'node:worker_threads';
import { BatchChecker } from '../assessments/check-batch';
import { connect } from '../db/sequelize';

// Batch for batch until the thread is stopped; its connection and its memory are its own.
const checker = new BatchChecker(connect(String(workerData), 1));
parentPort?.on('message', (ids: string[]) => {
	void checker.check(ids).then(
		(checked) => parentPort?.postMessage(checked),
		(error: unknown) => {
			setImmediate(() => {
				throw error;
			});
		}
	);
});
