import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { coldRoomTrace } from './engine';

/** The same cumulative life the way numpy would have it: exponentials, logarithmic means, a running sum. */
const program = `
import sys, time
import numpy as np
scaled = np.fromfile(sys.argv[1], dtype=np.int32)
times = np.arange(len(scaled)) * 60000.0
k = np.log(3) / 10
best = float('inf')
for _ in range(12):
    start = time.process_time()
    celsius = scaled / 10.0
    rate = np.exp(k * celsius)
    a, b, d = rate[:-1], rate[1:], k * np.diff(celsius)
    flat = d == 0
    mean = np.where(flat, a, (b - a) / np.where(flat, 1, d))
    used = np.cumsum(mean * np.diff(times) / 3.6e6)
    best = min(best, time.process_time() - start)
print(best * 1000, used[-1])
`;

/** Processor time of one run, ms, and the life used; null without python3-numpy. */
export function measureNumpy(readings: number): { ms: number; usedHours: number } | null {
	const folder = mkdtempSync(join(tmpdir(), 'wharfinger-bench-'));
	try {
		const path = join(folder, 'scaled.bin');
		writeFileSync(path, new Uint8Array(coldRoomTrace(readings).scaled.buffer));
		const run = spawnSync('python3', ['-c', program, path], { encoding: 'utf8' });
		if (run.status !== 0) return null;
		const [ms = NaN, usedHours = NaN] = run.stdout.trim().split(' ').map(Number);
		return { ms, usedHours };
	} finally {
		rmSync(folder, { recursive: true, force: true });
	}
}
