import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { canonicalTraceBytes } from './digest';
import { packTrace, unpackTrace } from './pack';
import type { Trace } from './trace';

const trace: Trace = {
	unit: 'celsius',
	decimals: 1,
	times: Float64Array.of(0, 600_000),
	scaled: Int32Array.of(45, -3)
};
const hash = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

describe('the canonical bytes of a trace', () => {
	it('are a line of text, then the times, then the temperatures, big-endian', () => {
		const bytes = canonicalTraceBytes(trace);
		const line = 'trace 1 celsius 1 2\n';
		expect(new TextDecoder().decode(bytes.subarray(0, line.length))).toBe(line);
		const rest = Buffer.from(bytes.subarray(line.length));
		expect(rest).toHaveLength(24);
		expect([rest.readDoubleBE(0), rest.readDoubleBE(8)]).toEqual([0, 600_000]);
		expect([rest.readInt32BE(16), rest.readInt32BE(20)]).toEqual([45, -3]);
	});

	it('are the same before and after packing', () => {
		expect(hash(canonicalTraceBytes(unpackTrace(packTrace(trace))))).toBe(hash(canonicalTraceBytes(trace)));
	});

	it('differ with any value, the unit and the decimals', () => {
		const others: Trace[] = [
			{ ...trace, unit: 'kelvin' },
			{ ...trace, decimals: 2 },
			{ ...trace, times: Float64Array.of(0, 600_001) },
			{ ...trace, scaled: Int32Array.of(45, -4) },
			{ ...trace, times: Float64Array.of(0), scaled: Int32Array.of(45) }
		];
		const hashes = [trace, ...others].map((one) => hash(canonicalTraceBytes(one)));
		expect(new Set(hashes).size).toBe(hashes.length);
	});
});
