import { execFile } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { readExport } from '../../src/lib/domain/ingest/read-export';
import { packTrace } from '../../src/lib/domain/trace/pack';
import { benchContext, benchExport } from './reader';

const megabyte = 1024 * 1024;

/** What one large export took of this process's memory beyond the bytes it came in. */
export interface PeakMemory {
	readonly fileMegabytes: number;
	readonly readings: number;
	/** Growth of the process at its highest, the file's bytes not counted. */
	readonly grownMegabytes: number;
	readonly packedMegabytes: number;
	readonly seconds: number;
}

/** Reads the export at a path to a packed trace; to be run in a process that has done nothing else. */
export function measurePeak(path: string): PeakMemory {
	const bytes = readFileSync(path);
	const before = process.memoryUsage().rss;
	const startedMs = performance.now();
	const ingestion = readExport(bytes, benchContext);
	if (ingestion.kind !== 'ok') throw new Error(`The export was not read: ${JSON.stringify(ingestion)}`);
	const { channels, temperature, readings } = ingestion.understanding;
	const trace = channels[temperature]?.trace;
	const packed = trace ? packTrace(trace).length : 0;
	return {
		fileMegabytes: bytes.length / megabyte,
		readings,
		grownMegabytes: (process.resourceUsage().maxRSS * 1024 - before) / megabyte,
		packedMegabytes: packed / megabyte,
		seconds: (performance.now() - startedMs) / 1000
	};
}

/** The same of an export of so many rows, in a process of its own started from the program that measures. */
export async function measurePeakApart(program: string, layout: string, rows: number): Promise<PeakMemory> {
	const folder = await mkdtemp(join(tmpdir(), 'wharfinger-bench-'));
	try {
		const path = join(folder, 'export');
		await writeFile(path, benchExport(layout, rows));
		const { stdout } = await promisify(execFile)(process.execPath, [program, '--peak', path]);
		return JSON.parse(stdout) as PeakMemory;
	} finally {
		await rm(folder, { recursive: true, force: true });
	}
}
