import { deflateSync, inflateSync } from 'fflate';
import { temperatureUnits } from '../units';
import { crc32 } from './crc32';
import { ownRoom, type Room } from './room';
import type { Trace } from './trace';
import { VarintReader, VarintWriter } from './varint';

/**
 * Layout of a packed trace: `W`, `T`, version, unit, decimals; count and payload length as varints; CRC-32 of the
 * payload, big-endian; then the payload, deflated. The payload holds the times (first, first step, then the change
 * of step), then the values (first, then the change), each as a signed varint: a steady logger writes zeros.
 */
const magic = [0x57, 0x54, 1] as const;
const headBytes = 5;
/** Deflate cannot shrink more than this; a header that claims more is not ours and is not allocated for. */
const deflateLimit = 1032;
/** Of a steady logger's 100,000 readings the highest level saves a tenth of the bytes for seven times the time. */
const deflateLevel = 6;
/** No file the reader takes holds more readings. */
const mostReadings = 50_000_000;
const mostDecimals = 9;
const longestTimeMs = 8.64e15 / 4;

export type TraceFaultCode =
	| 'not-a-trace'
	| 'version-unknown'
	| 'cut-short'
	| 'checksum-differs'
	| 'times-not-ascending'
	| 'time-not-whole'
	| 'lengths-differ'
	| 'value-out-of-range';

/** Packed bytes or a trace that cannot be what they claim. */
export class TraceFault extends Error {
	override readonly name = 'TraceFault';

	constructor(readonly code: TraceFaultCode) {
		super(code);
	}
}

/** The trace in one blob: under 0.4 bytes a reading at a regular interval and 0.1° steps. */
export function packTrace(trace: Trace): Uint8Array {
	const payload = payloadOf(trace);
	const packed = deflateSync(payload, { level: deflateLevel });
	const head = new VarintWriter(32);
	head.writeUnsigned(trace.times.length);
	head.writeUnsigned(payload.length);
	const blob = new Uint8Array(headBytes + head.bytes.length + 4 + packed.length);
	blob.set([...magic, temperatureUnits.indexOf(trace.unit), trace.decimals]);
	blob.set(head.bytes, headBytes);
	new DataView(blob.buffer).setUint32(headBytes + head.bytes.length, crc32(payload));
	blob.set(packed, headBytes + head.bytes.length + 4);
	return blob;
}

function payloadOf({ times, scaled }: Trace): Uint8Array {
	if (times.length !== scaled.length) throw new TraceFault('lengths-differ');
	const writer = new VarintWriter(times.length * 2 + 64);
	let time = 0;
	let step = 0;
	times.forEach((next, i) => {
		if (!Number.isInteger(next) || Math.abs(next) > longestTimeMs) throw new TraceFault('time-not-whole');
		if (i > 0 && next <= time) throw new TraceFault('times-not-ascending');
		// The first time stands alone: its distance from 1970 is no step.
		writer.writeSigned(i === 0 ? next : next - time - step);
		if (i > 0) step = next - time;
		time = next;
	});
	let value = 0;
	for (const next of scaled) {
		writer.writeSigned(next - value);
		value = next;
	}
	return writer.bytes;
}

/** How a blob is unpacked, where not in new memory by the inflater that runs everywhere. */
export interface Unpacking {
	/** In a shared one the trace lasts until the next is unpacked. */
	readonly room: Room;
	/** Of raw deflate; throws where the bytes are none, or more than so many come out. */
	readonly inflate: (packed: Uint8Array, bytes: number) => Uint8Array;
}

const unpackingAnywhere: Unpacking = {
	room: ownRoom,
	inflate: (packed, bytes) => inflateSync(packed, { out: new Uint8Array(bytes) })
};

/** The trace a blob holds, digit for digit; a `TraceFault` where the blob is not one or was harmed. */
export function unpackTrace(blob: Uint8Array, { room, inflate } = unpackingAnywhere): Trace {
	if (blob[0] !== magic[0] || blob[1] !== magic[1]) throw new TraceFault('not-a-trace');
	if (blob[2] !== magic[2]) throw new TraceFault('version-unknown');
	const unit = temperatureUnits[blob[3] ?? -1];
	const decimals = blob[4];
	if (unit === undefined || decimals === undefined || decimals > mostDecimals)
		throw new TraceFault('not-a-trace');
	const head = new VarintReader(blob, headBytes);
	const count = head.readUnsigned();
	const payloadBytes = head.readUnsigned();
	if (count === null || payloadBytes === null || blob.length < head.at + 4) throw new TraceFault('cut-short');
	const packed = blob.subarray(head.at + 4);
	// Two varints a reading, each of one to eight bytes.
	const isPlausible = count <= mostReadings && payloadBytes >= 2 * count && payloadBytes <= 16 * count;
	if (!isPlausible || payloadBytes > packed.length * deflateLimit) throw new TraceFault('not-a-trace');
	const payload = inflated(packed, payloadBytes, inflate);
	const expected = new DataView(blob.buffer, blob.byteOffset).getUint32(head.at);
	if (crc32(payload) !== expected) throw new TraceFault('checksum-differs');
	return { unit, decimals, ...columnsOf(payload, count, room) };
}

function inflated(packed: Uint8Array, payloadBytes: number, inflate: Unpacking['inflate']): Uint8Array {
	try {
		const payload = inflate(packed, payloadBytes);
		if (payload.length === payloadBytes) return payload;
	} catch {
		throw new TraceFault('cut-short');
	}
	throw new TraceFault('cut-short');
}

function columnsOf(payload: Uint8Array, count: number, room: Room): Pick<Trace, 'times' | 'scaled'> {
	const reader = new VarintReader(payload);
	const times = room.floats('times', count);
	const scaled = room.wholes('scaled', count);
	readTimes(reader, times);
	readValues(reader, scaled);
	if (reader.at !== payload.length) throw new TraceFault('not-a-trace');
	return { times, scaled };
}

function readTimes(reader: VarintReader, times: Float64Array): void {
	let time = 0;
	let step = 0;
	for (let i = 0; i < times.length; i++) {
		// A zero is the step before once more: most traces hold one run of them.
		for (let still = i < 2 ? 0 : reader.skipZeros(times.length - i); still > 0; still--) {
			time += step;
			times[i++] = time;
		}
		if (i >= times.length) break;
		const change = reader.readSigned();
		if (change === null) throw new TraceFault('cut-short');
		if (i > 0) step += change;
		if (i > 0 && step <= 0) throw new TraceFault('times-not-ascending');
		time = i === 0 ? change : time + step;
		times[i] = time;
	}
}

function readValues(reader: VarintReader, scaled: Int32Array): void {
	let value = 0;
	for (let i = 0; i < scaled.length; i++) {
		const change = reader.readSigned();
		if (change === null) throw new TraceFault('cut-short');
		value += change;
		if (value !== (value | 0)) throw new TraceFault('value-out-of-range');
		scaled[i] = value;
	}
}
