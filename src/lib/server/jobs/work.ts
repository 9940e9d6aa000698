import { setTimeout as wait } from 'node:timers/promises';
import { log } from '../log';
import { runNextJob } from './run-jobs';

const idleMs = 400;
const troubleMs = 5_000;

/** Works off jobs until stopped; a database that is away is waited for. */
export function startWorker(owner: string): { stop: () => Promise<void> } {
	const stopping = new AbortController();
	const pause = (ms: number) => wait(ms, undefined, { signal: stopping.signal }).catch(() => {});

	async function loop() {
		while (!stopping.signal.aborted) {
			try {
				if (!(await runNextJob(owner))) await pause(idleMs);
			} catch (error) {
				log().warn({ err: error }, 'jobs wait for the database');
				await pause(troubleMs);
			}
		}
	}
	const ended = loop();
	return {
		async stop() {
			stopping.abort();
			await ended;
		}
	};
}
