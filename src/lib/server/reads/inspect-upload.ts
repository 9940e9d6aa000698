import { join } from 'node:path';
import { maxFileBytes } from '../../domain/ingest/bounds';
import { answerFields, inspectAnswers, type InspectAnswer } from '../../schemas/inspect';
import type { Context } from '../context';
import { env } from '../env';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { refuseFaults } from '../shipments/invalid-fields';
import { listOwnSites } from '../sites/current-site';
import { refusedAnswer } from './inspect-export';
import type { Upload } from './receive-upload';
import { runInspector } from './run-reader';
import { spoolUpload, type Spooled } from './spool-upload';

/** The form's name for the file; others that come with it are not looked at. */
const fileField = 'file';
const mostFiles = 4;

const tooLarge = refusedAnswer({ code: 'too-large', line: null, found: null });

/**
 * Reads one export for another program and keeps nothing: it lies on the disk while it is read. What cannot be read
 * is an answer, not a fault; a fault is a request without a file, or with an answer that is none.
 * @throws Refusal `not-allowed`, `not-multipart`, `invalid`, `upload-broken`, `file-too-heavy`
 */
export async function inspectUpload(ctx: Context, upload: Upload): Promise<InspectAnswer> {
	authorize(ctx, 'read.inspect');
	const { maxBytes = maxFileBytes } = upload;
	const spooled = await spoolUpload(upload.body, upload.contentType, {
		folder: join(env().dataFolder, 'tmp'),
		maxBytes,
		maxFiles: mostFiles
	}).catch((error: unknown) => {
		// Larger than a request may be at all: said of the file, as of one that is a little too large.
		if (error instanceof Refusal && error.code === 'too-large') return null;
		throw error;
	});
	if (!spooled) return tooLarge;
	try {
		return await inspectSpooled(ctx, spooled);
	} finally {
		await spooled.clear();
	}
}

async function inspectSpooled(ctx: Context, { files, fields }: Spooled): Promise<InspectAnswer> {
	const given = Object.fromEntries(answerFields.map((name) => [name, fields.get(name)?.[0]]));
	const answers = inspectAnswers.safeParse(given);
	if (!answers.success)
		refuseFaults(
			Object.fromEntries(answers.error.issues.map(({ path, message }) => [path.join('.'), message]))
		);
	const file = files.find(({ field }) => field === fileField);
	if (!file) refuseFaults({ [fileField]: 'Send the export as a file in the multipart field “file”.' });
	if (!file || !answers.success) throw new Refusal('invalid');
	if (file.isTooLarge) return tooLarge;
	const [site] = await listOwnSites(ctx);
	const { answer, faults } = await runInspector({
		path: file.path,
		answers: answers.data,
		siteZone: site?.zone ?? null,
		nowMs: ctx.now.getTime()
	});
	refuseFaults(faults);
	return answer;
}
