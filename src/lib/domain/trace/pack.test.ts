import { inflateRawSync } from 'node:zlib';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { wanderingTrace } from '../../../../tests/bench/engine';
import { temperatureUnits } from '../units';
import { SharedRoom } from './room';
import { packTrace, TraceFault, unpackTrace, type TraceFaultCode } from './pack';
import type { Trace } from './trace';

const day = Date.UTC(2026, 2, 30);

function traceOf(
	steps: readonly number[],
	scaled: readonly number[],
	unit: Trace['unit'] = 'celsius'
): Trace {
	let time = day;
	return {
		unit,
		decimals: 1,
		times: Float64Array.from(scaled, (_, i) => (time += i === 0 ? 0 : (steps[i - 1] ?? 1))),
		scaled: Int32Array.from(scaled)
	};
}

function faultOf(work: () => unknown): TraceFaultCode | null {
	try {
		work();
		return null;
	} catch (error) {
		if (error instanceof TraceFault) return error.code;
		throw error;
	}
}

const small = traceOf([600_000, 600_000, 1_200_000], [12, -3, 40, 41], 'fahrenheit');

describe('a packed trace', () => {
	it('comes back digit for digit', () => {
		const steps = fc.array(fc.integer({ min: 1, max: 10_000_000 }), { minLength: 60, maxLength: 60 });
		const scaled = fc.array(fc.integer({ min: -(2 ** 31), max: 2 ** 31 - 1 }), { maxLength: 60 });
		fc.assert(
			fc.property(steps, scaled, fc.constantFrom(...temperatureUnits), (s, v, unit) => {
				const trace = traceOf(s, v, unit);
				expect(unpackTrace(packTrace(trace))).toEqual(trace);
			})
		);
	});

	it('comes back from the middle of a larger buffer, as a database gives it', () => {
		const packed = packTrace(small);
		const around = new Uint8Array(packed.length + 20);
		around.set(packed, 7);
		expect(unpackTrace(around.subarray(7, 7 + packed.length))).toEqual(small);
	});

	it('comes back in shared memory and by another inflater, digit for digit', () => {
		const room = new SharedRoom();
		const inflate = (packed: Uint8Array, bytes: number) => inflateRawSync(packed, { maxOutputLength: bytes });
		for (const trace of [wanderingTrace(3000), small, wanderingTrace(50)])
			expect(unpackTrace(packTrace(trace), { room, inflate })).toEqual(trace);
		// A longer run of steps than the payload has room for is no trace, whoever inflates it.
		const harmed = packTrace(small).slice(0, -1);
		expect(faultOf(() => unpackTrace(harmed, { room, inflate }))).not.toBeNull();
	});

	it('keeps runs of one step apart by whatever stands between them', () => {
		const gaps = [0, 60, 120, 180, 7200, 7260, 7320, 7321, 7322, 7323].map((seconds) => seconds * 1000);
		const trace: Trace = { ...small, times: Float64Array.from(gaps), scaled: new Int32Array(gaps.length) };
		expect(unpackTrace(packTrace(trace))).toEqual(trace);
	});

	it('may be empty or begin before 1970', () => {
		const empty = traceOf([], []);
		expect(unpackTrace(packTrace(empty))).toEqual(empty);
		const early: Trace = { ...small, times: Float64Array.of(-5e12, -4e12, 0, 7) };
		expect(unpackTrace(packTrace(early))).toEqual(early);
	});

	it('takes under 0.4 bytes a reading at a regular interval and 0.1° steps', () => {
		const trace = wanderingTrace(100_000);
		const packed = packTrace(trace);
		expect(packed.length / 100_000).toBeLessThan(0.4);
		expect(unpackTrace(packed)).toEqual(trace);
	});

	it('is the same bytes for the same trace', () => {
		expect(packTrace(small)).toEqual(packTrace(small));
	});
});

describe('packing', () => {
	it('refuses what is no trace', () => {
		const { times, scaled } = small;
		expect(faultOf(() => packTrace({ ...small, scaled: scaled.subarray(1) }))).toBe('lengths-differ');
		expect(faultOf(() => packTrace({ ...small, times: times.map((t) => t + 0.5) }))).toBe('time-not-whole');
		expect(faultOf(() => packTrace({ ...small, times: times.map(() => day) }))).toBe('times-not-ascending');
		expect(faultOf(() => packTrace({ ...small, times: times.map(() => NaN) }))).toBe('time-not-whole');
	});
});

describe('unpacking', () => {
	const packed = packTrace(small);
	const changed = (at: number, byte: number) => packed.map((was, i) => (i === at ? byte : was));

	it('refuses bytes that are not a trace', () => {
		expect(faultOf(() => unpackTrace(new Uint8Array()))).toBe('not-a-trace');
		expect(faultOf(() => unpackTrace(Uint8Array.from([80, 75, 3, 4])))).toBe('not-a-trace');
		expect(faultOf(() => unpackTrace(changed(2, 9)))).toBe('version-unknown');
		expect(faultOf(() => unpackTrace(changed(3, 9)))).toBe('not-a-trace');
		expect(faultOf(() => unpackTrace(changed(4, 77)))).toBe('not-a-trace');
	});

	it('refuses a blob cut anywhere', () => {
		for (let length = 0; length < packed.length; length++) {
			expect(faultOf(() => unpackTrace(packed.slice(0, length)))).not.toBeNull();
		}
	});

	it('never takes harmed bytes for another trace', () => {
		const long = packTrace(wanderingTrace(500));
		fc.assert(
			fc.property(
				fc.integer({ min: 5, max: long.length - 1 }),
				fc.integer({ min: 1, max: 255 }),
				(at, flip) => {
					const harmed = long.map((was, i) => (i === at ? was ^ flip : was));
					let read: Trace | null = null;
					const fault = faultOf(() => (read = unpackTrace(harmed)));
					// Deflate has bits that mean nothing; what is read is then the trace itself.
					if (fault === null) expect(read).toEqual(wanderingTrace(500));
				}
			),
			{ numRuns: 400 }
		);
	});

	it('allocates nothing for a header that claims what its bytes cannot hold', () => {
		const liar = Uint8Array.from([
			0x57, 0x54, 1, 0, 1, 0xff, 0xff, 0xff, 0x0f, 0xff, 0xff, 0xff, 0x7f, 0, 0, 0, 0, 1
		]);
		expect(faultOf(() => unpackTrace(liar))).toBe('not-a-trace');
	});
});
