import { cellKindOf, epochUnitOf } from '../cells/cell-kind';
import { sampleIndexes } from '../delimited/delimiter';
import { foldWord } from '../times/month-names';
import { profileColumns, type Column } from './columns';
import type { Sections, Table } from './table';
import { meaningOf } from './words';
import { columnsOf, findTiming } from './timing';

const sensorWords =
	/\b(sensor|probe|channel|logger|device|serial|kanal|fuhler|sonde|canal|sonda|sensore|capteur|voeler|czujnik|gerat|appareil|dispositivo|imei|unit ?id|sn|ch)\b|传感器|センサ|센서|датчик|设备/;
/** Words that name what a row is about only where rows share their moments. */
const quantityWords =
	/\b(parameter|quantity|variable|metric|measurement|measure|measurand|signal|messgrosse|grosse|grandeur|magnitud|grandezza|grootheid|wielkosc|type|kind|series|field|item|name|location|position|place|zone|node|tag|station|port)\b|项目|項目|参数|параметр/;
const stateWords = /\b(status|state|fault|error|alarm|event|version|firmware|model|unit)\b/;
/** More are measurements of their own (texts, places), not sensors. */
const mostKeys = 32;

interface Keyed {
	/** Columns that name the sensor or quantity of a row. */
	readonly keys: readonly number[];
	readonly values: readonly Column[];
	readonly times: readonly number[];
	readonly unit: number;
}

const isKeyHead = (name: string, words: RegExp): boolean =>
	words.test(
		foldWord(name.replace(/(\p{Ll})(\p{Lu})/gu, '$1 $2'))
			.replace(/[_.\-/()]/g, ' ')
			.trim()
	);

function distinctIn(table: Table, column: number): Set<string> {
	const seen = new Set<string>();
	for (const row of sampleIndexes(table.rowCount, 2000)) {
		const cell = (table.cells(row)[column] ?? '').trim();
		if (cell !== '') seen.add(cell);
		if (seen.size > mostKeys) break;
	}
	return seen;
}

/** Whether rows share their moment with the row above while their keys differ, as they do where each sensor has a row. */
function sharesMoments(table: Table, times: readonly number[], key: number): boolean {
	const rows = Math.min(table.rowCount, 400);
	let shared = 0;
	let last: readonly string[] = [];
	for (let row = 0; row < rows; row++) {
		const cells = table.cells(row);
		if (row > 0 && times.every((at) => cells[at] === last[at]) && cells[key] !== last[key]) shared++;
		last = cells;
	}
	return shared >= rows * 0.3;
}

