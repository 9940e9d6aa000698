/** Measures the main computations as ratios within one run: machines are noisy, ratios are not. */
import { engineLines, storedLines, whatIfLines } from '../../tests/bench/engine-lines';
import { measurePeak, measurePeakApart } from '../../tests/bench/peak-memory';
import { benchLayouts, measureReader } from '../../tests/bench/reader';

/** Processor time: what other programs do meanwhile does not count. */
const nowMs = () => {
	const { user, system } = process.cpuUsage();
	return (user + system) / 1000;
};
const fixed = (n: number, digits: number) => n.toFixed(digits);

function benchReader(): void {
	const rows = 100_000;
	console.log(
		`Reading ${rows.toLocaleString('en')} rows to a packed trace, against csv-parse over the same bytes (processor time):`
	);
	for (const layout of benchLayouts) {
		for (const way of ['in place', 'general'] as const) {
			const { splitMs, readMs, timesSplit, packedBytesPerReading } = measureReader(layout, rows, nowMs, way);
			console.log(
				`  ${layout.padEnd(42)} ${way.padEnd(9)} ${fixed(readMs, 0).padStart(4)} ms / ${fixed(splitMs, 0)} ms = ` +
					`${fixed(timesSplit, 2)} times, ${fixed(packedBytesPerReading, 3)} bytes a reading`
			);
		}
	}
}

async function benchMemory(program: string): Promise<void> {
	console.log('Peak memory beyond the bytes of the file, each in a process of its own:');
	for (const rows of [500_000, 1_000_000, 2_000_000]) {
		const peak = await measurePeakApart(program, benchLayouts[0] ?? '', rows);
		console.log(
			`  ${fixed(peak.fileMegabytes, 0).padStart(3)} MB, ${peak.readings.toLocaleString('en')} readings: ` +
				`${fixed(peak.grownMegabytes, 0)} MB, ${fixed(peak.grownMegabytes / peak.fileMegabytes, 1)} bytes a byte, ` +
				`packed ${fixed(peak.packedMegabytes, 2)} MB, ${fixed(peak.seconds, 1)} s`
		);
	}
}

async function benchEngine(readings: number): Promise<void> {
	for (const line of engineLines(readings)) console.log(line);
	for (const line of whatIfLines()) console.log(line);
	for (const line of await storedLines()) console.log(line);
}

const [program = '', first, path = ''] = process.argv.slice(1);
if (first === '--peak') console.log(JSON.stringify(measurePeak(path)));
else if (first === '--stored') for (const line of await storedLines()) console.log(line);
else {
	benchReader();
	await benchMemory(program);
	await benchEngine(Number(first ?? 1_000_000));
}
