import type { Readable } from 'node:stream';
import { safeFileName } from '../reports/safe-file-name';
import { fileStore } from '../storage/store';
import type { Row } from './docket-records';

interface NamedFile {
	fileName: string;
	open: () => Promise<Readable>;
}

interface KeptRow {
	id: string;
	sha256: string;
}

/** Files whose bytes are still there, as the copy's own records name them. */
function keptRows(records: Map<string, Row[]>): KeptRow[] {
	return (records.get('files') ?? [])
		.filter((row) => (row.deleted_at ?? null) === null)
		.map((row) => ({ id: String(row.id), sha256: String(row.sha256) }));
}

const openOf = (sha256: string) => async () => (await fileStore()).open(sha256);

/**
 * What a copy's records name beside reports, exports and photographs: notes' files under their names, everything else
 * (papers of a claim, a driver's signature, exports that could not be read) under its hash. None is left out.
 */
export function otherFiles(records: Map<string, Row[]>, covered: ReadonlySet<string>): NamedFile[] {
	const kept = keptRows(records);
	const ofNotes = (records.get('note_files') ?? []).flatMap((row, at): (NamedFile & KeptRow)[] => {
		const file = kept.find(({ id }) => id === String(row.file_id));
		const fileName = `notes/${at + 1}-${safeFileName(String(row.file_name))}`;
		return file ? [{ ...file, fileName, open: openOf(file.sha256) }] : [];
	});
	const named = new Set([...covered, ...ofNotes.map(({ sha256 }) => sha256)]);
	const rest = kept
		.filter(({ sha256 }) => !named.has(sha256))
		.map(({ sha256 }) => ({ fileName: `files/${sha256}`, open: openOf(sha256) }));
	return [...ofNotes, ...rest];
}
