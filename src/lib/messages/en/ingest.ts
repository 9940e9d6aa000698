import type { Choice, Oddity, Question, RefusalCode } from '../../domain/ingest/ingestion';
import { count as countText, duration } from '../../format';
import { questionTitle, questionWhy } from './ingest-questions';

const locale = 'en';

interface RefusalFacts {
	readonly line: number | null;
	readonly found: string | null;
}

const at = ({ line }: RefusalFacts): string => (line === null ? '' : ` at line ${countText(line, locale)}`);
const quoted = ({ found }: RefusalFacts): string =>
	found === null || found === '' ? '' : ` It begins “${found}”.`;

const refusals: Readonly<Record<RefusalCode, (facts: RefusalFacts) => string>> = {
	empty: () => 'The file is empty. Export it again from the logger.',
	'too-large': () => 'The file is larger than 50 MB. Export a shorter period and upload that.',
	spreadsheet: () => 'This is a spreadsheet. Export it as CSV and upload that.',
	pdf: () =>
		'This is a PDF. Export the readings as CSV or JSON and upload that; the PDF can be kept as a photo is.',
	zip: ({ found }) =>
		found === 'gzip'
			? 'This file is compressed more than once. Unpack it and upload what is inside.'
			: 'This is an archive. Unpack it and upload the export that is inside.',
	image: () => 'This is a picture. Upload the logger’s export; a picture goes with the photos.',
	html: () =>
		'This is a web page, often a sign-in or error page saved in place of the export. Download the export again.',
	xml: () => 'This is an XML file. Export the readings as CSV or JSON and upload that.',
	binary: () =>
		'This file holds no text: it may be the logger’s own format. Export it as CSV or JSON and upload that.',
	'header-only': () =>
		'The file has column heads but no readings. The logger was not started, or the export was stopped.',
	'no-readings': (facts) =>
		`No rows of readings were found.${quoted(facts)} Export times and temperatures as CSV or JSON.`,
	'no-temperature': ({ found }) =>
		found === null
			? 'No column of temperatures was found. Export the temperature channel too.'
			: `None of the columns holds a temperature: ${found}. Export the temperature channel too.`,
	'no-time': (facts) =>
		`The readings have no times, and no start and interval stand above them${at(facts)}. Export the time of each reading too.`,
	'one-reading': (facts) => `There is only one reading${at(facts)}. A journey takes at least two.`,
	'no-time-progress': (facts) =>
		`All readings carry the same time${at(facts)}. Export the time of each reading.`,
	'two-recordings': ({ found }) =>
		`The file holds several recordings${found === null ? '' : ` (${found})`}. Export them one by one and upload each.`,
	'broken-json': (facts) =>
		`The JSON is damaged${at(facts)}${facts.found === null ? '' : `, near “${facts.found}”`}. Download the export again.`,
	'broken-gzip': () => 'The compressed file is damaged or cut short. Download the export again.',
	truncated: (facts) => `The file ends in the middle${at(facts)}. Download the export again.`,
	'unclosed-quote': (facts) =>
		`A quoted cell that opens${at(facts)} never closes. Download the export again.`,
	'implausible-dates': ({ line, found }) =>
		`The dates cannot be right${found === null ? '' : `: the first reads ${found}`}${at({ line, found })}. Set the logger’s clock and export again.`,
	'too-deep': (facts) => `The JSON is nested too deeply${at(facts)} to hold readings.`,
	'line-too-long': (facts) => `A single line is longer than 64 KB${at(facts)}. This is no table of readings.`,
	'too-many-columns': (facts) =>
		`There are more than 2,048 columns or sensors${at(facts)}. Export fewer at a time and upload that.`,
	'too-many-readings': () =>
		'The file holds more than 5,000,000 readings. Export a shorter period and upload that.'
};

/** The sentence of a refusal: what was found, where, and what to do. */
export function refusalText(code: RefusalCode, facts: RefusalFacts): string {
	return refusals[code](facts);
}

type Say = (count: string, detail: string, isOne: boolean) => string;
const plural =
	(one: string, many: string): Say =>
	(count, _detail, isOne) =>
		`${count} ${isOne ? one : many}`;

const orderWords: Readonly<Record<string, string>> = {
	dmy: 'day first',
	mdy: 'month first',
	ymd: 'year first'
};
const order = (detail: string): string => orderWords[detail] ?? detail;

