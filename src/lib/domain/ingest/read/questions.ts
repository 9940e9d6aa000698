import { celsiusFromScaled, temperatureUnits, type TemperatureUnit } from '../../units';
import type { Choice, Question, ReadContext } from '../ingestion';
import type { Column } from '../layout/columns';
import type { Table } from '../layout/table';
import { columnsOf, type Timing } from '../layout/timing';
import { exampleRows } from './example-rows';
import type { Gathered, GatheredValues } from './gathered';
import type { OpenTimes } from './time-axis';

const msPerHour = 3_600_000;

interface Span {
	readonly firstMs: number | null;
	readonly lastMs: number | null;
}

function spanOf(ms: Float64Array | null): Span {
	let [first, last] = [Infinity, -Infinity];
	for (const at of ms ?? []) {
		if (at < first) first = at;
		if (at > last) last = at;
	}
	return Number.isFinite(first) ? { firstMs: first, lastMs: last } : { firstMs: null, lastMs: null };
}

/** What the dock already knows about a span: does it fall into the journey, does it lie ahead of the upload. */
function timeEvidence(
	{ firstMs, lastMs }: Span,
	context: ReadContext
): Pick<Choice, 'evidence' | 'evidenceHours'> {
	if (firstMs === null || lastMs === null) return { evidence: [], evidenceHours: null };
	if (lastMs > context.uploadedMs)
		return { evidence: ['after-upload'], evidenceHours: (lastMs - context.uploadedMs) / msPerHour };
	const { journeyFromMs: from, journeyToMs: to } = context;
	if (from !== null && lastMs < from)
		return { evidence: ['before-journey'], evidenceHours: (from - lastMs) / msPerHour };
	if (to !== null && firstMs > to)
		return { evidence: ['after-journey'], evidenceHours: (firstMs - to) / msPerHour };
	if (from !== null && to !== null) return { evidence: ['fits-journey'], evidenceHours: null };
	return { evidence: ['before-upload'], evidenceHours: (context.uploadedMs - lastMs) / msPerHour };
}

/** First value of a column in °C, where its unit is known. */
function firstCelsiusOf(
	values: GatheredValues | undefined,
	count: number,
	unit: TemperatureUnit | null
): number | null {
	if (values === undefined || unit === null) return null;
	for (let i = 0; i < count; i++) {
		if (values.isMissing[i] === 0)
			return celsiusFromScaled(values.mantissa[i] ?? 0, values.decimals[i] ?? 0, unit);
	}
	return null;
}

/** Last value of a column in °C, where its unit is known. */
function lastCelsiusOf(
	values: GatheredValues | undefined,
	count: number,
	unit: TemperatureUnit | null
): number | null {
	if (values === undefined || unit === null) return null;
	for (let i = count - 1; i >= 0; i--) {
		if (values.isMissing[i] === 0)
			return celsiusFromScaled(values.mantissa[i] ?? 0, values.decimals[i] ?? 0, unit);
	}
	return null;
}

/** First and last value of a column, as a question shows them. */
export function celsiusEnds(
	values: GatheredValues | undefined,
	count: number,
	unit: TemperatureUnit | null
): Pick<Choice, 'firstCelsius' | 'lastCelsius'> {
	return {
		firstCelsius: firstCelsiusOf(values, count, unit),
		lastCelsius: lastCelsiusOf(values, count, unit)
	};
}

/** The part of a time cell that can be read two ways: its first two numbers. */
function ambiguousPart(cell: string): string {
	return /\d{1,4}\s*[-/.年 ]\s*\d{1,2}/.exec(cell)?.[0] ?? cell;
}

