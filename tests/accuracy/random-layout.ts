import { gzipSync } from 'node:zlib';
import fc from 'fast-check';

/*
 * Any trace in any layout: what a file must be read back to is the trace itself, written by code that shares nothing
 * with the reader.
 */

/** A reading: UTC ms and tenths of a degree Celsius; null where the sensor gave none. */
export interface Reading {
	readonly ms: number;
	readonly tenths: number | null;
}

type Unit = 'Cel' | '[degF]' | 'K';
type DateForm = 'dmy' | 'mdy' | 'ymd' | 'iso' | 'named' | 'epoch';

/** How a file writes its trace. */
export interface Layout {
	readonly readings: readonly Reading[];
	readonly delimiter: string;
	readonly comma: boolean;
	readonly form: DateForm;
	readonly sign: string;
	readonly shortYear: boolean;
	readonly seconds: boolean;
	readonly half: boolean;
	readonly apart: boolean;
	readonly offsetMinutes: number;
	readonly zoneIn: 'preamble' | 'stamp' | 'site';
	readonly words: number;
	readonly unit: Unit;
	readonly unitIn: 'head' | 'row' | 'preamble' | 'value' | 'nowhere';
	readonly extras: readonly ('index' | 'humidity' | 'battery' | 'note')[];
	readonly preamble: number;
	readonly footer: number;
	readonly isQuoted: boolean;
	readonly end: string;
	readonly missingWord: string;
}

const languages = [
	['Date', 'Time', 'Date/Time', 'Temperature', 'Humidity', 'No.'],
	['Datum', 'Uhrzeit', 'Zeitstempel', 'Temperatur', 'Feuchte', 'Nr.'],
	['Date', 'Heure', 'Date et heure', 'Température', 'Humidité', 'N°'],
	['Fecha', 'Hora', 'Fecha y hora', 'Temperatura', 'Humedad', 'N.º'],
	['Datum', 'Tijd', 'Datum en tijd', 'Temperatuur', 'Vochtigheid', 'Nr'],
	['Data', 'Godzina', 'Data i godzina', 'Temperatura', 'Wilgotność', 'Lp.'],
	['Dátum', 'Idő', 'Időpont', 'Hőmérséklet', 'Páratartalom', 'Sorszám'],
	['日期', '时间', '日期时间', '温度', '湿度', '序号'],
	['日付', '時刻', '日時', '温度', '湿度', '番号'],
	['Дата', 'Время', 'Дата и время', 'Температура', 'Влажность', '№'],
	['Päivämäärä', 'Kellonaika', 'Aikaleima', 'Lämpötila', 'Kosteus', 'Nro']
] as const;
const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const two = (n: number): string => String(n).padStart(2, '0');

export const minuteMs = 60_000;
/** Uploads come after all of it. */
export const uploadedMs = Date.UTC(2026, 4, 1);

const readings = fc
	.record({
		startMinute: fc.integer({ min: Date.UTC(2024, 0, 1) / minuteMs, max: Date.UTC(2026, 2, 20) / minuteMs }),
		stepMinutes: fc.constantFrom(1, 2, 5, 10, 15, 20, 30, 60),
		base: fc.constantFrom(-180, -20, 20, 40, 150),
		steps: fc.array(fc.integer({ min: -9, max: 9 }), { minLength: 8, maxLength: 60 }),
		lost: fc.array(fc.nat(59), { maxLength: 3 })
	})
	.map(({ startMinute, stepMinutes, base, steps, lost }): Reading[] => {
		let tenths = base;
		return steps.map((step, i) => {
			tenths += step;
			// The ends stay: they say where the trace lies.
			const isLost = i > 1 && i < steps.length - 2 && lost.includes(i);
			return { ms: (startMinute + i * stepMinutes) * minuteMs, tenths: isLost ? null : tenths };
		});
	});

