/** Where long arrays are laid out. Their contents are whatever was there before: who asks for one writes all of it. */
export interface Room {
	floats(name: string, length: number): Float64Array;
	wholes(name: string, length: number): Int32Array;
	bytes(name: string, length: number): Uint8Array;
}

/** New memory for every array: what is laid out in it is kept for as long as it is held. */
export const ownRoom: Room = {
	floats: (_, length) => new Float64Array(length),
	wholes: (_, length) => new Int32Array(length),
	bytes: (_, length) => new Uint8Array(length)
};

/**
 * The same memory for every assessment of a batch: what was laid out for one is overwritten by the next. Fresh pages
 * for a million readings cost the machine more than all the arithmetic on them.
 */
export class SharedRoom implements Room {
	readonly #kept = new Map<string, ArrayBuffer>();

	#buffer(name: string, bytes: number): ArrayBuffer {
		const kept = this.#kept.get(name);
		if (kept !== undefined && kept.byteLength >= bytes) return kept;
		const made = new ArrayBuffer(bytes);
		this.#kept.set(name, made);
		return made;
	}

	floats(name: string, length: number): Float64Array {
		return new Float64Array(this.#buffer(name, length * Float64Array.BYTES_PER_ELEMENT), 0, length);
	}

	wholes(name: string, length: number): Int32Array {
		return new Int32Array(this.#buffer(name, length * Int32Array.BYTES_PER_ELEMENT), 0, length);
	}

	bytes(name: string, length: number): Uint8Array {
		return new Uint8Array(this.#buffer(name, length), 0, length);
	}
}
