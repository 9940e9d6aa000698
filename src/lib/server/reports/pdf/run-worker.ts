import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import type { ReportInput } from './report-input';
import type { ReportOrder, SealedReport } from './sealed-report';

/** Where `vite build --mode node` leaves the worker, from the folder the server is started in. */
const builtWorker = join('build', 'node', 'report-worker.js');

/** The organisation's certificate store as it is kept, and its passphrase. */
export interface SealKey {
	readonly p12: Uint8Array;
	readonly passphrase: string;
}

/** Lays out and seals a report in a worker thread, so that a long load does not hold up the server. */
export async function buildSealedReport(
	input: ReportInput,
	key: SealKey,
	timestampUrl: string | null,
	folder = process.cwd()
): Promise<SealedReport> {
	const program = join(folder, builtWorker);
	if (!existsSync(program))
		throw new Error(`The report worker is not built: ${program} is missing. Run "npm run build".`);
	const order: ReportOrder = { input, p12: key.p12, passphrase: key.passphrase, timestampUrl };
	const worker = new Worker(program, { workerData: order });
	return new Promise((resolve, reject) => {
		worker.once('message', (message: SealedReport) => {
			if (message.pdf instanceof Uint8Array) resolve(message);
			else reject(new Error('The report worker answered with something other than a report'));
		});
		worker.once('error', reject);
		worker.once('exit', (code) =>
			reject(new Error(`The report worker ended with code ${code} before it answered`))
		);
	});
}
