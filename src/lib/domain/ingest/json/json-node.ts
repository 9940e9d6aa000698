import { maxJsonDepth } from '../bounds';

export interface JsonObject {
	readonly type: 'object';
	readonly at: number;
	/** Plain parallel lists: a key named `__proto__` is a key like any other. */
	readonly keys: readonly string[];
	readonly values: JsonNode[];
}
export interface JsonArray {
	readonly type: 'array';
	readonly at: number;
	readonly items: JsonNode[];
}
/** Numbers keep their text: 4.10 has two decimals, and nothing is lost to binary fractions. */
export interface JsonNumber {
	readonly type: 'number';
	readonly text: string;
}
export type JsonNode = JsonObject | JsonArray | JsonNumber | string | boolean | null;

export type JsonFault = { readonly code: 'broken-json' | 'too-deep' | 'truncated'; readonly at: number };
export type JsonParsed = { readonly node: JsonNode; readonly end: number } | JsonFault;

/** Heads of rows repeat: a list of keys that equals the last row's is kept once. */
const mostSharedKeys = 64;

class FaultAt extends Error {
	constructor(readonly fault: JsonFault) {
		super(fault.code);
	}
}

const numberPattern = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const escapes: Readonly<Record<string, string>> = {
	'"': '"',
	'\\': '\\',
	'/': '/',
	b: '\b',
	f: '\f',
	n: '\n',
	r: '\r',
	t: '\t'
};

const longestShared = 8;
const sharedNumbers = 8192;

/** One pass over the text by the grammar of RFC 8259, with a bound on depth. NaN and Infinity are taken as null. */
class Reader {
	i: number;
	/** By depth, the keys of the object read last. */
	readonly lastKeys: (readonly string[])[] = [];
	readonly numbers: (JsonNumber | undefined)[] = [];
	/** Values of what is open, innermost last: a list grown by itself would keep room for seventeen. */
	readonly open: JsonNode[] = [];
	top = 0;
	constructor(
		readonly text: string,
		from: number
	) {
		this.i = from;
	}

	fail(code: JsonFault['code'] = 'broken-json'): never {
		throw new FaultAt({
			code: this.i >= this.text.length ? 'truncated' : code,
			at: Math.min(this.i, this.text.length)
		});
	}

	space(): number {
		for (;;) {
			const code = this.text.charCodeAt(this.i);
			if (code !== 32 && code !== 10 && code !== 13 && code !== 9 && code !== 0xfeff) return code;
			this.i++;
		}
	}

	value(depth: number): JsonNode {
		if (depth > maxJsonDepth) throw new FaultAt({ code: 'too-deep', at: this.i });
		const code = this.space();
		if (code === 123) return this.object(depth);
		if (code === 91) return this.array(depth);
		if (code === 34) return this.string();
		if (code === 45 || (code >= 48 && code <= 57)) return this.number();
		return this.word();
	}

	object(depth: number): JsonObject {
		const at = this.i++;
		const known = this.lastKeys[depth] ?? [];
		const base = this.top;
		let own: string[] | null = null;
		if (this.space() === 125) {
			this.i++;
			return { type: 'object', at, keys: [], values: [] };
		}
		for (;;) {
			if (this.space() !== 34) this.fail();
			const expected = known[this.top - base];
			if (own === null && expected !== undefined && this.startsWithKey(expected)) {
				this.i += expected.length + 2;
			} else {
				own ??= known.slice(0, this.top - base);
				own.push(this.string());
			}
			if (this.space() !== 58) this.fail();
			this.i++;
			this.open[this.top++] = this.value(depth + 1);
			const next = this.space();
			if (next !== 44 && next !== 125) this.fail();
			this.i++;
			if (next === 125) break;
		}
		const values = this.closed(base);
		const keys = own ?? (values.length === known.length ? known : known.slice(0, values.length));
		if (keys.length <= mostSharedKeys) this.lastKeys[depth] = keys;
		return { type: 'object', at, keys, values };
	}

	/** Whether the quoted key at this place is just this text; one with escapes is read in full. */
	startsWithKey(key: string): boolean {
		const { text, i } = this;
		if (text.charCodeAt(i + key.length + 1) !== 34) return false;
		for (let k = 0; k < key.length; k++) {
			const code = text.charCodeAt(i + 1 + k);
			if (code !== key.charCodeAt(k) || code === 92 || code === 34) return false;
		}
		return true;
	}

