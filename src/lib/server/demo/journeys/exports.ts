import { DateTime } from 'luxon';
import type { LayoutName } from './journey';
import type { Written } from './temperatures';

/** What a logger's program knows when it writes. */
export interface ExportOrder {
	serial: string;
	trip: string;
	zone: string;
	written: Written;
}

export interface ExportFile {
	name: string;
	mediaType: string;
	text: string;
}

type Rows = readonly (readonly [ms: number, celsius: number])[];
type Write = (rows: Rows, order: ExportOrder) => string;

const utc = (ms: number, format: string) => DateTime.fromMillis(ms, { zone: 'utc' }).toFormat(format);
const fahrenheit = (celsius: number) => ((celsius * 9) / 5 + 32).toFixed(1);
const lines = (all: readonly string[]) => `${all.join('\r\n')}\r\n`;

const iso: Write = (rows, { serial, trip }) =>
	lines([
		`Serial;${serial}`,
		`Trip;${trip}`,
		'',
		'Time (UTC);Temperature °C',
		...rows.map(([ms, celsius]) => `${utc(ms, "yyyy-MM-dd'T'HH:mm:ss'Z'")};${celsius.toFixed(1)}`)
	]);

const german: Write = (rows, { serial, trip }) =>
	lines([
		'Datenlogger-Protokoll',
		`Seriennummer;${serial}`,
		`Bezeichnung;${trip}`,
		'Messintervall;10 min',
		'Zeitzone;UTC+1',
		'',
		'Nr.;Datum;Uhrzeit;Temperatur [°C]',
		...rows.map(([ms, celsius], at) => {
			const wall = ms + 3_600_000;
			return `${at + 1};${utc(wall, 'dd.MM.yyyy;HH:mm')};${celsius.toFixed(1).replace('.', ',')}`;
		})
	]);

const american: Write = (rows, { serial, trip, zone }) =>
	lines([
		`Logger ID,${serial}`,
		`Trip Name,"${trip}"`,
		`Time Zone,${zone}`,
		'',
		'Date/Time,Temperature (°F)',
		...rows.map(([ms, celsius]) => {
			const wall = DateTime.fromMillis(ms, { zone });
			return `${wall.toFormat('MM/dd/yyyy h:mm:ss')} ${wall.hour < 12 ? 'AM' : 'PM'},${fahrenheit(celsius)}`;
		})
	]);

const jsonList: Write = (rows, { serial }) =>
	JSON.stringify(
		rows.map(([ms, temperatureCelsius]) => ({
			...{ serial, recordedAt: new Date(ms).toISOString() },
			temperatureCelsius
		})),
		null,
		1
	);

const jsonNested: Write = (rows, { serial, trip }) =>
	JSON.stringify({
		device: { serial, firmware: '2.1' },
		trip: { tripName: trip },
		settings: { interval: '10 min', unit: 'Cel' },
		data: { readings: rows.map(([ms, celsius]) => ({ t: ms / 1000, value: celsius.toFixed(1) })) }
	});

const tabs: Write = (rows, { serial }) =>
	lines([
		`Serial number\t${serial}`,
		'Date\tTime UTC\tTemp °C',
		...rows.map(([ms, celsius]) => `${utc(ms, 'yyyy-MM-dd\tHH:mm')}\t${celsius.toFixed(1)}`)
	]);

const withHumidity: Write = (rows, { serial }) =>
	lines([
		`Logger SN: ${serial}`,
		'',
		'Timestamp (UTC),Temperature (°C),Humidity (%RH)',
		...rows.map(
			([ms, celsius], at) =>
				`${utc(ms, 'yyyy-MM-dd HH:mm:ss')},${celsius.toFixed(1)},${(88 + 4 * Math.sin(at / 9)).toFixed(0)}`
		)
	]);

const twoProbes: Write = (rows) =>
	lines([
		'Time (UTC),Probe A °C,Probe B °C',
		...rows.map(
			([ms, celsius], at) =>
				`${utc(ms, 'yyyy-MM-dd HH:mm:ss')},${celsius.toFixed(1)},${(celsius + 1.8 + 0.6 * Math.sin(at / 7)).toFixed(1)}`
		)
	]);

const noUnit: Write = (rows) =>
	lines([
		'time;temperature',
		...rows.map(([ms, celsius]) => `${utc(ms, "yyyy-MM-dd'T'HH:mm:ss'Z'")};${fahrenheit(celsius)}`)
	]);

const layouts: Record<LayoutName, { ending: string; mediaType: string; write: Write }> = {
	iso: { ending: 'csv', mediaType: 'text/csv', write: iso },
	german: { ending: 'csv', mediaType: 'text/csv', write: german },
	american: { ending: 'csv', mediaType: 'text/csv', write: american },
	'json-list': { ending: 'json', mediaType: 'application/json', write: jsonList },
	'json-nested': { ending: 'json', mediaType: 'application/json', write: jsonNested },
	tabs: { ending: 'txt', mediaType: 'text/plain', write: tabs },
	'with-humidity': { ending: 'csv', mediaType: 'text/csv', write: withHumidity },
	'two-probes': { ending: 'csv', mediaType: 'text/csv', write: twoProbes },
	'no-unit': { ending: 'csv', mediaType: 'text/csv', write: noUnit }
};

/** The export of a trip in one of the layouts that come to a dock. */
export function exportOf(layout: LayoutName, order: ExportOrder): ExportFile {
	const { ending, mediaType, write } = layouts[layout];
	const { times, celsius } = order.written;
	const rows = times.map((ms, at) => [ms, celsius[at] ?? 0] as const);
	const day = utc(times[0] ?? 0, 'yyyyMMdd');
	return { name: `${order.serial}_${day}.${ending}`, mediaType, text: write(rows, order) };
}
