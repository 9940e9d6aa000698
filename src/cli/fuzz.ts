/** Reads damaged exports by the hundred thousand and prints how they ended; fails on any fault. */
import { runFuzz } from '../../tests/fuzz/run-fuzz';

const files = Number(process.argv[2] ?? 100_000);
const first = Number(process.argv[3] ?? 1);
const atOnce = 10_000;
const total = { ok: 0, warned: 0, question: 0, refused: 0, faults: 0, slowestMs: 0, slowestFile: first };
const startedMs = performance.now();

for (let done = 0; done < files; done += atOnce) {
	const counts = runFuzz(first + done, Math.min(atOnce, files - done));
	for (const key of ['ok', 'warned', 'question', 'refused'] as const) total[key] += counts[key];
	if (counts.slowestMs > total.slowestMs) {
		total.slowestMs = counts.slowestMs;
		total.slowestFile = counts.slowestFile;
	}
	for (const { file, what } of counts.faults) console.log(`  file ${file}: ${what}`);
	total.faults += counts.faults.length;
	console.log(`${(done + counts.files).toLocaleString('en')} files …`);
}

const seconds = (performance.now() - startedMs) / 1000;
console.log(`${files.toLocaleString('en')} damaged files in ${seconds.toFixed(0)} s`);
console.log(`  read      ${total.ok}, of which ${total.warned} with warnings`);
console.log(`  asked     ${total.question}`);
console.log(`  refused   ${total.refused}`);
console.log(`  faults    ${total.faults} (thrown, over 2 s, or readings that are not in the file)`);
console.log(`  slowest   ${total.slowestMs.toFixed(0)} ms of processor time (file ${total.slowestFile})`);
process.exitCode = total.faults === 0 ? 0 : 1;
