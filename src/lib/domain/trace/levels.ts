/** The distinct values of a trace, coldest first, and which of them each reading is. */
export interface Levels {
	readonly values: Int32Array;
	readonly levelOf: Uint32Array;
}

/** Up to this span of values a table by value is kept; past it (many decimals) a map. */
const widestTable = 1 << 20;

/** A logger writes few distinct temperatures: what depends on the temperature alone is worked out once a level. */
export function levelsOf(scaled: Int32Array): Levels {
	let min = scaled[0] ?? 0;
	let max = min;
	for (let i = 1; i < scaled.length; i++) {
		const value = scaled[i] as number;
		if (value < min) min = value;
		else if (value > max) max = value;
	}
	return max - min < widestTable ? byTable(scaled, min, max) : byMap(scaled);
}

function byTable(scaled: Int32Array, min: number, max: number): Levels {
	const table = new Uint32Array(max - min + 1);
	for (let i = 0; i < scaled.length; i++) table[(scaled[i] as number) - min] = 1;
	const values: number[] = [];
	for (let at = 0; at < table.length; at++) {
		if (table[at] === 1 && scaled.length > 0) table[at] = values.push(at + min) - 1;
	}
	const levelOf = new Uint32Array(scaled.length);
	for (let i = 0; i < scaled.length; i++) levelOf[i] = table[(scaled[i] as number) - min] as number;
	return { values: Int32Array.from(values), levelOf };
}

function byMap(scaled: Int32Array): Levels {
	const values = Int32Array.from(new Set(scaled)).sort();
	const known = new Map<number, number>();
	values.forEach((value, level) => known.set(value, level));
	const levelOf = new Uint32Array(scaled.length);
	for (let i = 0; i < scaled.length; i++) levelOf[i] = known.get(scaled[i] as number) as number;
	return { values, levelOf };
}
