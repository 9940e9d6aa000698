import { clock, day, degrees, dmy, file, iso, journey, type Case } from './journey';

const spoken: readonly [language: string, time: string, temperature: string, humidity: string][] = [
	['English', 'Date/Time', 'Temperature', 'Relative humidity (%)'],
	['German', 'Datum / Uhrzeit', 'Temperatur', 'rel. Feuchte [%]'],
	['French', 'Date et heure', 'Température', 'Humidité relative (%)'],
	['Spanish', 'Fecha y hora', 'Temperatura', 'Humedad (%HR)'],
	['Portuguese', 'Data e hora', 'Temperatura', 'Umidade (%)'],
	['Italian', 'Data e ora', 'Temperatura', 'Umidità (%UR)'],
	['Dutch', 'Datum en tijd', 'Temperatuur', 'Luchtvochtigheid (%)'],
	['Polish', 'Data i godzina', 'Temperatura', 'Wilgotność (%)'],
	['Czech', 'Datum a čas', 'Teplota', 'Vlhkost (%)'],
	['Slovak', 'Dátum a čas', 'Teplota', 'Vlhkosť (%)'],
	['Hungarian', 'Időpont', 'Hőmérséklet', 'Páratartalom (%)'],
	['Turkish', 'Tarih Saat', 'Sıcaklık', 'Nem (%)'],
	['Swedish', 'Tidpunkt', 'Temperatur', 'Luftfuktighet (%)'],
	['Danish', 'Dato og tid', 'Temperatur', 'Luftfugtighed (%)'],
	['Norwegian', 'Dato/klokkeslett', 'Temperatur', 'Fuktighet (%)'],
	['Finnish', 'Aika', 'Lämpötila', 'Kosteus (%)'],
	['Romanian', 'Data și ora', 'Temperatură', 'Umiditate (%)'],
	['Croatian', 'Datum i vrijeme', 'Temperatura', 'Vlažnost (%)'],
	['Greek', 'Ημερομηνία ώρα', 'Θερμοκρασία', 'Υγρασία (%)'],
	['Russian', 'Дата и время', 'Температура', 'Влажность (%)'],
	['Ukrainian', 'Дата та час', 'Температура', 'Вологість (%)'],
	['Chinese', '时间', '温度', '湿度(%)'],
	['traditional Chinese', '時間', '溫度', '濕度(%)'],
	['Japanese', '日時', '温度', '湿度(%)'],
	['Korean', '일시', '온도', '습도(%)'],
	['Thai', 'วันที่และเวลา', 'อุณหภูมิ', 'ความชื้น (%)'],
	['Vietnamese', 'Thời gian', 'Nhiệt độ', 'Độ ẩm (%)'],
	['Indonesian', 'Tanggal Waktu', 'Suhu', 'Kelembaban (%)'],
	['Hebrew', 'תאריך ושעה', 'טמפרטורה', 'לחות (%)'],
	['Arabic', 'التاريخ والوقت', 'درجة الحرارة', 'الرطوبة (%)']
];

/** Time, humidity and temperature, in that order, so that position tells nothing. */
const languages: readonly Case[] = spoken.map(([language, time, temperature, humidity]) => ({
	name: `heads in ${language}`,
	file: file(
		[`${time};${humidity};${temperature} (°C)`],
		(p) => `${dmy(p)} ${clock(p)};61,5;${degrees(p, ',')}`
	),
	expected: {
		channels: [
			[`${temperature} (°C)`, 'temperature'],
			[humidity, 'humidity']
		]
	}
}));

const row = (p: Parameters<typeof iso>[0]): string => `${iso(p)};${degrees(p)}`;

