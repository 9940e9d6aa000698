import { parentPort, workerData } from 'node:worker_threads';
import { answerCompute } from '../specs/answer-compute';

/** One question, one answer. */
parentPort?.postMessage(answerCompute(workerData as string));
