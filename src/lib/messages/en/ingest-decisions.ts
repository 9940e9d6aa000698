import type { Answers, Decision, DecisionField } from '../../domain/ingest/ingestion';
import { duration } from '../../format';

const orderWords: Readonly<Record<string, string>> = {
	dmy: 'day first',
	mdy: 'month first',
	ymd: 'year first'
};
const unitWords: Readonly<Record<string, string>> = { celsius: '°C', fahrenheit: '°F', kelvin: 'K' };
const delimiterWords: Readonly<Record<string, string>> = {
	',': 'comma',
	';': 'semicolon',
	'\t': 'tab',
	'|': 'pipe',
	' ': 'spaces'
};
const layoutWords: Readonly<Record<string, string>> = {
	delimited: 'a table of text',
	json: 'JSON',
	senml: 'SenML',
	epcis: 'EPCIS sensor data',
	'row-a-sensor': 'a row for each sensor'
};

const names: Readonly<Record<DecisionField, string>> = {
	dateOrder: 'Dates',
	zone: 'Zone of the times',
	unit: 'Unit',
	column: 'Temperature of the goods',
	start: 'Start',
	intervalSeconds: 'Interval',
	part: 'Recording',
	layout: 'Written as',
	encoding: 'Characters',
	delimiter: 'Cells parted by',
	decimal: 'Decimal sign',
	time: 'Times'
};

const reasons: Readonly<Record<Decision['because'], (detail: string) => string>> = {
	answer: () => 'as answered here',
	iso: () => 'they stand in ISO order',
	'day-over-12': () => 'a day is over 12',
	continuity: () => 'only so do the readings run on',
	declared: () => 'the file states its own format, start or end',
	journey: () => 'only so do they fall into this journey',
	upload: () => 'otherwise they would lie in the future or years back',
	'month-name': () => 'months are written as words',
	offset: () => 'each time carries its offset',
	epoch: () => 'counted from 1970 in UTC',
	'zone-named': () => 'the file names it',
	site: () => 'assumed: the file names none, this is the site’s',
	'beside-values': () => 'it stands beside the values',
	head: () => 'the column’s head says so',
	preamble: () => 'the lines above the readings say so',
	standard: () => 'as its standard says',
	'only-one': () => 'it is the only one',
	mean: () => 'it is the mean among minimum, mean and maximum',
	twin: (detail) => `“${detail}” shows the same in another unit`,
	found: () => 'found in the file'
};

function valueText(field: DecisionField, value: string): string {
	if (field === 'dateOrder') return orderWords[value] ?? value;
	if (field === 'unit') return unitWords[value] ?? value;
	if (field === 'delimiter') return delimiterWords[value] ?? value;
	if (field === 'layout') return layoutWords[value] ?? value;
	if (field === 'decimal') return value === ',' ? 'comma' : 'point';
	if (field === 'time' && value === '1904') return 'days counted from 1904';
	if (field === 'intervalSeconds') return everyText(Number(value));
	return value;
}

function everyText(seconds: number): string {
	return seconds < 60 ? `${seconds} s` : duration(seconds * 1000);
}

/** One thing that was decided about a file: what, how, and what decided it. */
export function decisionText({ field, value, because, detail }: Decision): {
	name: string;
	value: string;
	because: string;
} {
	return { name: names[field], value: valueText(field, value), because: reasons[because](detail ?? '') };
}

/** Answers in a few words: `day first, °F, column “Probe B”`. */
export function answersText(answers: Answers): string {
	const { dateOrder, unit, zone, temperatureColumn, intervalSeconds, startMs, part } = answers;
	return [
		dateOrder && orderWords[dateOrder],
		unit && unitWords[unit],
		zone && `times in ${zone}`,
		temperatureColumn && columnText(temperatureColumn),
		intervalSeconds && `every ${everyText(intervalSeconds)}`,
		startMs !== undefined && `start ${new Date(startMs).toISOString().slice(0, 16).replace('T', ' ')} UTC`,
		part && partText(part)
	]
		.filter(Boolean)
		.join(', ');
}

/** A column is named by its head, or counted from nought where it has none of its own. */
function columnText(column: string): string {
	return /^\d+$/.test(column) ? `column ${Number(column) + 1}` : `column “${column}”`;
}

function partText(part: string): string {
	if (part === 'joined') return 'all readings in turn';
	return part === 'before' ? 'readings before the clock starts anew' : `the ${part} recording`;
}
