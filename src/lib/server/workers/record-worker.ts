import { parentPort, workerData } from 'node:worker_threads';
import { recordDocument, type RecordOrder } from '../audit/export/record-document';

/** One order, one answer: the bytes are handed over, not copied. */
async function answer(order: RecordOrder): Promise<void> {
	const pdf = Uint8Array.from(await recordDocument(order));
	parentPort?.postMessage(pdf, [pdf.buffer]);
}

await answer(workerData as RecordOrder);
