/** Grows as it is written: whole numbers in as few bytes as they need, seven bits a byte, sign in the lowest bit. */
export class VarintWriter {
	#bytes: Uint8Array;
	#length = 0;

	constructor(capacityBytes: number) {
		this.#bytes = new Uint8Array(Math.max(16, capacityBytes));
	}

	/** Appends any whole number whose double is still whole: |n| ≤ 2^52. */
	writeSigned(n: number): void {
		this.writeUnsigned(n >= 0 ? n * 2 : -n * 2 - 1);
	}

	writeUnsigned(n: number): void {
		if (this.#length + 8 > this.#bytes.length) {
			const grown = new Uint8Array(this.#bytes.length * 2);
			grown.set(this.#bytes);
			this.#bytes = grown;
		}
		// Division, not shifts: the numbers pass 32 bits.
		let left = n;
		while (left >= 128) {
			this.#bytes[this.#length++] = (left % 128) | 128;
			left = Math.floor(left / 128);
		}
		this.#bytes[this.#length++] = left;
	}

	get bytes(): Uint8Array {
		return this.#bytes.subarray(0, this.#length);
	}
}

/** Reads back what a VarintWriter wrote; null where the bytes end early or a number is too long. */
export class VarintReader {
	readonly #bytes: Uint8Array;
	#at: number;

	constructor(bytes: Uint8Array, at = 0) {
		this.#bytes = bytes;
		this.#at = at;
	}

	readUnsigned(): number | null {
		let value = 0;
		let weight = 1;
		for (let length = 0; length < 8; length++) {
			const byte = this.#bytes[this.#at++];
			if (byte === undefined) return null;
			value += (byte % 128) * weight;
			if (byte < 128) return value <= Number.MAX_SAFE_INTEGER ? value : null;
			weight *= 128;
		}
		return null;
	}

	/** Passes over the zeros that stand next, so many at most, and says how many there were. */
	skipZeros(most: number): number {
		const end = Math.min(this.#bytes.length, this.#at + most);
		const from = this.#at;
		let at = from;
		while (at < end && this.#bytes[at] === 0) at++;
		this.#at = at;
		return at - from;
	}

	readSigned(): number | null {
		const byte = this.#bytes[this.#at];
		// Nearly all are of one byte: a steady logger writes small steps.
		if (byte !== undefined && byte < 128) {
			this.#at++;
			return byte % 2 === 0 ? byte >> 1 : -((byte + 1) >> 1);
		}
		const folded = this.readUnsigned();
		if (folded === null) return null;
		return folded % 2 === 0 ? folded / 2 : -(folded + 1) / 2;
	}

	get at(): number {
		return this.#at;
	}
}
