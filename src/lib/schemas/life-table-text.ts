import type { LifePoint } from '../domain/shelf-life/spec';
import { celsiusFromFahrenheit, hoursPerDay, type TemperatureUnit } from '../domain/units';

export const lifeUnits = ['days', 'hours', 'months'] as const;
export type LifeUnit = (typeof lifeUnits)[number];

/** What a table of lives is written in. */
export interface LifeTableUnits {
	temperature: TemperatureUnit;
	life: LifeUnit;
}

export type LifeTableFaultCode =
	'not-two-figures' | 'ambiguous-commas' | 'below-absolute-zero' | 'life-not-positive' | 'too-many-lines';

/** A line that cannot be a temperature and a life. */
export interface LifeTableFault {
	line: number;
	text: string;
	code: LifeTableFaultCode;
}

/** A pasted table of life against temperature: what could be read, and every line that could not. */
export interface LifeTableText {
	points: LifePoint[];
	faults: LifeTableFault[];
}

/** A month as storage tables mean it: a twelfth of 365.25 days, the same as in the starting specs. */
const hoursOf: Record<LifeUnit, number> = {
	hours: 1,
	days: hoursPerDay,
	months: (hoursPerDay * 365.25) / 12
};

const mostLines = 500;
const absoluteZeroCelsius = -273.15;
/** A figure, with its sign and either decimal mark. */
const figure = /^[+-]?(\d+([.,]\d+)?|[.,]\d+)$/;

/**
 * Reads a table as it is pasted from a sheet or typed: a line is a temperature, then a life, apart by tab, semicolon,
 * blank or comma. A life may be a range (21-28), whose ends are two points. A first line without a digit is a heading.
 */
export function readLifeTable(text: string, units: LifeTableUnits): LifeTableText {
	const lines = text.split(/\r\n|\r|\n/);
	const points: LifePoint[] = [];
	const faults: LifeTableFault[] = [];
	let isFirst = true;
	for (const [at, raw] of lines.entries()) {
		const line = raw.trim();
		if (line === '') continue;
		const isHeading = isFirst && !/\d/.test(line.replace(/\d+\s*°/g, ''));
		isFirst = false;
		if (isHeading) continue;
		if (at >= mostLines) {
			faults.push({ line: at + 1, text: line, code: 'too-many-lines' });
			break;
		}
		const read = readLine(line, units);
		if (typeof read === 'string') faults.push({ line: at + 1, text: line, code: read });
		else points.push(...read);
	}
	return { points, faults };
}

function readLine(line: string, { temperature, life }: LifeTableUnits): LifePoint[] | LifeTableFaultCode {
	const cells = cellsOf(line.replaceAll('−', '-').replace(/\s*°\s*[CF]?/gi, ' '));
	if (typeof cells === 'string') return cells;
	const [degrees, ...lives] = cells;
	if (degrees === undefined || !figure.test(degrees)) return 'not-two-figures';
	const celsius = temperature === 'fahrenheit' ? celsiusFromFahrenheit(number(degrees)) : number(degrees);
	const rounded = Number(celsius.toFixed(6));
	if (rounded < absoluteZeroCelsius) return 'below-absolute-zero';
	const hours = lives.map((one) => number(one) * hoursOf[life]);
	return hours.some((one) => one <= 0)
		? 'life-not-positive'
		: hours.map((lifeHours) => ({ celsius: rounded, lifeHours }));
}

const number = (text: string) => Number(text.replace(',', '.'));

/** The temperature and one life or the two ends of its range. */
function cellsOf(line: string): string[] | LifeTableFaultCode {
	const byMark = line.split(/[\t;|]/).map((cell) => cell.trim());
	const cells = byMark.filter((cell) => cell !== '');
	if (cells.length > 1) return withRange(cells);
	const byBlank = line
		.trim()
		.replace(/(\d)\s*(?:-|–|to)\s*(?=\d)/g, '$1–')
		.split(/,\s+|\s+/);
	if (byBlank.length > 1) return withRange(byBlank);
	const byComma = line.trim().split(',');
	if (byComma.length > 2) return 'ambiguous-commas';
	return withRange(byComma);
}

function withRange([degrees, life, ...more]: string[]): string[] | LifeTableFaultCode {
	if (degrees === undefined || life === undefined || more.length > 0) return 'not-two-figures';
	const ends = life.split(/\s*(?:–|(?<=\d)\s*-|to)\s*/);
	if (ends.length > 2 || !ends.every((end) => figure.test(end))) return 'not-two-figures';
	return [degrees, ...ends];
}
