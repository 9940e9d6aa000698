import { gunzipSync, gzipSync } from 'node:zlib';

/** A small seeded generator (mulberry32): a failing case can be run again by its number. */
export function seeded(seed: number): () => number {
	let a = seed;
	return () => {
		a = (a + 0x6d2b79f5) | 0;
		let t = Math.imul(a ^ (a >>> 15), 1 | a);
		t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
		return ((t ^ (t >>> 14)) >>> 0) / 4_294_967_296;
	};
}

type Random = () => number;
type Mutation = (bytes: Buffer, random: Random, other: Buffer) => Buffer;

const upTo = (random: Random, most: number): number => Math.floor(random() * most);

function stretch(bytes: Buffer, random: Random): [number, number] {
	const [p, q] = [upTo(random, bytes.length + 1), upTo(random, bytes.length + 1)];
	return p < q ? [p, q] : [q, p];
}

/** Puts the lines of a file in another order, or some of them twice. */
function onLines(change: (lines: string[], random: Random) => void): Mutation {
	return (bytes, random) => {
		const lines = bytes.toString('latin1').split('\n');
		change(lines, random);
		return Buffer.from(lines.join('\n'), 'latin1');
	};
}

const marks = [',', ';', '\t', '"', '.', '-', ':', '\r', '\n', '\0', '{', ']', ' ', '°', 'F', '0', '9', 'e5'];

/** What happens to files on their way: one of these, or several after each other. */
const mutations: readonly Mutation[] = [
	// Bits flipped.
	(bytes, random) => {
		const out = Buffer.from(bytes);
		for (let n = upTo(random, 8); n >= 0 && out.length > 0; n--) {
			const at = upTo(random, out.length);
			out[at] = (out[at] ?? 0) ^ (1 << upTo(random, 8));
		}
		return out;
	},
	// Any bytes written over.
	(bytes, random) => {
		const out = Buffer.from(bytes);
		for (let n = upTo(random, 6); n >= 0 && out.length > 0; n--)
			out[upTo(random, out.length)] = upTo(random, 256);
		return out;
	},
	// Cut off; a stretch cut out; a stretch repeated.
	(bytes, random) => bytes.subarray(0, upTo(random, bytes.length + 1)),
	(bytes, random) => {
		const [p, q] = stretch(bytes, random);
		return Buffer.concat([bytes.subarray(0, p), bytes.subarray(q)]);
	},
	(bytes, random) => {
		const [p, q] = stretch(bytes, random);
		return Buffer.concat([bytes.subarray(0, q), bytes.subarray(p)]);
	},
	// Spliced with a part of another file.
	(bytes, random, other) => {
		const [p] = stretch(bytes, random);
		const [from, to] = stretch(other, random);
		return Buffer.concat([bytes.subarray(0, p), other.subarray(from, to), bytes.subarray(p)]);
	},
	// A mark typed in, or one mark for another throughout.
	(bytes, random) => {
		const at = upTo(random, bytes.length + 1);
		const mark = Buffer.from(marks[upTo(random, marks.length)] ?? '');
		return Buffer.concat([bytes.subarray(0, at), mark, bytes.subarray(at)]);
	},
	(bytes, random) => {
		const [from, to] = [marks[upTo(random, 7)] ?? ',', marks[upTo(random, 7)] ?? ';'];
		return Buffer.from(bytes.toString('latin1').replaceAll(from, to), 'latin1');
	},
	// Lines swapped, lines repeated, lines lost.
	onLines((lines, random) => {
		const [p, q] = [upTo(random, lines.length), upTo(random, lines.length)];
		[lines[p], lines[q]] = [lines[q] ?? '', lines[p] ?? ''];
	}),
	onLines((lines, random) => {
		const at = upTo(random, lines.length);
		lines.splice(upTo(random, lines.length), 0, ...lines.slice(at, at + 1 + upTo(random, 4)));
	}),
	onLines((lines, random) => {
		lines.splice(upTo(random, lines.length), 1 + upTo(random, 5));
	})
];

/** The n-th damaged file made of these samples; the same every time. */
export function mutated(samples: readonly Buffer[], n: number): Buffer {
	const random = seeded(n);
	const pick = (): Buffer => samples[upTo(random, samples.length)] ?? Buffer.alloc(0);
	const source = pick();
	const isPacked = source[0] === 0x1f && source[1] === 0x8b;
	// Damage behind the checksum reaches the reader; damage of the archive does not get past it.
	const isInside = isPacked && random() < 0.8;
	let bytes: Buffer = isInside ? gunzipSync(source) : source;
	// Mostly the head of a file: thousands stay quick, and heads decide how a file is read.
	if (random() < 0.95) bytes = bytes.subarray(0, 200 + upTo(random, 1200));
	for (let change = upTo(random, 3); change >= 0; change--) {
		const mutation = mutations[upTo(random, mutations.length)];
		if (mutation !== undefined) bytes = mutation(bytes, random, pick());
	}
	return isInside ? gzipSync(bytes, { level: 1 }) : bytes;
}
