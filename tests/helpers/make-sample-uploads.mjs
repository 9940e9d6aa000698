// Writes sample-uploads/: exports of invented loggers in different layouts, and beside each what a careful person would
// read out. The expectations come from the journey that was written, never from the reader under test.
// Run from the repository's root: node tests/helpers/make-sample-uploads.mjs
import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { gzipSync } from 'node:zlib';

const folder = 'sample-uploads';
const minute = 60_000;

/** The moment all samples are read at, and the site that reads them. */
const uploadedMs = Date.parse('2026-04-20T12:00:00Z');
const siteZone = 'Europe/Amsterdam';

/** A small seeded generator (mulberry32), so that every run writes the same bytes. */
function seeded(seed) {
	let a = seed;
	return () => {
		a = (a + 0x6d2b79f5) | 0;
		let t = Math.imul(a ^ (a >>> 15), 1 | a);
		t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
		return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
	};
}

/**
 * A journey: readings from a start, at an interval, around a set-point, with warm spells [from reading, readings, °C].
 * Temperatures are whole tenths of a degree, so that what is written is exact.
 */
function journey({ seed, start, every, count, set, sway = 4, warm = [] }) {
	const random = seeded(seed);
	const startMs = Date.parse(start);
	return Array.from({ length: count }, (_, i) => {
		const spell = warm.find(([from, length]) => i >= from && i < from + length);
		const lift = spell
			? Math.round(spell[2] * 10 * Math.sin((Math.PI * (i - spell[0] + 0.5)) / spell[1]))
			: 0;
		return {
			ms: startMs + i * every * minute,
			tenths: Math.round(set * 10) + Math.round((random() - 0.5) * sway) + lift
		};
	});
}

const two = (n) => String(n).padStart(2, '0');
const tenthsText = (tenths) =>
	`${tenths < 0 ? '-' : ''}${Math.floor(Math.abs(tenths) / 10)}.${Math.abs(tenths) % 10}`;
const comma = (tenths) => tenthsText(tenths).replace('.', ',');
/** Date parts at a fixed offset in minutes: the generator states every offset itself. */
function parts(ms, offset = 0) {
	const d = new Date(ms + offset * minute);
	return {
		y: d.getUTCFullYear(),
		mo: two(d.getUTCMonth() + 1),
		d: two(d.getUTCDate()),
		h: two(d.getUTCHours()),
		mi: two(d.getUTCMinutes()),
		s: two(d.getUTCSeconds())
	};
}
const iso = (ms) => new Date(ms).toISOString().replace('.000Z', 'Z');
const dmy = (ms, offset, sign = '/') => {
	const p = parts(ms, offset);
	return `${p.d}${sign}${p.mo}${sign}${p.y}`;
};
const clock = (ms, offset) => {
	const p = parts(ms, offset);
	return `${p.h}:${p.mi}`;
};
const ymdClock = (ms, offset) => {
	const p = parts(ms, offset);
	return `${p.y}-${p.mo}-${p.d} ${p.h}:${p.mi}:${p.s}`;
};
function usClock(ms, offset) {
	const p = parts(ms, offset);
	const h = Number(p.h);
	return `${p.mo}/${p.d}/${p.y} ${h % 12 || 12}:${p.mi}:${p.s} ${h < 12 ? 'AM' : 'PM'}`;
}

const fahrenheitTenths = (tenths) => Math.round((tenths * 9) / 5 + 320);

/** What the readings come to, from the journey itself. */
function ok(readings, unit, oddities, more = {}) {
	const celsius = readings.map(({ tenths }) =>
		unit === 'fahrenheit' ? ((tenths - 320) * 5) / 90 : tenths / 10
	);
	const times = readings.map(({ ms }) => ms).sort((a, b) => a - b);
	return {
		kind: 'ok',
		readings: readings.length,
		firstAt: new Date(times[0]).toISOString(),
		lastAt: new Date(times.at(-1)).toISOString(),
		minCelsius: Math.min(...celsius),
		maxCelsius: Math.max(...celsius),
		unit,
		oddities: [...oddities].sort(),
		...more
	};
}
const asks = (code, choices, more = {}) => ({ kind: 'question', code, choices, ...more });
const refuses = (code, more = {}) => ({ kind: 'refused', code, ...more });

