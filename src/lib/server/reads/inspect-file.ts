import { readFileSync } from 'node:fs';
import { inspect, type Inspection, type InspectOrder } from './inspect-export';

/** An inspection of a file on this machine's disk: a thread is sent its path, not a copy of its bytes. */
export type InspectFileOrder = Omit<InspectOrder, 'bytes'> & { path: string };

/** Reads the file and inspects it. */
export function inspectFile({ path, ...order }: InspectFileOrder): Inspection {
	return inspect({ ...order, bytes: readFileSync(path) });
}
