import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import { Refusal } from '../refusals';
import type { Inspection } from './inspect-export';
import { inspectFile, type InspectFileOrder } from './inspect-file';
import { turnsOf } from './reading-turns';
import { answerCompute, type ComputeOutcome } from '../specs/answer-compute';
import { readBytes, type ReadOrder, type ReadResult } from './read-bytes';

/** Where `vite build --mode node` leaves the workers, from the folder the server is started in. */
const builtFolder = join('build', 'node');
/** No export a dock brings takes longer; one that does is built to. */
const longestReadMs = 60_000;
const mostMemoryMegabytes = 1024;
/** More at once would only wait for each other; of heavy files one holds half a gigabyte. */
const inTurn = turnsOf({ mostAtOnce: 2, mostHeavy: 1 });
const heavyBytes = 8 * 1024 * 1024;

let isBuilt: boolean = import.meta.env.PROD;

const builtProgram = (name: string): string | null =>
	isBuilt ? join(process.cwd(), builtFolder, name) : null;

/** For a program that reads many small exports of its own making, such as the seed: a thread each would cost more. */
export function readInPlace(): void {
	isBuilt = false;
}

/**
 * Reads an export in a thread of its own, so that a long file holds up nobody and a hostile one ends alone.
 * Unbuilt, in development and tests, it is read in place.
 */
export async function runReader(
	order: ReadOrder,
	program = builtProgram('read-worker.js')
): Promise<ReadResult> {
	return program === null ? readBytes(order) : queued<ReadResult>(order, program);
}

/** Inspects a file in a thread likewise; the two kinds wait for each other. */
export async function runInspector(
	order: InspectFileOrder,
	program = builtProgram('inspect-worker.js')
): Promise<Inspection> {
	return program === null ? inspectFile(order) : queued<Inspection>(order, program);
}

/** Answers a large question about shelf life, as JSON text, in a thread likewise. */
export async function runCompute(
	body: string,
	program = builtProgram('compute-worker.js')
): Promise<ComputeOutcome> {
	if (program === null) return answerCompute(body);
	return inTurn(body.length > heavyBytes, () => inThread<ComputeOutcome>(body, program));
}

type FileOrder = ReadOrder | InspectFileOrder;
type Order = FileOrder | string;

async function queued<Result>(order: FileOrder, program: string): Promise<Result> {
	const bytes = 'bytes' in order ? order.bytes.length : (await stat(order.path)).size;
	return inTurn(bytes > heavyBytes, () => inThread<Result>(order, program));
}

/** Bytes with a buffer of their own are handed over, not copied: nobody reads them here any more. */
function handedOver(order: Order): ArrayBuffer[] {
	if (typeof order === 'string' || !('bytes' in order)) return [];
	const { buffer, byteLength } = order.bytes;
	return buffer instanceof ArrayBuffer && buffer.byteLength === byteLength ? [buffer] : [];
}

function inThread<Result>(order: Order, program: string): Promise<Result> {
	const worker = new Worker(program, {
		workerData: order,
		transferList: handedOver(order),
		resourceLimits: { maxOldGenerationSizeMb: mostMemoryMegabytes }
	});
	return new Promise<Result>((resolve, reject) => {
		const timer = setTimeout(() => reject(new Refusal('file-too-heavy')), longestReadMs);
		const end = (act: () => void) => {
			clearTimeout(timer);
			act();
		};
		worker.once('message', (result: Result) => end(() => resolve(result)));
		worker.once('error', (error) =>
			end(() => reject(isOutOfMemory(error) ? new Refusal('file-too-heavy') : error))
		);
		worker.once('exit', (code) => end(() => reject(new Error(`The read worker ended with code ${code}.`))));
	}).finally(() => void worker.terminate());
}

function isOutOfMemory(error: Error): boolean {
	return 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY';
}