const samples = [];
function sample(name, content, expected, shows, answer) {
	samples.push({
		name,
		bytes: Buffer.isBuffer(content) ? content : Buffer.from(content, 'utf8'),
		expected,
		shows,
		answer
	});
}

function berries() {
	const r = journey({
		seed: 1,
		start: '2026-04-14T20:00:00Z',
		every: 10,
		count: 280,
		set: 1.5,
		warm: [[120, 30, 9]]
	});
	const cest = 120;
	const lines = [
		'Datenlogger-Protokoll',
		'Seriennummer;SB-30411',
		'Bezeichnung;Erdbeeren Los 7731',
		`Startzeit;${dmy(r[0].ms, cest, '.')} ${clock(r[0].ms, cest)}`,
		'Messintervall;10 min',
		'Zeitzone;UTC+2',
		'Alarm oben;5,0 °C',
		'',
		'Nr.;Datum;Uhrzeit;Temperatur [°C];Luftfeuchte [%rF]',
		...r.map(
			({ ms, tenths }, i) =>
				`${i + 1};${dmy(ms, cest, '.')};${clock(ms, cest)};${comma(tenths)};${comma(880 + (i % 7))}`
		)
	];
	sample(
		'berries-german.csv',
		lines.join('\r\n') + '\r\n',
		ok(r, 'celsius', [], { serial: 'SB-30411', zoneBy: 'file' }),
		'Semicolons, decimal comma, German preamble and heads, date and time apart, humidity beside',
		'Read; the zone is in the preamble'
	);
}

function greens() {
	const r = journey({
		seed: 2,
		start: '2026-04-15T11:00:00Z',
		every: 15,
		count: 150,
		set: 2.5,
		warm: [[60, 12, 6]]
	}).map((x) => ({ ms: x.ms, tenths: fahrenheitTenths(x.tenths) }));
	const lines = [
		'Logger ID,GL-20718',
		'Trip Name,"Romaine, lot 5520"',
		'',
		'Date/Time,Temperature (°F)',
		...r.map(({ ms, tenths }) => `${usClock(ms, -420)},${tenthsText(tenths)}`)
	];
	sample(
		'greens-us-fahrenheit.csv',
		lines.join('\n') + '\n',
		{
			...ok(r, 'fahrenheit', ['zone-assumed'], { serial: 'GL-20718' }),
			context: { siteZone: 'America/Los_Angeles' }
		},
		'Month first, 12-hour clock, °F; days over 12 settle the order',
		'Read; the site’s zone is assumed, visibly'
	);
}

function fishJson() {
	const r = journey({ seed: 3, start: '2026-04-16T04:00:00Z', every: 5, count: 300, set: 0.2, sway: 3 });
	const text = JSON.stringify(
		r.map(({ ms, tenths }) => ({ recordedAt: iso(ms), temperatureCelsius: tenths / 10, battery: 3.1 })),
		null,
		1
	);
	sample('fish-array.json', text, ok(r, 'celsius', []), 'JSON list of objects, ISO times with Z', 'Read');
}

function dairyJson() {
	const r = journey({
		seed: 4,
		start: '2026-04-13T06:00:00Z',
		every: 10,
		count: 200,
		set: 3.2,
		warm: [[90, 20, 4]]
	});
	const text = JSON.stringify({
		device: { serial: 'SB-30455', firmware: '2.1' },
		trip: { tripName: 'Yoghurt 10 pallets' },
		settings: { interval: '10 min', unit: 'Cel' },
		data: { readings: r.map(({ ms, tenths }) => ({ t: ms / 1000, value: tenthsText(tenths) })) }
	});
	sample(
		'dairy-nested.json',
		text,
		ok(r, 'celsius', [], { serial: 'SB-30455', tripName: 'Yoghurt 10 pallets' }),
		'JSON object with metadata, readings inside, epoch seconds, numbers as strings, all on one line',
		'Read'
	);
}