/** Heads, preambles and footers of every kind around the same rows. */
export const headers: readonly Case[] = [
	...languages,
	{
		name: 'a long preamble of free text and dated notes',
		file: file(
			[
				'Recording of the journey',
				'',
				'This report was made on 01.04.2026 10:00 by the depot.',
				...Array.from({ length: 60 }, (_, i) => `Remark ${i + 1}: nothing; to say, here`),
				'Serial number: TT-9921',
				'Time;Temperature °C'
			],
			row
		),
		expected: { serial: 'TT-9921' }
	},
	{
		name: 'a preamble of 600 lines before the rows',
		file: file([...Array.from({ length: 600 }, (_, i) => `line ${i}`), 'Serial;Q123', 'Time;T (°C)'], row),
		expected: { serial: 'Q123' }
	},
	{
		name: 'alarm limits in the preamble that look like values',
		file: file(
			['Device;L-551', 'High alarm;8.0 °C', 'Low alarm;2.0 °C', 'Trip;Oslo 7', '', 'Time;Temperature'],
			row
		),
		expected: { unit: 'celsius', serial: 'L-551' }
	},
	{
		name: 'limits in one unit and readings in the other say so',
		file: file(['High alarm: 46.4 °F', 'Unit: °C', 'Time;Temperature'], row),
		expected: { unit: 'celsius' }
	},
	{
		name: 'comment signs before the preamble',
		file: file(['# serial: S1', '# unit: C', '# time;temp', ''], row),
		expected: { serial: 'S1' }
	},
	{
		name: 'no head at all, with the unit in the values',
		file: file([], (p) => `${iso(p)},${degrees(p)} °C`),
		expected: {}
	},
	{
		name: 'no head and no unit',
		file: file([], row),
		expected: {
			question: 'unit',
			choices: ['celsius', 'fahrenheit'],
			then: [{ answers: { unit: 'celsius' } }]
		}
	},
	{
		name: 'heads in two lines, the quantity above its unit',
		file: file(
			['Date;Time;Temperature;Humidity', 'dd.mm.yyyy;hh:mm;°C;%RH'],
			(p) => `${dmy(p)};${clock(p)};${degrees(p)};60`
		),
		expected: {
			channels: [
				['Temperature', 'temperature'],
				['Humidity', 'humidity']
			]
		}
	},
	{
		name: 'heads in two lines that read together',
		file: file(['Date;Air;Air', 'and time;temperature °C;humidity %'], (p) => `${iso(p)};${degrees(p)};60`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'a group line above the heads',
		file: file(
			[';Sensor 1;;Sensor 2;', 'Time;Temp °C;RH %;Light lx;Shock g'],
			(p) => `${iso(p)};${degrees(p)};60;0;0.1`
		),
		expected: {
			channels: [
				['Temp °C', 'temperature'],
				['RH %', 'humidity'],
				['Light lx', 'light'],
				['Shock g', 'shock']
			]
		}
	},
	{
		name: 'group names above bare units',
		file: file(['Time;Cargo;Ambient', ';°C;%RH'], (p) => `${iso(p)};${degrees(p)};60`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'a rule drawn under the heads',
		file: file(['Time;Temp (°C)', '-------------------;---------'], row),
		expected: {}
	},
	{
		name: 'a table drawn with pipes at both ends',
		file: file(['| Time | Temp (°C) |', '|------|------|'], (p) => `| ${iso(p)} | ${degrees(p)} |`),
		expected: {}
	},
	{
		name: 'the head again in the middle, where the recording goes on',
		file: file(['Time;Temp (°C)'], (p, i) => (i === 12 ? `Time;Temp (°C)\n${row(p)}` : row(p))),
		expected: { oddities: ['header-repeated'], counts: { 'header-repeated': 1 } }
	},
	{
		name: 'page breaks with the head again each time',
		file: file(['Time;Temp (°C)'], (p, i) =>
			i > 0 && i % 6 === 0 ? `\fPage ${i / 6 + 1}\nTime;Temp (°C)\n${row(p)}` : row(p)
		),
		expected: { oddities: ['header-repeated', 'bad-time'] }
	},
	{
		name: 'a footer with statistics',
		file: file(['Time;Temp (°C)'], row, ['', 'Minimum;-1.1', 'Maximum;6.3', 'Average;2.5', 'MKT;2.7']),
		expected: { oddities: ['footer-ignored'], counts: { 'footer-ignored': 4 } }
	},
	{
		name: 'a footer whose statistics carry a moment each',
		file: file(['Time;Temp (°C)'], row, [
			'',
			'Minimum;-1.1;2026-03-14T22:30:00Z',
			'Maximum;6.3;2026-03-15T02:00:00Z'
		]),
		expected: { oddities: ['footer-ignored'] }
	},
	{
		name: 'a footer with a signature and the unit',
		file: file(['Time;Temp'], row, ['', 'Unit: °C', 'End of data', 'Checksum;0xA71F']),
		expected: { unit: 'celsius', oddities: ['footer-ignored'] }
	},
	{
		name: 'start, interval and unit in the preamble and one column of values',
		file: file(['Start: 2026-03-14 18:00:00 UTC', 'Interval: 30 min', 'Temperature °C'], (p) => degrees(p)),
		expected: {}
	},
	{
		name: 'dates and times apart, with the seconds of a third column',
		file: file(['No;Date;Time;Temp °C;Event'], (p, i) => `${i + 1};${day(p)};${clock(p)}:00;${degrees(p)};`),
		expected: {}
	},
	{
		name: 'a head that repeats the name of each column',
		file: file(['Time;Temperature;Temperature'], (p) => `${iso(p)};${degrees(p)} C;${degrees(p)} C`),
		expected: { question: 'temperature-column', then: [{ answers: { temperatureColumn: '1' } }] }
	},
	{
		name: 'key = value and key<tab>value lines above tabs',
		file: file(
			['Model = T1', 'Serial\tAB12', 'Unit\tCelsius', 'Time\tTemp'],
			(p) => `${iso(p)}\t${degrees(p)}`
		),
		expected: { serial: 'AB12', unit: 'celsius', delimiter: '\t' }
	},
	{
		name: 'square brackets around section names',
		file: file(
			['[Header]', 'Serial=77812', 'Interval=1800', '[Data]', 'Time,Temp_C'],
			(p) => `${iso(p)},${degrees(p)}`
		),
		expected: { serial: '77812', readings: journey }
	}
];
