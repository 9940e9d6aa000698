import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { ReadContext } from '../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../src/lib/domain/ingest/read-export';
import { mutated } from './mutate';
import { lacking } from './stands-in-file';

/** How a run of damaged files ended. */
export interface FuzzCounts {
	files: number;
	ok: number;
	/** Of those read, the ones with something said about them. */
	warned: number;
	question: number;
	refused: number;
	/** Numbers of the files that threw, took too long, or gave readings that are not in them, with what was seen. */
	faults: { file: number; what: string }[];
	slowestMs: number;
	slowestFile: number;
}

const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 3, 20, 12),
	siteZone: 'Europe/Amsterdam',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
const longestMs = 2000;

/** Every sample upload, as bytes. */
export function sampleFiles(folder = 'sample-uploads'): Buffer[] {
	return readdirSync(folder, { withFileTypes: true })
		.filter((entry) => entry.isFile() && entry.name !== 'README.md')
		.map((entry) => readFileSync(join(folder, entry.name)));
}

/** Processor time, so that a busy machine hangs no file. */
function cpuMs(): number {
	const { user, system } = process.cpuUsage();
	return (user + system) / 1000;
}

function runOne(file: number, samples: readonly Buffer[], counts: FuzzCounts): void {
	const bytes = mutated(samples, file);
	const before = cpuMs();
	const ingestion = readExport(bytes, context);
	const ms = cpuMs() - before;
	counts[ingestion.kind]++;
	if (ms > counts.slowestMs) [counts.slowestMs, counts.slowestFile] = [ms, file];
	if (ms > longestMs) counts.faults.push({ file, what: `took ${ms.toFixed(0)} ms` });
	if (ingestion.kind !== 'ok') return;
	if (ingestion.understanding.oddities.length > 0) counts.warned++;
	const lack = lacking(bytes, ingestion.understanding);
	if (lack !== null) counts.faults.push({ file, what: lack });
}

/** Reads so many damaged files, from number `first` on. */
export function runFuzz(first: number, files: number, samples = sampleFiles()): FuzzCounts {
	const counts: FuzzCounts = {
		files,
		ok: 0,
		warned: 0,
		question: 0,
		refused: 0,
		faults: [],
		slowestMs: 0,
		slowestFile: first
	};
	for (let file = first; file < first + files; file++) {
		try {
			runOne(file, samples, counts);
		} catch (error) {
			counts.faults.push({ file, what: String(error) });
		}
	}
	return counts;
}
