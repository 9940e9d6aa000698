import type { TemperatureUnit } from '../../units';
import { maxCells } from '../bounds';
import type { Ingestion, ReadContext } from '../ingestion';
import { profileColumns, unitColumnOf, type Column } from '../layout/columns';
import { statedIn, type Stated } from '../layout/preamble';
import type { Table } from '../layout/table';
import { columnsOf, findTiming, zoneOfTiming, type Timing } from '../layout/timing';
import { columnsAtOnce } from './all-channels';
import { withoutCutRow } from './cut-short';
import { gather } from './gather';
import type { Gathered } from './gathered';
import type { Readable } from './readable';
import { declaredBy, understand } from './understand';
import { pickTemperature, type Picked } from './pick-temperature';
import { celsiusEnds, columnQuestion, timeQuestion, unitQuestion } from './questions';
import { refused } from './refusals';
import { timeAxisOf } from './time-axis';

interface Plan {
	readonly timing: Timing;
	readonly picked: Picked;
	readonly stated: Stated;
}

function planOf(table: Table, columns: readonly Column[], stated: Stated, context: ReadContext): Plan {
	const timing = findTiming(columns);
	const head = zoneOfTiming(columns, timing);
	const isNamed = head.zone !== null || head.word !== null;
	const told = isNamed ? { ...stated, zone: head.zone, zoneWord: head.word, zonesNamed: [] } : stated;
	const picked = pickTemperature(columns, timing, context.answers, stated.unit);
	return { timing, picked, stated: told };
}

function refusalOf(table: Table, { timing, picked, stated }: Plan, context: ReadContext): Ingestion | null {
	if (picked.candidates.length === 0) {
		const found = table.header.filter((name) => name !== '').join(', ');
		return refused('no-temperature', table.headerLine, found === '' ? null : found.slice(0, 120));
	}
	const isUntimed =
		timing.kind === 'none' &&
		stated.intervalsNamed.length === 0 &&
		context.answers.intervalSeconds === undefined;
	const isStartless = stated.startText === null && context.answers.startMs === undefined;
	return isUntimed && isStartless ? refused('no-time', table.lineOf(0), table.textOf(0).slice(0, 80)) : null;
}

/** A few readings of each of very many sensors: no table holds them side by side. */
function isTooSparse(table: Table, { candidates, twins, others }: Picked): boolean {
	return table.rowCount * (candidates.length + twins.length + others.length) > maxCells;
}

/** The unit of a column: the dock's answer, what stands beside the values, its head, then the preamble. */
export function unitFor(
	column: Column,
	gathered: Gathered,
	stated: Stated,
	context: ReadContext
): TemperatureUnit | null {
	const values = gathered.values.find((v) => v.column === column.index);
	return context.answers.unit ?? values?.unit ?? column.unit ?? stated.unit;
}

/** One pass over the rows, with every measured column where that is not too much at once. */
function gatherAll(table: Table, { timing, picked }: Plan): Gathered {
	const needed = [...picked.candidates, ...picked.twins].map(({ index }) => index);
	const others = picked.others.map(({ index }) => index).filter((index) => !needed.includes(index));
	const room = Math.max(0, columnsAtOnce(table.rowCount) - needed.length);
	return gather(table, timing, [...needed, ...(others.length <= room ? others : [])], needed);
}

/** Reads a table to an understanding, to one question, or to a refusal. */
export function readTable(table: Table, encoding: string, context: ReadContext): Ingestion {
	const columns = profileColumns(table);
	const around = statedIn(table.entries, table.freeText, table.header);
	const plan = planOf(table, columns, { ...around, unit: unitColumnOf(columns) ?? around.unit }, context);
	const { timing, picked, stated } = plan;
	const refusal = refusalOf(table, plan, context);
	if (refusal !== null) return refusal;
	if (isTooSparse(table, picked)) return refused('too-many-columns');
	const gathered = withoutCutRow(table, gatherAll(table, plan));
	if (gathered.count === 0)
		return refused(
			columnsOf(timing).length === 0 ? 'no-readings' : 'no-time',
			table.lineOf(0),
			table.textOf(0).slice(0, 80)
		);
	const unitOf = (column: Column): TemperatureUnit | null => unitFor(column, gathered, stated, context);
	const axis = timeAxisOf(gathered, timing, stated, context);
	if ('refusal' in axis) return refused(axis.refusal, gathered.lines[0] ?? null, axis.found);
	const declared = declaredBy(stated, 'zone' in axis ? axis : null, context);
	const [first] = picked.candidates;
	if (first === undefined) return refused('no-temperature');
	const valuesOf = (column: Column): Gathered['values'][number] | undefined =>
		gathered.values.find((v) => v.column === column.index);
	if ('options' in axis) {
		const ends = celsiusEnds(valuesOf(first), gathered.count, unitOf(first));
		return {
			kind: 'question',
			question: timeQuestion(axis, table, timing, gathered, context, ends),
			declared
		};
	}
	const ms = axis.ms.subarray(0, gathered.count);
	if (picked.candidates.length > 1) {
		return {
			kind: 'question',
			question: columnQuestion(table, picked.candidates, gathered, ms, unitOf),
			declared
		};
	}
	const unit = unitOf(first);
	const values = valuesOf(first);
	if (values === undefined) return refused('no-temperature');
	// °C and °F in one column are two recordings put together; neither unit would be right for all of it.
	if (values.hasMixedUnits) return refused('two-recordings', null, first.name);
	if (unit === null)
		return { kind: 'question', question: unitQuestion(table, first, values, gathered, ms), declared };
	const readable: Readable = {
		table,
		encoding,
		timing,
		stated,
		picked,
		gathered,
		axis,
		declared,
		column: first,
		values,
		unit,
		unitOf
	};
	return understand(readable, context);
}
