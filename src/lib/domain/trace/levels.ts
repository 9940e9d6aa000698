import { ownRoom, type Room } from './room';

/** The distinct values of a trace, coldest first, and which of them each reading is. */
export interface Levels {
	readonly values: Int32Array;
	readonly levelOf: Int32Array;
	readonly blocks: LevelBlocks;
}

/** So many readings make a block. */
export const blockReadings = 64;

/** The coldest and the warmest level of each block: who looks for readings past a limit passes over the others. */
export interface LevelBlocks {
	readonly coldest: Int32Array;
	readonly warmest: Int32Array;
}

/** Up to this span of values a table by value is kept; past it (many decimals) a map. */
const widestTable = 1 << 20;

/** A logger writes few distinct temperatures: what depends on the temperature alone is worked out once a level. */
export function levelsOf(scaled: Int32Array, room: Room = ownRoom): Levels {
	let min = scaled[0] ?? 0;
	let max = min;
	for (let i = 1; i < scaled.length; i++) {
		const value = scaled[i] as number;
		if (value < min) min = value;
		else if (value > max) max = value;
	}
	const { values, levelOf } = max - min < widestTable ? byTable(scaled, min, max, room) : byMap(scaled, room);
	return { values, levelOf, blocks: blocksOf(levelOf) };
}

function byTable(scaled: Int32Array, min: number, max: number, room: Room) {
	const table = new Int32Array(max - min + 1);
	for (let i = 0; i < scaled.length; i++) table[(scaled[i] as number) - min] = 1;
	const values: number[] = [];
	for (let at = 0; at < table.length; at++) {
		if (table[at] === 1 && scaled.length > 0) table[at] = values.push(at + min) - 1;
	}
	const levelOf = room.wholes('level', scaled.length);
	for (let i = 0; i < scaled.length; i++) levelOf[i] = table[(scaled[i] as number) - min] as number;
	return { values: Int32Array.from(values), levelOf };
}

function byMap(scaled: Int32Array, room: Room) {
	const values = Int32Array.from(new Set(scaled)).sort();
	const known = new Map<number, number>();
	values.forEach((value, level) => known.set(value, level));
	const levelOf = room.wholes('level', scaled.length);
	for (let i = 0; i < scaled.length; i++) levelOf[i] = known.get(scaled[i] as number) as number;
	return { values, levelOf };
}

/** The blocks of readings whose levels are known. */
export function blocksOf(levelOf: Int32Array): LevelBlocks {
	const count = Math.ceil(levelOf.length / blockReadings);
	const coldest = new Int32Array(count);
	const warmest = new Int32Array(count);
	for (let block = 0; block < count; block++) {
		const from = block * blockReadings;
		const to = Math.min(from + blockReadings, levelOf.length);
		let low = levelOf[from] as number;
		let high = low;
		for (let i = from + 1; i < to; i++) {
			const level = levelOf[i] as number;
			low = level < low ? level : low;
			high = level > high ? level : high;
		}
		coldest[block] = low;
		warmest[block] = high;
	}
	return { coldest, warmest };
}