function vaccinesSenml() {
	const r = journey({ seed: 5, start: '2026-04-12T08:00:00Z', every: 10, count: 144, set: 5.0 });
	const bt = r[0].ms / 1000;
	const records = r.flatMap(({ ms, tenths }, i) => [
		{
			...(i === 0 ? { bn: 'urn:dev:mac:0024befffe804ff1:', bt } : {}),
			n: 'temperature',
			u: 'Cel',
			t: ms / 1000 - bt,
			v: tenths / 10
		},
		{ n: 'humidity', u: '%RH', t: ms / 1000 - bt, v: 45 }
	]);
	sample(
		'vaccines.senml.json',
		JSON.stringify(records),
		ok(r, 'celsius', [], { layout: 'senml' }),
		'SenML (RFC 8428): base name, base time, two sensors',
		'Read as the standard says'
	);
}

function flowersEpcis() {
	const r = journey({ seed: 6, start: '2026-04-17T09:00:00Z', every: 30, count: 60, set: 4.0 });
	const event = {
		type: 'ObjectEvent',
		eventTime: iso(r.at(-1).ms),
		eventTimeZoneOffset: '+02:00',
		action: 'OBSERVE',
		sensorElementList: r.map(({ ms, tenths }) => ({
			sensorMetadata: { time: iso(ms), deviceID: 'urn:epc:id:giai:4000001.30466' },
			sensorReport: [
				{ type: 'Temperature', value: tenths / 10, uom: 'CEL' },
				{ type: 'RelativeHumidity', value: 81, uom: 'P1' }
			]
		}))
	};
	const text = JSON.stringify(
		{
			'@context': ['https://ref.gs1.org/standards/epcis/2.0.0/epcis-context.jsonld'],
			type: 'EPCISDocument',
			schemaVersion: '2.0',
			creationDate: iso(uploadedMs),
			epcisBody: { eventList: [event] }
		},
		null,
		2
	);
	sample(
		'flowers.epcis.json',
		text,
		ok(r, 'celsius', [], { layout: 'epcis', serial: 'urn:epc:id:giai:4000001.30466' }),
		'GS1 EPCIS 2.0 event with sensor elements',
		'Read as the standard says'
	);
}

function frozenUtf16() {
	const r = journey({
		seed: 7,
		start: '2026-04-10T18:30:00Z',
		every: 20,
		count: 220,
		set: -19.5,
		sway: 6,
		warm: [[150, 18, 7]]
	});
	const lines = [
		'Serial Number:\tSB-30470',
		'Time Zone:\tUTC',
		'',
		'Timestamp\tTemperature °C',
		...r.map(({ ms, tenths }) => `${ymdClock(ms, 0)}\t${tenthsText(tenths).replace('-', '\u2212')}`)
	];
	const bytes = Buffer.concat([
		Buffer.from([0xff, 0xfe]),
		Buffer.from(lines.join('\r\n') + '\r\n', 'utf16le')
	]);
	sample(
		'frozen-utf16-tabs.txt',
		bytes,
		ok(r, 'celsius', [], { serial: 'SB-30470', zoneBy: 'file' }),
		'UTF-16, tabs, a real minus sign',
		'Read'
	);
}

