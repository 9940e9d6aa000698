import type { ReadContext } from '$lib/domain/ingest/ingestion';
import type { DeviceInputs } from '$lib/schemas/read';
import type { Glance, GlanceAnswer, GlanceOrder } from './file-glance';

/** Reads files on this device, beside the page. */
export interface DeviceReader {
	/** Null where this device cannot: the server reads the file anyway. */
	read: (id: string, file: File) => Promise<Glance | null>;
	end: () => void;
}

/** A slow phone with a long file; the upload does not wait longer for what only tells beforehand. */
const longestMs = 20_000;

/** The reader, in a thread of its own; an old browser without one reads nothing beforehand. */
export function deviceReader(inputs: DeviceInputs, contextNow: () => ReadContext): DeviceReader {
	const waiting = new Map<string, (glance: Glance | null) => void>();
	const worker = startWorker();
	const giveUp = () => {
		for (const answer of waiting.values()) answer(null);
		waiting.clear();
	};
	worker?.addEventListener('message', ({ data }: MessageEvent<GlanceAnswer>) => {
		waiting.get(data.id)?.(data.glance);
		waiting.delete(data.id);
	});
	worker?.addEventListener('error', giveUp);
	return {
		read: (id, file) => {
			if (!worker) return Promise.resolve(null);
			const answer = new Promise<Glance | null>((resolve) => {
				waiting.set(id, resolve);
				setTimeout(() => resolve(null), longestMs);
			});
			worker.postMessage({ id, file, inputs, context: contextNow() } satisfies GlanceOrder);
			return answer;
		},
		end: () => {
			giveUp();
			worker?.terminate();
		}
	};
}

function startWorker(): Worker | null {
	try {
		return new Worker(new URL('./glance-worker.ts', import.meta.url), { type: 'module' });
	} catch {
		return null;
	}
}
