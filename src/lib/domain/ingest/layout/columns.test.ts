import { describe, expect, it } from 'vitest';
import { tableFromText } from '../delimited/table-from-text';
import { profileColumns, quantityOf, unitColumnOf } from './columns';
import { columnsOf, findTiming } from './timing';
import { meaningOf } from './words';

function profiled(text: string): ReturnType<typeof profileColumns> {
	const table = tableFromText(text);
	if ('code' in table || 'tables' in table) throw new Error('no table');
	return profileColumns(table);
}

describe('a column head', () => {
	// Words: Unicode CLDR and common usage of each language.
	it.each([
		'Temperature',
		'Temp.',
		'Temperatur [°C]',
		'Température',
		'Temperatura',
		'Temperatuur',
		'Teplota',
		'Hőmérséklet',
		'Sıcaklık',
		'Lämpötila',
		'温度',
		'温度(℃)',
		'온도',
		'Температура',
		'temp_c',
		'TempC',
		'T1'
	])('%j is a temperature', (head) => {
		expect(meaningOf(head).quantity).toBe('temperature');
	});

	it.each([
		['Humidity', 'humidity'],
		['rel. Feuchte', 'humidity'],
		['Humidité', 'humidity'],
		['Humedad', 'humidity'],
		['RH (%)', 'humidity'],
		['湿度', 'humidity'],
		['Wilgotność', 'humidity'],
		['Dew point °C', 'dew-point'],
		['Taupunkt [°C]', 'dew-point'],
		['Point de rosée', 'dew-point'],
		['Light (lux)', 'light'],
		['Shock g', 'shock'],
		['Battery V', 'other'],
		['Pressure hPa', 'other']
	])('%j is %s', (head, quantity) => {
		expect(meaningOf(head).quantity).toBe(quantity);
	});

	it.each([
		'Time',
		'Date/Time',
		'Datum',
		'Uhrzeit',
		'Heure',
		'Fecha',
		'Hora',
		'Data',
		'Ora',
		'Tijd',
		'Czas',
		'Tarih',
		'Saat',
		'日時',
		'时间',
		'timestamp',
		'recordedAt',
		'Horodatage'
	])('%j is a time', (head) => {
		expect(meaningOf(head).isTime).toBe(true);
	});

	it.each([
		['Temp min', 'min'],
		['Maximum °C', 'max'],
		['Mittelwert', 'mean'],
		['Moyenne', 'mean'],
		['Temperature', null]
	])('%j has the statistic %j', (head, statistic) => {
		expect(meaningOf(head).statistic).toBe(statistic);
	});

	it.each(['High limit °C', 'Alarm low', 'Sollwert', 'Set point', 'Consigne', 'Grenzwert'])(
		'%j is a limit, no reading',
		(head) => {
			expect(meaningOf(head).isLimit).toBe(true);
		}
	);
});

describe('columns', () => {
	const two = (text: string): unknown => findTiming(profiled(text));

	it.each([
		['a,°C\n2026-04-01 10:00,4\n2026-04-01 10:10,5\n', 'moment'],
		['Date,Time,°C\n2026-04-01,10:00,4\n2026-04-01,10:10,5\n', 'date-and-time'],
		['Date,°C\n2026-04-01,4\n2026-04-02,5\n', 'date'],
		['Time,°C\n10:00,4\n10:10,5\n', 'time-of-day'],
		['t,°C\n1772359200,4\n1772359800,5\n', 'epoch'],
		['Date,°C\n46113.41667,4\n46113.42361,5\n', 'serial-day'],
		['Elapsed (min),°C\n0,4\n10,5\n', 'elapsed'],
		['No,°C\n1,4.1\n2,5\n', 'none']
	])('show how time is kept: %j', (text, kind) => {
		expect(two(text)).toMatchObject({ kind });
	});

	it('prefer the clock of the measurement over that of the server', () => {
		const columns = profiled(
			'Received at,Measured time,°C\n2026-04-01 11:00,2026-04-01 10:00,4\n2026-04-01 11:10,2026-04-01 10:10,5\n'
		);
		expect(columnsOf(findTiming(columns))).toEqual([1]);
	});

	it('are explained by a unit in a row of its own or in every row', () => {
		const columns = profiled('Time,A,B\nhh:mm,°C,%RH\n2026-04-01 10:00,4,80\n2026-04-01 10:10,5,81\n');
		expect(columns.map(quantityOf)).toEqual([null, 'temperature', 'humidity']);
		expect(
			unitColumnOf(profiled('time,value,unit\n2026-04-01 10:00,40.1,°F\n2026-04-01 10:10,40.3,°F\n'))
		).toBe('fahrenheit');
		expect(
			unitColumnOf(profiled('time,value,unit\n2026-04-01 10:00,40.1,°F\n2026-04-01 10:10,4.3,°C\n'))
		).toBeNull();
	});
});