/** Any layout of any trace. */
export const anyLayout: fc.Arbitrary<Layout> = fc
	.record({
		readings,
		delimiter: fc.constantFrom(',', ';', '\t', '|'),
		comma: fc.boolean(),
		form: fc.constantFrom<DateForm[]>('dmy', 'mdy', 'ymd', 'iso', 'named', 'epoch'),
		sign: fc.constantFrom('/', '-', '.'),
		shortYear: fc.boolean(),
		seconds: fc.boolean(),
		half: fc.boolean(),
		apart: fc.boolean(),
		offsetMinutes: fc.constantFrom(0, 60, 120, 330, -300, -480),
		zoneIn: fc.constantFrom<Layout['zoneIn'][]>('preamble', 'stamp', 'site'),
		words: fc.nat(languages.length - 1),
		unit: fc.constantFrom<Unit[]>('Cel', '[degF]', 'K'),
		unitIn: fc.constantFrom<Layout['unitIn'][]>('head', 'row', 'preamble', 'value', 'nowhere'),
		extras: fc.uniqueArray(
			fc.constantFrom<Layout['extras'][number][]>('index', 'humidity', 'battery', 'note'),
			{
				maxLength: 4
			}
		),
		preamble: fc.nat(5),
		footer: fc.nat(3),
		isQuoted: fc.boolean(),
		end: fc.constantFrom('\n', '\r\n', '\r'),
		missingWord: fc.constantFrom('', '---', 'n/a', 'NaN', '-999.9')
	})
	.map((layout) => ({
		...layout,
		// A comma cannot both part cells and be the decimal sign, unless cells are quoted.
		comma: layout.comma && layout.delimiter !== ',',
		zoneIn: layout.form === 'epoch' ? 'preamble' : layout.zoneIn,
		offsetMinutes: layout.form === 'epoch' || layout.zoneIn === 'site' ? 0 : layout.offsetMinutes
	}));

const offsetText = (minutes: number): string => {
	const size = Math.abs(minutes);
	return `${minutes < 0 ? '-' : '+'}${two(Math.floor(size / 60))}:${two(size % 60)}`;
};

function dateText({ form, sign, shortYear }: Layout, at: Date): string {
	const [year, month, day] = [at.getUTCFullYear(), at.getUTCMonth() + 1, at.getUTCDate()];
	const written = shortYear ? two(year % 100) : String(year);
	if (form === 'dmy') return [two(day), two(month), written].join(sign);
	if (form === 'mdy') return [two(month), two(day), written].join(sign);
	if (form === 'named') return `${day} ${months[month - 1]} ${year}`;
	return [year, two(month), two(day)].join(form === 'iso' ? '-' : sign);
}

function clockText({ seconds, half, form }: Layout, at: Date): string {
	const hour = at.getUTCHours();
	const isHalf = half && form !== 'iso';
	const shown = isHalf ? two(hour % 12 || 12) : two(hour);
	const rest = `:${two(at.getUTCMinutes())}${seconds ? `:${two(at.getUTCSeconds())}` : ''}`;
	return `${shown}${rest}${isHalf ? (hour < 12 ? ' AM' : ' PM') : ''}`;
}

/** The cells of a row's time. */
function timeCells(layout: Layout, ms: number): string[] {
	if (layout.form === 'epoch') return [String(ms / 1000)];
	const at = new Date(ms + layout.offsetMinutes * minuteMs);
	const offset = layout.zoneIn === 'stamp' ? offsetText(layout.offsetMinutes) : '';
	const [date, clock] = [dateText(layout, at), clockText(layout, at)];
	if (layout.form === 'iso') return [`${date}T${clock}${offset}`];
	const zoned = offset === '' ? clock : `${clock} ${offset}`;
	return layout.apart ? [date, zoned] : [`${date} ${zoned}`];
}

const unitSigns: Readonly<Record<Unit, string>> = { Cel: '°C', '[degF]': '°F', K: 'K' };

/** A tenth of a degree Celsius is exact in hundredths of each unit. */
function figure({ unit, comma }: Layout, tenths: number): string {
	const text =
		unit === 'Cel'
			? (tenths / 10).toFixed(1)
			: ((unit === 'K' ? tenths * 10 + 27_315 : tenths * 18 + 3200) / 100).toFixed(2);
	return comma ? text.replace('.', ',') : text;
}