function cheeseFrench() {
	const r = journey({ seed: 8, start: '2026-04-15T05:00:00Z', every: 15, count: 120, set: 4.4 });
	const lines = [
		'N° de série;SB-30482',
		'Fuseau horaire;Europe/Paris',
		'Unité;°C',
		'',
		'Date;Heure;Température',
		...r.map(({ ms, tenths }) => `${dmy(ms, 120)};${clock(ms, 120)};${comma(tenths)}`)
	];
	sample(
		'cheese-french-1252.csv',
		Buffer.from(lines.join('\r\n') + '\r\n', 'latin1'),
		ok(r, 'celsius', [], { serial: 'SB-30482', zoneBy: 'file', encoding: 'windows-1252' }),
		'Windows-1252, French heads, zone and unit in the preamble',
		'Read'
	);
}

function epochPipes() {
	const r = journey({ seed: 9, start: '2026-04-18T00:00:00Z', every: 5, count: 288, set: 2.0 });
	sample(
		'salmon-epoch.psv',
		'epoch|probe_c\n' + r.map(({ ms, tenths }) => `${ms / 1000}|${tenthsText(tenths)}`).join('\n') + '\n',
		ok(r, 'celsius', []),
		'Epoch seconds, pipes, unit in the column’s name',
		'Read'
	);
}

function ambiguous() {
	const r = journey({ seed: 10, start: '2026-04-03T06:00:00Z', every: 10, count: 90, set: 1.8 });
	sample(
		'grapes-which-day.csv',
		'Date,Time,Temp (°C)\n' +
			r.map(({ ms, tenths }) => `${dmy(ms, 120)},${clock(ms, 120)},${tenthsText(tenths)}`).join('\n') +
			'\n',
		asks('date-order', ['dmy', 'mdy'], {
			subject: '03/04',
			thenAnswer: { dateOrder: 'dmy' },
			then: ok(r, 'celsius', ['zone-assumed'])
		}),
		'All rows on 03/04: nothing in the file tells day from month',
		'Asks which day; a journey known to the docket settles it'
	);
}

function noUnit() {
	const r = journey({ seed: 11, start: '2026-04-16T07:00:00Z', every: 10, count: 80, set: 2.2 }).map((x) => ({
		ms: x.ms,
		tenths: fahrenheitTenths(x.tenths)
	}));
	sample(
		'herbs-no-unit.csv',
		'time;temperature\n' + r.map(({ ms, tenths }) => `${iso(ms)};${tenthsText(tenths)}`).join('\n') + '\n',
		asks('unit', ['celsius', 'fahrenheit'], {
			thenAnswer: { unit: 'fahrenheit' },
			then: ok(r, 'fahrenheit', [])
		}),
		'No unit anywhere; 36 is plausible in one and not absurd in the other',
		'Asks for the unit'
	);
}

function twoProbes() {
	const r = journey({ seed: 12, start: '2026-04-14T10:00:00Z', every: 15, count: 100, set: 1.0 });
	const air = journey({ seed: 13, start: '2026-04-14T10:00:00Z', every: 15, count: 100, set: 3.0, sway: 14 });
	sample(
		'cod-two-probes.csv',
		'Time (UTC),Probe A °C,Probe B °C\n' +
			r
				.map(({ ms, tenths }, i) => `${ymdClock(ms, 0)},${tenthsText(tenths)},${tenthsText(air[i].tenths)}`)
				.join('\n') +
			'\n',
		asks('temperature-column', ['Probe A °C', 'Probe B °C'], {
			thenAnswer: { temperatureColumn: '1' },
			then: ok(r, 'celsius', [])
		}),
		'Two probes with nothing to say which rode with the goods',
		'Asks which column'
	);
}

function twinUnits() {
	const r = journey({ seed: 14, start: '2026-04-15T00:00:00Z', every: 10, count: 120, set: 6.0 });
	sample(
		'tomatoes-both-units.csv',
		'Timestamp,Temperature (°C),Temperature (°F)\n' +
			r
				.map(({ ms, tenths }) => `${iso(ms)},${tenthsText(tenths)},${tenthsText(fahrenheitTenths(tenths))}`)
				.join('\n') +
			'\n',
		ok(r, 'celsius', ['other-unit-column']),
		'The same sensor in °C and °F',
		'Read; °F is used as a check only'
	);
}

