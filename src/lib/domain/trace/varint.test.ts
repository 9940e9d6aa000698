import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { VarintReader, VarintWriter } from './varint';

describe('varint', () => {
	it('brings every whole number back', () => {
		const whole = fc.integer({ min: -(2 ** 52), max: 2 ** 52 });
		fc.assert(
			fc.property(fc.array(whole), (numbers) => {
				const writer = new VarintWriter(0);
				for (const n of numbers) writer.writeSigned(n);
				const reader = new VarintReader(writer.bytes);
				// 2^53 folded is beyond a safe integer; the reader refuses it rather than guess.
				for (const n of numbers)
					expect(reader.readSigned()).toBe(Math.abs(n) === 2 ** 52 && n > 0 ? null : n === 0 ? 0 : n);
				expect(reader.at).toBe(writer.bytes.length);
			})
		);
	});

	it('spends one byte on a small step', () => {
		const writer = new VarintWriter(16);
		for (const n of [0, 1, -1, 63, -64]) writer.writeSigned(n);
		expect(writer.bytes).toHaveLength(5);
	});

	it('passes over zeros, as many as stand there and as were asked for', () => {
		const reader = new VarintReader(Uint8Array.of(0, 0, 0, 2, 0));
		expect(reader.skipZeros(2)).toBe(2);
		expect(reader.skipZeros(9)).toBe(1);
		expect(reader.skipZeros(9)).toBe(0);
		expect(reader.readSigned()).toBe(1);
		expect(reader.skipZeros(9)).toBe(1);
		expect(reader.skipZeros(9)).toBe(0);
		expect(reader.readSigned()).toBeNull();
	});

	it('says so when the bytes end early', () => {
		expect(new VarintReader(Uint8Array.of()).readUnsigned()).toBeNull();
		expect(new VarintReader(Uint8Array.of(128)).readSigned()).toBeNull();
	});

	it('refuses a number that does not end', () => {
		expect(new VarintReader(new Uint8Array(20).fill(255)).readUnsigned()).toBeNull();
	});
});