/** "Probe 2", "Sensor 1 (°C)": a numbered or measured column holds what that sensor read, not which one it was. */
function isReadingHead({ name, unit, share }: Column): boolean {
	return share.text <= 0.5 && (unit !== null || /\d\s*(?:[([].*)?$/.test(name));
}

/** Sensors are numbered in whole numbers. */
const isDecimal = (cell: string): boolean => /^[-+\u2212]?\d*[.,]\d+$/.test(cell);

const isUnitHead = (name: string): boolean =>
	/\b(unit|units|uom|einheit|unite|unidad|unita|eenheid)\b|单位/.test(foldWord(name).replace(/[_.]/g, ' '));

function keyedIn(table: Table): Keyed | null {
	const columns = profileColumns(table);
	const timing = findTiming(columns);
	const times = columnsOf(timing);
	if (times.length === 0) return null;
	const isKey = (column: Column): boolean => {
		if (times.includes(column.index) || column.name === '' || isUnitHead(column.name)) return false;
		const isSensor = isKeyHead(column.name, sensorWords) && column.meaning.quantity === null;
		const isQuantity = isKeyHead(column.name, quantityWords) && column.share.text > 0.5;
		if ((!isSensor && !isQuantity) || isKeyHead(column.name, stateWords)) return false;
		if (isReadingHead(column)) return false;
		if (!isSensor && !sharesMoments(table, times, column.index)) return false;
		const seen = distinctIn(table, column.index);
		return seen.size >= 2 && seen.size <= mostKeys && ![...seen].some(isDecimal);
	};
	const keys = columns.filter(isKey).map(({ index }) => index);
	const values = columns.filter(
		(column) =>
			!times.includes(column.index) &&
			!keys.includes(column.index) &&
			column.share.number > 0.3 &&
			column.epochUnit === null &&
			!column.meaning.isLimit &&
			!(column.meaning.isIndex && column.meaning.quantity === null)
	);
	const unit = columns.find(
		(column) => isUnitHead(column.name) && column.share.text + column.share.missing > 0.3
	);
	return keys.length === 0 || values.length === 0 ? null : { keys, values, times, unit: unit?.index ?? -1 };
}

const timeOf = (cells: readonly string[], { times }: Keyed): string =>
	times
		.map((at) => cells[at] ?? '')
		.join(' ')
		.trim();
const keyOf = (cells: readonly string[], { keys }: Keyed): string =>
	keys
		.map((at) => (cells[at] ?? '').trim())
		.join(' ')
		.trim();

interface Runs {
	/** First row of each run of rows with one key, and that key. */
	readonly starts: readonly number[];
	readonly names: readonly string[];
}

/** Rows with one key stand together, each key once: blocks one below the other. Null when keys alternate. */
function blocksIn(table: Table, keyed: Keyed): Runs | null {
	const starts: number[] = [];
	const names: string[] = [];
	for (let row = 0; row < table.rowCount; row++) {
		const cells = table.cells(row);
		const key = keyOf(cells, keyed);
		if (key === '' || key === names.at(-1)) continue;
		if (cellKindOf(timeOf(cells, keyed)) === 'text' && epochUnitOf(Number(timeOf(cells, keyed))) === null)
			continue;
		if (names.includes(key)) return null;
		starts.push(row);
		names.push(key);
	}
	return { starts, names };
}

/** Blocks named by what they measure: of a humidity's nobody need be asked. A name that says nothing may be anything. */
function isTemperatureBlock(name: string): boolean {
	const { quantity } = meaningOf(name);
	return quantity === null || quantity === 'temperature';
}

function blockOf(table: Table, from: number, to: number): Table {
	return {
		...table,
		rowText: null,
		rowCount: to - from,
		cells: (row) => table.cells(row + from),
		lineOf: (row) => table.lineOf(row + from),
		textOf: (row) => table.textOf(row + from),
		isUnterminated: table.isUnterminated && to === table.rowCount
	};
}

interface Spread {
	readonly heads: string[];
	readonly units: string[];
	readonly columnOf: ReadonlyMap<string, number>;
}

/** One column for each key and value column, in the order in which they come. */
function spreadOf(table: Table, keyed: Keyed): Spread {
	const { keys, values, unit } = keyed;
	const heads: string[] = [];
	const units: string[] = [];
	const columnOf = new Map<string, number>();
	for (let row = 0; row < table.rowCount; row++) {
		const cells = table.cells(row);
		const key = keyOf(cells, keyed);
		if (key === '' || columnOf.has(`${key}\u0001${values[0]?.index}`)) continue;
		if (columnOf.size > mostKeys * 4) break;
		const isPlain = cells.length > Math.max(...keys, ...values.map(({ index }) => index));
		if (!isPlain || row > 100_000) continue;
		for (const value of values) {
			columnOf.set(`${key}\u0001${value.index}`, heads.length);
			// A head that only says "value" adds nothing to what the key says.
			const isMeaning = value.meaning.quantity !== null || value.unit !== null || values.length > 1;
			heads.push(isMeaning ? `${value.name} ${key}` : key);
			units.push(unit >= 0 ? (cells[unit] ?? '').trim() : table.units[value.index] || (value.unit ?? ''));
		}
	}
	return { heads, units, columnOf };
}

/** Starts of the groups of neighbouring rows that share one moment. */
function momentsOf(table: Table, keyed: Keyed): Int32Array {
	const starts = new Int32Array(table.rowCount + 1);
	let count = 0;
	let last: string | null = null;
	let taken = new Set<string>();
	for (let row = 0; row < table.rowCount; row++) {
		const cells = table.cells(row);
		const time = timeOf(cells, keyed);
		const key = keyOf(cells, keyed);
		if (time === last && time !== '' && !taken.has(key)) {
			taken.add(key);
			continue;
		}
		starts[count++] = row;
		last = time;
		taken = new Set([key]);
	}
	starts[count] = table.rowCount;
	return starts.slice(0, count + 1);
}

function spreadTable(table: Table, keyed: Keyed): Table {
	const { heads, units, columnOf } = spreadOf(table, keyed);
	const starts = momentsOf(table, keyed);
	const { times, values, unit } = keyed;
	const isUnitFixed = unit < 0;
	const cellsOf = (group: number): string[] => {
		const from = starts[group] ?? 0;
		const first = table.cells(from);
		const out = new Array<string>(times.length + heads.length).fill('');
		times.forEach((at, i) => (out[i] = first[at] ?? ''));
		for (let row = from; row < (starts[group + 1] ?? 0); row++) {
			const cells = table.cells(row);
			for (const value of values) {
				const at = columnOf.get(`${keyOf(cells, keyed)}\u0001${value.index}`);
				if (at === undefined) continue;
				const cell = cells[value.index] ?? '';
				const own = isUnitFixed ? '' : (cells[unit] ?? '').trim();
				// The unit stays beside its value, so that one that changes on the way is seen.
				out[times.length + at] = own === '' || cell.trim() === '' ? cell : `${cell} ${own}`;
			}
		}
		return out;
	};
	const textOf = (group: number): string =>
		Array.from({ length: (starts[group + 1] ?? 0) - (starts[group] ?? 0) }, (_, i) =>
			table.textOf((starts[group] ?? 0) + i)
		).join(' / ');
	return {
		...table,
		rowText: null,
		header: [...times.map((at) => table.header[at] ?? ''), ...heads],
		makeHeader: table.header,
		units: [...times.map(() => ''), ...units],
		rowCount: starts.length - 1,
		cells: cellsOf,
		lineOf: (group) => table.lineOf(starts[group] ?? 0),
		textOf,
		isSparse: true,
		decisions: [
			...(table.decisions ?? []),
			{ field: 'layout', value: 'row-a-sensor', because: 'found', detail: heads.join(', ').slice(0, 200) }
		]
	};
}

/**
 * A table that keeps each sensor or quantity in a row of its own, as one row a moment with a column for each; blocks
 * of one sensor after the other as sections. Null where a row holds all that was measured at its moment.
 */
export function withoutSensorRows(table: Table): Table | Sections | null {
	if (table.rowCount < 2 || (table.kind !== 'delimited' && table.kind !== 'json')) return null;
	const keyed = keyedIn(table);
	if (keyed === null) return null;
	const blocks = blocksIn(table, keyed);
	if (blocks === null) return spreadTable(table, keyed);
	// A key that changes with every row tells no blocks.
	if (blocks.names.length < 2 || blocks.names.length * 2 > table.rowCount) return null;
	const tables = blocks.starts.map((from, i) =>
		blockOf(table, i === 0 ? 0 : from, blocks.starts[i + 1] ?? table.rowCount)
	);
	const serials = tables.map((block, i) => ({
		...block,
		entries: [{ key: 'serial number', value: blocks.names[i] ?? '', line: block.lineOf(0) }, ...block.entries]
	}));
	const ofTemperature = serials.filter((_, i) => isTemperatureBlock(blocks.names[i] ?? ''));
	const [only] = ofTemperature;
	if (only !== undefined && ofTemperature.length === 1 && serials.length > 1)
		return {
			...only,
			decisions: [
				...(only.decisions ?? []),
				{
					field: 'layout',
					value: 'row-a-sensor',
					because: 'found',
					detail: blocks.names.join(', ').slice(0, 200)
				}
			]
		};
	return { tables: serials, names: blocks.names };
}