function withGap() {
	const all = journey({
		seed: 15,
		start: '2026-04-11T12:00:00Z',
		every: 10,
		count: 200,
		set: 2.0,
		warm: [[100, 24, 5]]
	});
	const r = all.filter((_, i) => i < 80 || i >= 92);
	sample(
		'asparagus-gap.csv',
		'time,temperature_c\n' + r.map(({ ms, tenths }) => `${iso(ms)},${tenthsText(tenths)}`).join('\n') + '\n',
		ok(r, 'celsius', ['gap'], { lines: { gap: [82] } }),
		'Two hours without readings',
		'Read; the gap is listed'
	);
}

function repeats() {
	const r = journey({ seed: 16, start: '2026-04-12T12:00:00Z', every: 10, count: 100, set: 3.5 });
	const rows = r.map(({ ms, tenths }) => `${iso(ms)},${tenthsText(tenths)}`);
	const written = [
		...rows.slice(50),
		...rows.slice(0, 50),
		rows[10],
		rows[11],
		`${iso(r[20].ms)},${tenthsText(r[20].tenths + 7)}`,
		`${iso(r[99].ms + 10 * minute)},---`
	];
	sample(
		'mushrooms-unsorted.csv',
		'time,temperature °C\n' + written.join('\n') + '\n',
		ok(r, 'celsius', ['duplicate-conflict', 'duplicate-dropped', 'missing-value', 'resorted'], {
			counts: { 'duplicate-dropped': 2, 'duplicate-conflict': 1, 'missing-value': 1 }
		}),
		'Second half first, two repeats, one conflicting repeat, one row without a value',
		'Read; all four are listed with their lines'
	);
}

function autumn() {
	const r = journey({ seed: 17, start: '2025-10-25T20:00:00Z', every: 10, count: 60, set: 4.0 });
	const changeMs = Date.parse('2025-10-26T01:00:00Z');
	sample(
		'milk-autumn-clock.csv',
		'Datum;Tijd;Temperatuur (°C)\n' +
			r
				.map(({ ms, tenths }) => {
					const o = ms < changeMs ? 120 : 60;
					return `${dmy(ms, o, '-')};${clock(ms, o)};${comma(tenths)}`;
				})
				.join('\n') +
			'\n',
		ok(r, 'celsius', ['clock-change', 'zone-assumed']),
		'The night the clocks go back: 02:00 to 02:50 stands twice',
		'Read; the order of rows tells the two hours apart'
	);
}

function startAndInterval() {
	const r = journey({ seed: 18, start: '2026-04-09T05:30:00Z', every: 15, count: 130, set: 0.5 });
	const lines = [
		'Logger SN: GL-20733',
		'Start Time: 2026-04-09T05:30:00Z',
		'Logging Interval: 15 min',
		'Temperature Unit: °C',
		'',
		'No.,Temperature',
		...r.map(({ tenths }, i) => `${i + 1},${tenthsText(tenths)}`)
	];
	sample(
		'shellfish-no-times.csv',
		lines.join('\n') + '\n',
		ok(r, 'celsius', [], { serial: 'GL-20733' }),
		'No time column: start and interval stand above',
		'Read; times follow from start and interval'
	);
}

function footer() {
	const r = journey({
		seed: 19,
		start: '2026-04-17T20:00:00Z',
		every: 10,
		count: 110,
		set: 7.5,
		warm: [[40, 20, 5]]
	});
	const lines = [
		'Fecha y hora;Temperatura (°C);Humedad (%)',
		...r.map(({ ms, tenths }, i) => `${ymdClock(ms, 120)};${comma(tenths)};${70 + (i % 5)}`),
		'',
		'Mínimo;7,2;70',
		'Máximo;12,6;74',
		'Promedio;8,1;72'
	];
	sample(
		'avocado-statistics.csv',
		lines.join('\r\n') + '\r\n',
		ok(r, 'celsius', ['footer-ignored', 'zone-assumed'], { counts: { 'footer-ignored': 3 } }),
		'Statistics below the readings',
		'Read; the footer is left out and said so'
	);
}

