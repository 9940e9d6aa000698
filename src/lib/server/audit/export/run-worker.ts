import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import type { RecordOrder } from './record-document';

/** Where `vite build --mode node` leaves the worker, from the folder the server is started in. */
const builtWorker = join('build', 'node', 'record-worker.js');

/** Lays a printed record out in a worker thread, so that a long one does not hold up the server. */
export async function buildRecord(order: RecordOrder, folder = process.cwd()): Promise<Uint8Array> {
	const program = join(folder, builtWorker);
	if (!existsSync(program))
		throw new Error(`The record worker is not built: ${program} is missing. Run "npm run build".`);
	const worker = new Worker(program, { workerData: order });
	return new Promise((resolve, reject) => {
		worker.once('message', (pdf: unknown) => {
			if (pdf instanceof Uint8Array) resolve(pdf);
			else reject(new Error('The record worker answered with something other than a record'));
		});
		worker.once('error', reject);
		worker.once('exit', (code) => reject(new Error(`The record worker ended with code ${code}`)));
	});
}