	array(depth: number): JsonArray {
		const at = this.i++;
		const base = this.top;
		if (this.space() === 93) {
			this.i++;
			return { type: 'array', at, items: [] };
		}
		for (;;) {
			this.open[this.top++] = this.value(depth + 1);
			const next = this.space();
			if (next !== 44 && next !== 93) this.fail();
			this.i++;
			if (next === 93) return { type: 'array', at, items: this.closed(base) };
		}
	}

	/** What was opened last, in a list of just its length. */
	closed(base: number): JsonNode[] {
		const items = this.open.slice(base, this.top);
		this.top = base;
		return items;
	}

	string(): string {
		const start = ++this.i;
		for (; this.i < this.text.length; this.i++) {
			const code = this.text.charCodeAt(this.i);
			if (code === 34) return this.text.slice(start, this.i++);
			if (code === 92) return this.escaped(start);
			if (code < 32 && code !== 9) this.fail();
		}
		return this.fail();
	}

	escaped(start: number): string {
		let out = this.text.slice(start, this.i);
		for (; this.i < this.text.length; this.i++) {
			const letter = this.text[this.i] ?? '';
			if (letter === '"') {
				this.i++;
				return out;
			}
			if (letter !== '\\') {
				out += letter;
				continue;
			}
			const next = this.text[++this.i] ?? '';
			if (next === 'u') {
				const hex = this.text.slice(this.i + 1, this.i + 5);
				if (!/^[0-9a-fA-F]{4}$/.test(hex)) this.fail();
				out += String.fromCharCode(parseInt(hex, 16));
				this.i += 4;
			} else if (Object.hasOwn(escapes, next)) out += escapes[next];
			else this.fail();
		}
		return this.fail();
	}

	number(): JsonNode {
		numberPattern.lastIndex = this.i;
		if (!numberPattern.test(this.text))
			return this.text.startsWith('-Infinity', this.i) ? this.nothing('-Infinity') : this.fail();
		const [from, to] = [this.i, numberPattern.lastIndex];
		this.i = to;
		return this.numberAt(from, to);
	}

	/** Temperatures come back again and again: each short text is kept once. */
	numberAt(from: number, to: number): JsonNumber {
		if (to - from > longestShared) return { type: 'number', text: this.text.slice(from, to) };
		let hash = 0;
		for (let i = from; i < to; i++) hash = (hash * 31 + this.text.charCodeAt(i)) & (sharedNumbers - 1);
		const known = this.numbers[hash];
		if (known?.text.length === to - from && this.text.startsWith(known.text, from)) return known;
		const number: JsonNumber = { type: 'number', text: this.text.slice(from, to) };
		this.numbers[hash] = number;
		return number;
	}

	nothing(word: string): null {
		this.i += word.length;
		return null;
	}

	word(): boolean | null {
		for (const word of ['true', 'false', 'null', 'NaN', 'Infinity']) {
			if (!this.text.startsWith(word, this.i)) continue;
			this.i += word.length;
			return word === 'true' ? true : word === 'false' ? false : null;
		}
		if (['true', 'false', 'null'].some((word) => word.startsWith(this.text.slice(this.i))))
			this.i = this.text.length;
		return this.fail();
	}
}

/** Parses one JSON value that starts at or after `from`. */
export function parseJson(text: string, from: number): JsonParsed {
	const reader = new Reader(text, from);
	try {
		const node = reader.value(0);
		return { node, end: reader.i };
	} catch (error) {
		if (error instanceof FaultAt) return error.fault;
		throw error;
	}
}

/** The last value under a key, or undefined. */
export function memberOf(object: JsonObject, key: string): JsonNode | undefined {
	const at = object.keys.lastIndexOf(key);
	return at < 0 ? undefined : object.values[at];
}

export const isObject = (node: JsonNode | undefined): node is JsonObject =>
	typeof node === 'object' && node !== null && node.type === 'object';
export const isArray = (node: JsonNode | undefined): node is JsonArray =>
	typeof node === 'object' && node !== null && node.type === 'array';

/** Text of a scalar as the file wrote it; null for objects, arrays and nothing. */
export function textOfScalar(node: JsonNode | undefined): string | null {
	if (typeof node === 'string') return node;
	if (typeof node === 'boolean') return String(node);
	if (node === null || node === undefined) return null;
	return node.type === 'number' ? node.text : null;
}
