import type { Trace } from './trace';

/**
 * The bytes a trace is hashed over: values, never their compression, so that the hash outlives the packing.
 * One ASCII line `trace 1 <unit> <decimals> <count>`, then the times as big-endian doubles, then the scaled
 * temperatures as big-endian 32-bit integers.
 */
export function canonicalTraceBytes(trace: Trace): Uint8Array {
	const count = trace.times.length;
	const line = `trace 1 ${trace.unit} ${trace.decimals} ${count}\n`;
	const bytes = new Uint8Array(line.length + count * 12);
	for (let i = 0; i < line.length; i++) bytes[i] = line.charCodeAt(i);
	const view = new DataView(bytes.buffer, line.length);
	for (let i = 0; i < count; i++) {
		view.setFloat64(i * 8, trace.times[i] as number);
		view.setInt32(count * 8 + i * 4, trace.scaled[i] as number);
	}
	return bytes;
}
