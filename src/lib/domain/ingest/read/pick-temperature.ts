import type { Answers } from '../ingestion';
import { quantityOf, type Column } from '../layout/columns';
import type { Timing } from '../layout/timing';
import { columnsOf } from '../layout/timing';
import type { TemperatureUnit } from '../../units';

/** Columns that may be the temperature to assess, and those kept beside it. */
export interface Picked {
	readonly candidates: readonly Column[];
	/** The one candidate is what an answer names. */
	readonly isAnswered: boolean;
	/** The same sensor in the other unit: checked against the chosen one; among the others too. */
	readonly twins: readonly Column[];
	/** All other measurements, temperatures that are not chosen among them: kept as channels. */
	readonly others: readonly Column[];
}

const isNumeric = (column: Column): boolean =>
	column.share.number > 0 && column.share.number + column.share.missing + column.share.blank > 0.5;

/** A bound that never moves is a limit of the logger's; beside a mean it is what was measured. */
function isStillBound({ meaning, constant }: Column, hasMean: boolean): boolean {
	return meaning.isBound && constant !== null && !hasMean;
}

function isMeasured(column: Column, hasMean: boolean): boolean {
	return (
		isNumeric(column) &&
		!column.meaning.isLimit &&
		!isStillBound(column, hasMean) &&
		!(column.meaning.isIndex && (column.isCounter || column.meaning.quantity === null))
	);
}

/** Minimum and maximum yield where a plain or mean column of the same quantity stands beside them. */
function withoutExtremes(columns: readonly Column[]): readonly Column[] {
	const plain = columns.filter((c) => c.meaning.statistic === null);
	if (plain.length > 0) return plain;
	const mean = columns.filter((c) => c.meaning.statistic === 'mean');
	return mean.length > 0 ? mean : columns;
}

/** A name without its unit, so that `Temp (°C)` and `Temp (°F)` are seen to be one sensor. */
function bareName(column: Column): string {
	return column.name
		.toLowerCase()
		.replace(/celsius|fahrenheit|kelvin|[°º˚℃℉]|\bdeg\b|\b[cfk]\b|_[cfk]$|[^\p{L}\p{N}]/gu, '');
}

function unitOrder(column: Column): number {
	return column.unit === 'celsius' ? 0 : column.unit === 'fahrenheit' ? 1 : 2;
}

function splitTwins(columns: readonly Column[]): { chosen: Column[]; twins: Column[] } {
	const chosen: Column[] = [];
	const twins: Column[] = [];
	for (const column of [...columns].sort((a, b) => unitOrder(a) - unitOrder(b))) {
		const isTwin =
			column.unit !== null &&
			chosen.some(
				(other) => other.unit !== null && other.unit !== column.unit && bareName(other) === bareName(column)
			);
		(isTwin ? twins : chosen).push(column);
	}
	return { chosen: chosen.sort((a, b) => a.index - b.index), twins };
}

/** A measurement whose head explains nothing, beside one whose does: no clock and no counter. */
function isOther({ name, meaning, isCounter, constant }: Column): boolean {
	return (
		name !== '' &&
		!meaning.isTime &&
		!meaning.isElapsed &&
		!meaning.isIndex &&
		!isCounter &&
		constant === null
	);
}

/** The column an answer means: by its place, its head, or its head in other letters. */
function answeredColumn(columns: readonly Column[], answer: string | undefined): Column | undefined {
	if (answer === undefined) return undefined;
	const folded = answer.trim().toLowerCase();
	return (
		columns.find(({ index }) => String(index) === answer) ??
		columns.find(({ name }) => name === answer) ??
		columns.find(({ name }) => name.trim().toLowerCase() === folded)
	);
}

/** Finds the temperature columns: by head and unit first; else the number columns that nothing else explains. */
export function pickTemperature(
	columns: readonly Column[],
	timing: Timing,
	answers: Answers,
	stated: TemperatureUnit | null
): Picked {
	const taken = new Set(columnsOf(timing));
	const hasMean = columns.some(({ meaning }) => meaning.statistic === 'mean');
	const measured = columns.filter(
		(column) => !taken.has(column.index) && isMeasured(column, hasMean) && column.epochUnit === null
	);
	const besides = (chosen: readonly Column[]): readonly Column[] =>
		measured.filter((column) => !chosen.includes(column) && (quantityOf(column) !== null || isOther(column)));
	const named = measured.filter((column) => quantityOf(column) === 'temperature');
	const answered = answeredColumn(measured, answers.temperatureColumn);
	if (answered !== undefined)
		return { candidates: [answered], isAnswered: true, twins: [], others: besides([answered]) };
	if (named.length > 0) {
		const { chosen, twins } = splitTwins(withoutExtremes(named));
		return { candidates: chosen, isAnswered: false, twins, others: besides(chosen) };
	}
	// A column without any explaining word: a counter is no temperature unless it is all there is.
	const unnamed = measured.filter((column) => quantityOf(column) === null && !column.meaning.isTime);
	const steady = unnamed.filter((column) => !column.isCounter);
	const left = steady.length > 0 || stated === null ? steady : unnamed;
	const candidates = withoutExtremes(left);
	return { candidates, isAnswered: false, twins: [], others: besides(candidates) };
}