const preambleLines = (layout: Layout): string[] => [
	`Serial number: A-30${layout.preamble}41`,
	'Trip name: Depot north to south',
	'Operator: night shift',
	'',
	'Firmware: 2.1.4'
];
const footerLines = ['', 'End of data', 'Checked by: ________'];

function valueCell(layout: Layout, { tenths }: Reading): string {
	if (tenths === null) return layout.missingWord;
	const written = figure(layout, tenths);
	return layout.unitIn === 'value' ? `${written} ${unitSigns[layout.unit]}` : written;
}

/** The file as text. */
export function written(layout: Layout, rows: readonly Reading[] = layout.readings): string {
	const { delimiter, words, extras, unit, unitIn, isQuoted } = layout;
	const [date, time, moment, temperature, humidity, index] = languages[words] ?? languages[0];
	const isApart = layout.apart && layout.form !== 'iso' && layout.form !== 'epoch';
	const quoted = (cell: string): string => (isQuoted ? `"${cell}"` : cell);
	const joined = (cells: readonly string[]): string => cells.map(quoted).join(delimiter);
	const heads = isApart ? [date, time] : [moment];
	const sign = unitSigns[unit];
	const columns: [head: string, sign: string, cell: (reading: Reading, i: number) => string][] = [
		[temperature, sign, (reading) => valueCell(layout, reading)]
	];
	const decimal = layout.comma ? ',' : '.';
	for (const extra of extras) {
		if (extra === 'humidity') columns.push([humidity, '%', (_, i) => `8${i % 10}${decimal}5`]);
		if (extra === 'battery') columns.push(['Battery (V)', '', () => `3${decimal}6`]);
		if (extra === 'note') columns.push(['Note', '', () => 'ok']);
	}
	const isRow = unitIn === 'row';
	const headOf = ([head, unitSign]: (typeof columns)[number], at: number): string =>
		(unitIn === 'head' || (at > 0 && !isRow)) && unitSign !== '' ? `${head} (${unitSign})` : head;
	const hasIndex = extras.includes('index');
	const body = rows.map((reading, i) =>
		joined([
			...(hasIndex ? [String(i + 1)] : []),
			...timeCells(layout, reading.ms),
			...columns.map(([, , cell]) => cell(reading, i))
		])
	);
	const lines = [
		...preambleLines(layout).slice(0, layout.preamble),
		...(unitIn === 'preamble' ? [`Temperature unit: ${sign}`] : []),
		...(layout.zoneIn === 'preamble' && layout.form !== 'epoch'
			? [`Time zone: UTC${offsetText(layout.offsetMinutes)}`]
			: []),
		joined([...(hasIndex ? [index] : []), ...heads, ...columns.map(headOf)]),
		...(isRow
			? [joined([...(hasIndex ? [''] : []), ...heads.map(() => ''), ...columns.map(([, s]) => s)])]
			: []),
		...body,
		...footerLines.slice(0, layout.footer)
	];
	return lines.join(layout.end) + layout.end;
}

const utf16 = (text: string, isBig: boolean): Uint8Array => {
	const out = Buffer.from(`\ufeff${text}`, 'utf16le');
	return isBig ? out.swap16() : out;
};

/** Ways in which the same text may be stored. Windows-1252 holds only what lies below U+0100 of these texts. */
export const encodings: Readonly<Record<string, (text: string) => Uint8Array | null>> = {
	'UTF-8': (text) => Buffer.from(text),
	'UTF-8 with a mark': (text) => Buffer.from(`\ufeff${text}`),
	'UTF-16 LE': (text) => utf16(text, false),
	'UTF-16 BE': (text) => utf16(text, true),
	// eslint-disable-next-line no-control-regex
	'Windows-1252': (text) => (/^[\x00-\x7f\xa0-\xff]*$/.test(text) ? Buffer.from(text, 'latin1') : null),
	gzip: (text) => gzipSync(Buffer.from(text), { level: 1 })
};
