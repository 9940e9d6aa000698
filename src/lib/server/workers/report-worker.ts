import { parentPort, workerData } from 'node:worker_threads';
import { sealedReport, type ReportOrder } from '../reports/pdf/sealed-report';

/** One order, one answer: the sealed bytes are handed over, not copied. */
async function answer(order: ReportOrder): Promise<void> {
	const sealed = await sealedReport(order);
	parentPort?.postMessage(sealed, [sealed.pdf.buffer as ArrayBuffer]);
}

await answer(workerData as ReportOrder);