function cutShort() {
	const r = journey({ seed: 20, start: '2026-04-19T00:00:00Z', every: 10, count: 90, set: -0.5 });
	const text = 'time,temp_c\n' + r.map(({ ms, tenths }) => `${iso(ms)},${tenthsText(tenths)}`).join('\n');
	sample(
		'haddock-cut-short.csv',
		text.slice(0, -2),
		ok(r.slice(0, -1), 'celsius', ['cut-short'], { lines: { 'cut-short': [91] } }),
		'The download stopped inside the last figure',
		'Read without the last row, which is named'
	);
}

function gzipped() {
	const r = journey({ seed: 21, start: '2026-04-16T10:00:00Z', every: 1, count: 1440, set: 12.0 });
	const text =
		'timestamp,celsius\n' + r.map(({ ms, tenths }) => `${ms},${tenthsText(tenths)}`).join('\n') + '\n';
	const packed = gzipSync(Buffer.from(text), { level: 9 });
	packed[9] = 255;
	sample(
		'bananas.csv.gz',
		packed,
		ok(r, 'celsius', []),
		'Gzip, epoch milliseconds, one reading a minute',
		'Unpacked and read'
	);
}

function monthNames() {
	const r = journey({ seed: 22, start: '2026-04-05T06:00:00Z', every: 30, count: 70, set: 2.4 });
	const text = r.map(({ ms, tenths }) => {
		const p = parts(ms, 120);
		return `${p.d}-kwi-${p.y} ${p.h}:${p.mi}  ${tenthsText(tenths)}`;
	});
	sample(
		'raspberries-polish.txt',
		[
			'Numer seryjny: SB-30496',
			'Strefa czasowa: Europe/Warsaw',
			'',
			'Data i godzina     Temperatura [°C]',
			...text
		].join('\n') + '\n',
		ok(r, 'celsius', [], { serial: 'SB-30496', zoneBy: 'file' }),
		'Runs of spaces, Polish month names',
		'Read'
	);
}

function badSensor() {
	const r = journey({ seed: 23, start: '2026-04-18T06:00:00Z', every: 10, count: 100, set: 3.0 });
	const rows = r.map(
		({ ms, tenths }, i) =>
			`${iso(ms)};${i >= 40 && i < 43 ? '-127.0' : i === 60 ? 'ERR' : tenthsText(tenths)}`
	);
	const kept = r.filter((_, i) => !(i >= 40 && i < 43) && i !== 60);
	sample(
		'peppers-sensor-fault.csv',
		'time;temperature (°C)\n' + rows.join('\n') + '\n',
		ok(kept, 'celsius', ['gap', 'impossible-value', 'missing-value'], {
			counts: { 'impossible-value': 3, 'missing-value': 1 }
		}),
		'A probe that came loose: −127 and ERR',
		'Read; four rows are set aside and counted'
	);
}

function ahead() {
	const r = journey({ seed: 24, start: '2026-04-19T22:00:00Z', every: 10, count: 100, set: 1.2 });
	sample(
		'plums-clock-ahead.csv',
		'time,temperature °C\n' + r.map(({ ms, tenths }) => `${iso(ms)},${tenthsText(tenths)}`).join('\n') + '\n',
		ok(r, 'celsius', ['future-reading'], {
			counts: { 'future-reading': r.filter(({ ms }) => ms > uploadedMs).length }
		}),
		'A logger whose clock runs ahead of the upload',
		'Read; the readings in the future are counted'
	);
}

