/** Measures the main computations as ratios within one run: machines are noisy, ratios are not. */
import { measureEngine } from '../../tests/bench/engine';

const readings = Number(process.argv[2] ?? 1_000_000);
const { seconds, exponentialsPerReading, packedBytesPerReading } = measureEngine(readings, () =>
	performance.now()
);

console.log(
	`Assessing ${readings.toLocaleString('en')} readings, with limits, legs, a rolling window and both bounds:`
);
for (const [model, value] of Object.entries(seconds)) {
	const worth = exponentialsPerReading[model] ?? 0;
	console.log(`  ${model.padEnd(14)} ${value.toFixed(2)} s, ${worth.toFixed(1)} exponentials a reading`);
}
console.log(`Packed: ${packedBytesPerReading.toFixed(3)} bytes a reading`);
