import { readExport } from '$lib/domain/ingest/read-export';
import { glanceOf, type GlanceAnswer, type GlanceOrder } from './file-glance';

async function answerTo({ id, file, context, inputs }: GlanceOrder): Promise<GlanceAnswer> {
	try {
		const bytes = new Uint8Array(await file.arrayBuffer());
		return { id, glance: glanceOf(readExport(bytes, context), inputs) };
	} catch {
		// The server reads it anyway, and says what there is to say.
		return { id, glance: null };
	}
}

// One after the other: ten files at once would not fit into a phone's memory.
let before: Promise<unknown> = Promise.resolve();

addEventListener('message', ({ data }: MessageEvent<GlanceOrder>) => {
	before = before.then(() => answerTo(data)).then((answer) => postMessage(answer));
});
