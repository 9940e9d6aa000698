import { parentPort, workerData } from 'node:worker_threads';
import { inspectFile, type InspectFileOrder } from '../reads/inspect-file';

// One file, one answer, like the read worker beside it.
parentPort?.postMessage(inspectFile(workerData as InspectFileOrder));
