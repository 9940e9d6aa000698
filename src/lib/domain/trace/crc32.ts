/** One step of each byte value through the reflected polynomial. Source: ISO 3309, ITU-T V.42: 0xedb88320. */
const table = Uint32Array.from({ length: 256 }, (_, byte) => {
	let value = byte;
	for (let bit = 0; bit < 8; bit++) value = value & 1 ? (value >>> 1) ^ 0xedb88320 : value >>> 1;
	return value;
});

/** CRC-32 of the bytes; pass the last result as `before` to go on with a stream. */
export function crc32(bytes: Uint8Array, before = 0): number {
	let value = ~before;
	for (let i = 0; i < bytes.length; i++) {
		value = (table[(value ^ (bytes[i] as number)) & 0xff] as number) ^ (value >>> 8);
	}
	return ~value >>> 0;
}
