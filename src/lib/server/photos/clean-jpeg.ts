/** Markers of a JPEG stream. Source: ITU-T T.81, table B.1. */
const startOfImage = 0xd8;
const endOfImage = 0xd9;
const startOfScan = 0xda;
const comment = 0xfe;
/** Application segments; JFIF (0), a colour profile (2) and the colour transform (14) belong to the picture. */
const firstApplication = 0xe0;
const lastApplication = 0xef;
const keptApplications = new Set([0xe0, 0xe2, 0xee]);

function isStandalone(marker: number): boolean {
	return marker === 0x01 || (marker >= 0xd0 && marker <= 0xd7);
}

function isDropped(marker: number): boolean {
	const isApplication = marker >= firstApplication && marker <= lastApplication;
	return marker === comment || (isApplication && !keptApplications.has(marker));
}

/** Where the next marker stands after coded data: a 0xFF that is neither stuffed nor a restart. */
function nextMarkerAt(bytes: Uint8Array, from: number): number {
	for (let at = from; at + 1 < bytes.length; at++) {
		const following = bytes[at + 1] ?? 0;
		if (bytes[at] === 0xff && following !== 0 && following !== 0xff && !isStandalone(following)) return at;
	}
	return -1;
}

/**
 * The picture without what a camera writes about itself and its place (EXIF and other application segments, comments)
 * and without anything behind its end. Null where the bytes are no whole JPEG.
 */
export function cleanJpeg(bytes: Uint8Array): Uint8Array | null {
	if (bytes[0] !== 0xff || bytes[1] !== startOfImage) return null;
	const kept: Uint8Array[] = [bytes.subarray(0, 2)];
	let hasScan = false;
	let at = 2;
	while (at + 1 < bytes.length) {
		if (bytes[at] !== 0xff) return null;
		const marker = bytes[at + 1] ?? 0;
		if (marker === endOfImage) return hasScan ? joined([...kept, bytes.subarray(at, at + 2)]) : null;
		if (marker === 0xff) {
			at += 1;
			continue;
		}
		if (isStandalone(marker)) return null;
		const length = ((bytes[at + 2] ?? 0) << 8) | (bytes[at + 3] ?? 0);
		if (length < 2) return null;
		let end = at + 2 + length;
		if (marker === startOfScan) {
			hasScan = true;
			end = nextMarkerAt(bytes, end);
			if (end < 0) return null;
		}
		if (end > bytes.length) return null;
		if (!isDropped(marker)) kept.push(bytes.subarray(at, end));
		at = end;
	}
	return null;
}

function joined(parts: readonly Uint8Array[]): Uint8Array {
	const whole = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
	let at = 0;
	for (const part of parts) {
		whole.set(part, at);
		at += part.length;
	}
	return whole;
}