function refusals() {
	sample(
		'refused-report.pdf',
		Buffer.from(
			'%PDF-1.7\n1 0 obj\n<< /Type /Catalog >>\nendobj\ntrailer << /Root 1 0 R >>\n%%EOF\n',
			'latin1'
		),
		refuses('pdf'),
		'A PDF',
		'Refused, named'
	);
	const zip = Buffer.concat([
		Buffer.from([
			0x50, 0x4b, 0x03, 0x04, 20, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 19, 0, 0, 0
		]),
		Buffer.from('[Content_Types].xml')
	]);
	sample(
		'refused-workbook.xlsx',
		zip,
		refuses('spreadsheet'),
		'The beginning of a spreadsheet',
		'Refused: export it as CSV'
	);
	sample('refused-empty.csv', '', refuses('empty'), 'Nothing', 'Refused');
	sample(
		'refused-only-heads.csv',
		'Date,Time,Temperature (°C)\r\n',
		refuses('header-only'),
		'Column heads without readings',
		'Refused'
	);
	sample(
		'refused-signed-out.html',
		'<!DOCTYPE html>\n<html><head><title>Session ended</title></head><body>Sign in again.</body></html>\n',
		refuses('html'),
		'A sign-in page saved in place of the export',
		'Refused'
	);
	sample(
		'refused-cut.json',
		'[{"time":"2026-04-18T06:00:00Z","celsius":3.1},\n{"time":"2026-04-18T06:10:00Z","celsius":3.2},\n{"time":"2026-04-18T06:2',
		refuses('truncated', { line: 3 }),
		'JSON that stops in the middle',
		'Refused with the line'
	);
	sample(
		'refused-humidity.csv',
		'time,humidity %\n2026-04-18T06:00:00Z,80\n2026-04-18T06:10:00Z,81\n',
		refuses('no-temperature'),
		'Humidity only',
		'Refused'
	);
}

for (const make of [
	berries,
	greens,
	fishJson,
	dairyJson,
	vaccinesSenml,
	flowersEpcis,
	frozenUtf16,
	cheeseFrench,
	epochPipes,
	ambiguous,
	noUnit,
	twoProbes,
	twinUnits,
	withGap,
	repeats,
	autumn,
	startAndInterval,
	footer,
	cutShort,
	gzipped,
	monthNames,
	badSensor,
	ahead,
	refusals
])
	make();

rmSync(`${folder}/expected`, { recursive: true, force: true });
mkdirSync(`${folder}/expected`, { recursive: true });
for (const file of readdirSync(folder, { withFileTypes: true }))
	if (file.isFile()) rmSync(`${folder}/${file.name}`);
for (const { name, bytes, expected } of samples) {
	writeFileSync(`${folder}/${name}`, bytes);
	const { context, ...rest } = expected;
	const record = {
		file: name,
		source: 'The invented journey that tests/helpers/make-sample-uploads.mjs wrote into the file',
		generated: '2026-04-20',
		context: { uploadedAt: new Date(uploadedMs).toISOString(), siteZone, ...context },
		expected: rest
	};
	writeFileSync(`${folder}/expected/${name}.json`, JSON.stringify(record, null, '\t') + '\n');
}

const readme = `# Exports to try

Invented journeys of invented loggers, each in a layout of its own. Drop any of them on a docket’s page of readings.
\`expected/\` holds what a careful person would read out of each, taken from the journey that was written, not from the
reader. All are read as if uploaded on 20 April 2026 at 12:00 UTC; sites are in ${siteZone} unless a line says otherwise.

On a docket of today they are read as well, but lie outside its journey, and the app says so. To see life figures from one,
enter a load whose handovers lie around the days of the file (spring 2026), log its arrival at the last of them, and upload
the file there.

\`node tests/helpers/make-sample-uploads.mjs\` writes them anew, byte for byte.

| file | shows | the app |
| --- | --- | --- |
${samples.map(({ name, shows, answer }) => `| \`${name}\` | ${shows} | ${answer} |`).join('\n')}
`;
writeFileSync(`${folder}/README.md`, readme);
console.log(`${samples.length} samples`);