/** A question about the times, each choice with the first and last moment it would give. */
export function timeQuestion(
	open: OpenTimes,
	table: Table,
	timing: Timing,
	gathered: Gathered,
	context: ReadContext,
	ends: Pick<Choice, 'firstCelsius' | 'lastCelsius'>
): Question {
	const [timeColumn] = columnsOf(timing);
	const cellOf = (row: number): string =>
		timeColumn === undefined ? '' : (table.cells(row)[timeColumn] ?? '');
	const subjectOf = (row: number): string =>
		open.code === 'date-order' ? ambiguousPart(cellOf(row).trim()) : '';
	const choices = open.options.map(({ answer, label, ms }) => {
		const span = spanOf(ms);
		return { answer, label, ...span, ...ends, ...timeEvidence(span, context) };
	});
	return {
		code: open.code,
		subject: gathered.count > 0 ? subjectOf(gathered.rows[0] ?? 0) : '',
		choices,
		rows: exampleRows(table, gathered.rows, gathered.count, subjectOf),
		rowsBetween: Math.max(0, gathered.count - 3),
		why: open.why
	};
}

/** Temperatures of perishables on the road; outside it a unit is unlikely, and said to be. */
const plausibleCelsius = { low: -90, high: 60 };

function isPlausible(values: GatheredValues, count: number, unit: TemperatureUnit): boolean {
	let [inside, all] = [0, 0];
	for (let i = 0; i < count; i++) {
		if (values.isMissing[i] !== 0) continue;
		const celsius = celsiusFromScaled(values.mantissa[i] ?? 0, values.decimals[i] ?? 0, unit);
		all++;
		if (celsius >= plausibleCelsius.low && celsius <= plausibleCelsius.high) inside++;
	}
	return inside > all * 0.7;
}

/** °C or °F (kelvin only where the figures are that high): asked, because a plausible guess is still a guess. */
export function unitQuestion(
	table: Table,
	column: Column,
	values: GatheredValues,
	gathered: Gathered,
	ms: Float64Array
): Question {
	const subjectOf = (row: number): string => (table.cells(row)[column.index] ?? '').trim();
	const offered = temperatureUnits.filter(
		(unit) => unit !== 'kelvin' || isPlausible(values, gathered.count, 'kelvin')
	);
	const choices = offered.map((unit) => ({
		answer: { unit },
		label: unit,
		...spanOf(ms),
		...celsiusEnds(values, gathered.count, unit),
		evidence: [isPlausible(values, gathered.count, unit) ? 'plausible' : 'implausible'],
		evidenceHours: null
	}));
	return {
		code: 'unit',
		subject: subjectOf(gathered.rows[0] ?? 0),
		choices,
		rows: exampleRows(table, gathered.rows, gathered.count, subjectOf),
		rowsBetween: Math.max(0, gathered.count - 3),
		why: 'no-unit'
	};
}

/** A column's head where it stands for no other, so that the answer fits the next file of the make; else its place. */
function answerNaming({ name, index }: Column, header: readonly string[]): string {
	const isOwn = header.filter((other) => other === name).length === 1;
	return isOwn && !/^\d*$/.test(name) ? name : String(index);
}

/** Which of several temperature columns rode with the goods: only a person knows. */
export function columnQuestion(
	table: Table,
	columns: readonly Column[],
	gathered: Gathered,
	ms: Float64Array,
	unitFor: (column: Column) => TemperatureUnit | null
): Question {
	const [first] = columns;
	const subjectOf = (row: number): string => (table.cells(row)[first?.index ?? 0] ?? '').trim();
	const choices = columns.map((column) => ({
		answer: { temperatureColumn: answerNaming(column, table.header) },
		label: column.name === '' ? String(column.index + 1) : column.name,
		...spanOf(ms),
		...celsiusEnds(
			gathered.values.find((v) => v.column === column.index),
			gathered.count,
			unitFor(column)
		),
		evidence: [],
		evidenceHours: null
	}));
	return {
		code: 'temperature-column',
		subject: columns.map(({ name }) => name).join(', '),
		choices,
		rows: exampleRows(table, gathered.rows, gathered.count, subjectOf),
		rowsBetween: Math.max(0, gathered.count - 3),
		why: 'several-temperatures'
	};
}
