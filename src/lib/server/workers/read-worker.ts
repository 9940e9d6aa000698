import { parentPort, workerData } from 'node:worker_threads';
import { readBytes, type ReadOrder } from '../reads/read-bytes';

// One order, one answer; the thread ends with it, and with it whatever memory a strange file took.
parentPort?.postMessage(readBytes(workerData as ReadOrder));