const oddities: Readonly<Record<Oddity['code'], Say>> = {
	'duplicate-dropped': plural('repeated reading, dropped', 'repeated readings, dropped'),
	'duplicate-conflict': plural(
		'reading gives a second temperature for a time that has one; the first is used',
		'readings give a second temperature for a time that has one; the first is used'
	),
	'missing-value': plural('row has no temperature', 'rows have no temperature'),
	'impossible-value': plural('impossible temperature, set aside', 'impossible temperatures, set aside'),
	resorted: (count, detail, isOne) =>
		detail === 'descending'
			? 'The newest reading stood first; put in order of time'
			: `${count} ${isOne ? 'row was' : 'rows were'} out of order; put in order of time`,
	gap: (count, detail, isOne) =>
		`${count} ${isOne ? 'gap' : 'gaps, the longest'} of ${duration(Number(detail) * 60_000)}`,
	'interval-changed': (_count, detail) => {
		const [from, to] = detail.split(' > ');
		return `The interval changes from ${from} min to ${to} min`;
	},
	'future-reading': plural('reading is later than the upload', 'readings are later than the upload'),
	'zone-assumed': (_count, detail) => `The file names no time zone; ${detail} is assumed`,
	'clock-change': (_count, detail) =>
		detail === 'kept'
			? 'The clocks changed during the journey; the logger kept its own time'
			: 'The clocks changed during the journey, and the logger’s with them',
	'footer-ignored': plural('line after the readings, not read', 'lines after the readings, not read'),
	'short-row': plural('row is too short to read', 'rows are too short to read'),
	'cut-short': () => 'The file ends in the middle of a reading, which is left out',
	'other-unit-column': (_count, detail) =>
		`“${detail}” shows the same temperature in another unit; it is used as a check only`,
	'bad-time': plural('line has no time that can be read', 'lines have no time that can be read'),
	'date-order-by-journey': (_count, detail) =>
		`Dates are read ${order(detail)}: only so do they fall into this journey`,
	'date-order-by-upload': (_count, detail) =>
		`Dates are read ${order(detail)}: otherwise they would lie in the future or years back`,
	'header-repeated': plural(
		'repeated line of column heads, not read',
		'repeated lines of column heads, not read'
	),
	'twin-disagrees': (count, detail, isOne) =>
		`${count} ${isOne ? 'row differs' : 'rows differ'} from “${detail}” by more than rounding`,
	'before-start': plural(
		'reading is earlier than the start the file states',
		'readings are earlier than the start the file states'
	),
	'answer-unused': (_count, detail) => `The file has no use for what was answered: ${detail}`,
	'clock-jump': (count, detail, isOne) =>
		detail === ''
			? `The clock leaps ahead ${isOne ? 'once' : `${count} times`}`
			: `The clock leaps at ${count} ${isOne ? 'row' : 'rows'}; ${detail} with a date far from ${isOne ? 'its' : 'their'} neighbours ${detail === '1' ? 'is' : 'are'} set aside`,
	'clock-restart': (count, detail, isOne) =>
		detail === 'joined'
			? `The clock was put back; the ${count} ${isOne ? 'reading' : 'readings'} after it are moved to follow on`
			: `The clock was put back; the ${count} ${isOne ? 'reading' : 'readings'} after it are left out`
};

/** One oddity as a line, with its count; line numbers are shown beside it. */
export function oddityText({ code, count, detail }: Oddity): string {
	return `${oddities[code](countText(count, locale), detail ?? '', count === 1)}.`;
}

/** The lines an oddity speaks of: `line 12`, `lines 12, 15, 18 and 40 more`. */
export function oddityLines({ lines, count }: Oddity): string {
	const shown = lines.map((line) => countText(line, locale));
	if (count <= 1) return `line ${shown[0] ?? ''}`;
	const more = count - lines.length;
	return `lines ${shown.join(', ')}${more > 0 ? ` and ${countText(more, locale)} more` : ''}`;
}

const apart = (hours: number | null): string => (hours === null ? '' : `${duration(hours * 3_600_000)} `);

const evidence: Readonly<Record<string, (hours: number | null) => string>> = {
	'fits-journey': () => 'Fits this journey',
	'before-journey': (hours) => `Ends ${apart(hours)}before loading`,
	'after-journey': (hours) => `Begins ${apart(hours)}after arrival`,
	'after-upload': (hours) => `Runs ${apart(hours)}past now`,
	'before-upload': (hours) => `Ends ${apart(hours)}before now`,
	plausible: () => 'Usual for a chilled or frozen load',
	implausible: () => 'Unlikely for any load'
};

/** What speaks for or against one choice. */
export function evidenceText({ evidence: codes, evidenceHours }: Choice): string {
	return codes.map((code) => evidence[code]?.(evidenceHours) ?? code).join('. ');
}

/** The question as a person would put it, and why the file cannot tell. */
export function questionText(question: Question): { title: string; why: string } {
	return { title: questionTitle(question), why: questionWhy(question) };
}

/** What stands on every question beside the choices. */
export const askQualityText = 'I don’t know, ask QA';
