import {
	clock,
	day,
	degrees,
	dmy,
	fahrenheit,
	file,
	iso,
	journey,
	two,
	type Case,
	type Point
} from './journey';

const head = ['Time;Temperature (°C)'];
const row = (p: Point): string => `${iso(p)};${degrees(p)}`;
const pad = (text: string, width: number): string => text.padStart(width);

/** Two whole days by the hour: tenths follow from day and hour alone. */
const tenthsOf = (date: number, hour: number): number => 20 + date * 10 - hour * 2;
const hours = Array.from({ length: 24 }, (_, h) => h);
const hourly: readonly Point[] = [14, 15].flatMap((date) =>
	hours.map((h) => ({ ms: Date.UTC(2026, 2, date, h), tenths: tenthsOf(date, h) }))
);
const dayRow = (date: number, sign = ';', skip = -1): string =>
	[`2026-03-${date}`, ...hours.map((h) => (h === skip ? '' : (tenthsOf(date, h) / 10).toFixed(1)))].join(
		sign
	);

const months = Array.from({ length: 12 }, (_, m) => m);
const monthly: readonly Point[] = [2023, 2024].flatMap((year) =>
	months.map((m) => ({ ms: Date.UTC(year, m), tenths: 100 + m * 7 + (year - 2023) }))
);
const yearRow = (year: number): string =>
	[String(year), ...months.map((m) => ((100 + m * 7 + (year - 2023)) / 10).toFixed(1))].join(',');

/** A second probe, always 12.3 °C warmer. */
const second = journey.map(({ ms, tenths }) => ({ ms, tenths: tenths + 123 }));
const warmer = (p: Point): string => degrees({ ...p, tenths: p.tenths + 123 });
const later = journey.map(({ ms, tenths }) => ({ ms: ms + 86_400_000, tenths }));

const delimited: readonly Case[] = [
	{
		name: 'commas',
		file: file(['Time,Temp (°C)'], (p) => `${iso(p)},${degrees(p)}`),
		expected: { delimiter: ',' }
	},
	{
		name: 'pipes',
		file: file(['Time|Temp (°C)'], (p) => `${iso(p)}|${degrees(p)}`),
		expected: { delimiter: '|' }
	},
	{
		name: 'tabs',
		file: file(['Time\tTemp (°C)'], (p) => `${iso(p)}\t${degrees(p)}`),
		expected: { delimiter: '\t' }
	},
	{
		name: 'one space',
		file: file(['Date Time Temp°C'], (p) => `${day(p)} ${clock(p)} ${degrees(p)}`),
		expected: {}
	},
	{
		name: 'columns of fixed width',
		file: file(['Date        Time        Temp °C'], (p) => `${day(p)}  ${clock(p)}  ${pad(degrees(p), 12)}`),
		expected: {}
	},
	{
		name: 'fixed width with a number in front',
		file: file(
			['   No  Date        Time      Temp °C   RH %'],
			(p, i) => `${pad(String(i + 1), 5)}  ${day(p)}  ${clock(p)}  ${pad(degrees(p), 10)}   ${pad('61.5', 5)}`
		),
		expected: {}
	},
	{
		name: 'tabs and spaces mixed',
		file: file(['Date Time\tTemp °C'], (p) => `${day(p)} ${clock(p)} \t ${degrees(p)}`),
		expected: {}
	},
	{
		name: 'semicolons with commas in dates',
		file: file(['Time;Temp (°C)'], (p) => `${day(p)}, ${clock(p)};${degrees(p)}`),
		expected: { delimiter: ';' }
	},
	{
		name: 'commas and decimal commas, quoted',
		file: file(['"Time","Temp (°C)","Note"'], (p) => `"${iso(p)}","${degrees(p, ',')}","a ""b"", c"`),
		expected: { delimiter: ',' }
	},
	{
		name: 'single quotes',
		file: file(["'Time','Temp (°C)'"], (p) => `'${iso(p)}','${degrees(p)}'`),
		expected: {}
	},
	{
		name: 'a caret between cells',
		file: file(['Time^Temp (°C)'], (p) => `${iso(p)}^${degrees(p)}`),
		expected: {}
	},
	{
		name: 'a line break inside a quoted head',
		file: file(['Time;"Temperature', '(°C)"'], row),
		expected: {}
	},
	{
		name: 'a line break inside a quoted note',
		file: file(['Time;Temp (°C);Note'], (p, i) => `${iso(p)};${degrees(p)};${i === 5 ? '"door\nopen"' : ''}`),
		expected: {}
	},
	{
		name: 'quotes inside an unquoted note',
		file: file(['Time;Temp (°C);Note'], (p, i) => `${iso(p)};${degrees(p)};${i === 5 ? 'box 12" high' : ''}`),
		expected: {}
	},
	{ name: 'trailing delimiters', file: file(['Time;Temp (°C);;;'], (p) => `${row(p)};;;`), expected: {} },
	{ name: 'trailing delimiters on the rows only', file: file(head, (p) => `${row(p)};`), expected: {} },
	{ name: 'leading delimiters', file: file([';Time;Temp (°C)'], (p) => `;${row(p)}`), expected: {} },
	{
		name: 'rows of uneven length with notes at some ends',
		file: file(['Time;Temp (°C)'], (p, i) => (i % 5 === 2 ? `${row(p)};door;open;again` : row(p))),
		expected: {}
	},
	{
		name: 'a row that lost its value',
		file: file(['Time;Temp (°C);RH (%)'], (p, i) => (i === 6 ? iso(p) : `${row(p)};60`)),
		expected: {
			readings: journey.filter((_, i) => i !== 6),
			oddities: ['short-row'],
			counts: { 'short-row': 1 }
		}
	},
	{
		name: 'a counter before the time',
		file: file(['#;Time;Temp (°C)'], (p, i) => `${i + 1};${row(p)}`),
		expected: {}
	},
	{
		name: 'spaces around every cell',
		file: file([' Time ; Temp (°C) '], (p) => ` ${iso(p)} ; ${degrees(p)} `),
		expected: {}
	},
	{
		name: 'decimal commas between commas, without quotes',
		file: file(['Date,Time,Temp (°C)'], (p) => `${day(p)},${clock(p)},${degrees(p, ',')}`),
		expected: {}
	}
];

const several: readonly Case[] = [
	{
		name: 'two probes that the file does not tell apart',
		file: file(['Time;Probe 1 (°C);Probe 2 (°C)'], (p) => `${row(p)};${warmer(p)}`),
		expected: {
			question: 'temperature-column',
			choices: ['Probe 1 (°C)', 'Probe 2 (°C)'],
			then: [
				{ answers: { temperatureColumn: '1' } },
				{ answers: { temperatureColumn: '2' }, readings: second }
			]
		}
	},
	{
		name: 'minimum, mean and maximum: the mean is used',
		file: file(
			['Time;Temp min (°C);Temp avg (°C);Temp max (°C)'],
			(p) => `${iso(p)};${degrees({ ...p, tenths: p.tenths - 9 })};${degrees(p)};${warmer(p)}`
		),
		expected: {}
	},
	{
		name: 'actual, minimum and maximum: the actual is used',
		file: file(
			['Time;Max;Min;Temperature °C'],
			(p) => `${iso(p)};${warmer(p)};${degrees({ ...p, tenths: p.tenths - 9 })};${degrees(p)}`
		),
		expected: {}
	},
	{
		name: 'alarm limits as columns are not the temperature',
		file: file(['Time;High alarm °C;Low alarm °C;Temp °C'], (p) => `${iso(p)};8.0;-2.0;${degrees(p)}`),
		expected: {}
	},
	{
		name: 'upper and lower limits under other words',
		file: file(['Time;Upper °C;Lower °C;Temp °C'], (p) => `${iso(p)};8.0;-2.0;${degrees(p)}`),
		expected: {}
	},
	{
		name: 'a set-point beside the measured air',
		file: file(['Zeit;Sollwert (°C);Istwert (°C)'], (p) => `${iso(p)};2,0;${degrees(p, ',')}`),
		expected: {}
	},
	{
		name: 'a set point column in two words',
		file: file(['Time;Set Point °C;Return Air °C'], (p) => `${iso(p)};2.0;${degrees(p)}`),
		expected: {}
	},
	{
		name: 'dew point, humidity, light and shock are kept with their quantity',
		file: file(
			['Time;Dew point (°C);RH (%);Light (lx);Shock (g);Temp (°C);Battery (V)'],
			(p) => `${iso(p)};-3.0;61;0;0.1;${degrees(p)};3.6`
		),
		expected: {
			channels: [
				['Temp (°C)', 'temperature'],
				['Dew point (°C)', 'dew-point'],
				['RH (%)', 'humidity'],
				['Light (lx)', 'light'],
				['Shock (g)', 'shock'],
				['Battery (V)', 'other']
			]
		}
	},
	{
		name: 'humidity and dew point alone hold no temperature',
		file: file(['Time;RH (%);Dew point (°C)'], (p) => `${iso(p)};60;${degrees(p)}`),
		expected: { refused: 'no-temperature' }
	},
	{
		name: 'a temperature delta or a rate is not the temperature',
		file: file(['Time;Temp (°C);Delta T (°C);Rate (°C/h)'], (p) => `${row(p)};0.1;0.2`),
		expected: {}
	},
	{
		name: 'a running mean kinetic temperature is not the temperature',
		file: file(['Time;Temp (°C);MKT (°C)'], (p) => `${row(p)};5.1`),
		expected: {}
	},
	{
		name: 'a status column of words',
		file: file(['Time;Status;Temp (°C)'], (p) => `${iso(p)};OK;${degrees(p)}`),
		expected: {}
	},
	{
		name: 'the serial repeated in every row',
		file: file(['Serial;Time;Temp (°C)'], (p) => `884201;${row(p)}`),
		expected: {}
	}
];

const wide: readonly Case[] = [
	{
		name: 'a row a day, hours as 00:00 … 23:00',
		file: [['Date', ...hours.map((h) => `${two(h)}:00`)].join(';'), 'Unit;°C', dayRow(14), dayRow(15), '']
			.join('\n')
			.replace('Unit;°C\n', ''),
		expected: { question: 'unit', then: [{ answers: { unit: 'celsius' }, readings: hourly }] }
	},
	{
		name: 'a row a day, hours as 0 … 23, unit above',
		file: ['Unit;°C', '', ['Date', ...hours].join(';'), dayRow(14), dayRow(15), ''].join('\n'),
		expected: { readings: hourly }
	},
	{
		name: 'a row a day, hours as H00 … H23',
		file: [
			'Temperature °C',
			['Day', ...hours.map((h) => `H${two(h)}`)].join(','),
			dayRow(14, ','),
			dayRow(15, ','),
			''
		].join('\n'),
		expected: { readings: hourly }
	},
	{
		name: 'a row a day, hours as 1h … 24h: the hour that ends then',
		file: [
			'Temperature °C',
			['Day', ...hours.map((h) => `${h + 1}h`)].join(','),
			dayRow(14, ','),
			dayRow(15, ','),
			''
		].join('\n'),
		expected: { readings: hourly.map(({ ms, tenths }) => ({ ms: ms + 3_600_000, tenths })) }
	},
	{
		name: 'a row a day with an hour left empty',
		file: [
			'Temperature °C',
			['Date', ...hours.map((h) => `${two(h)}:00`)].join(','),
			dayRow(14, ',', 5),
			dayRow(15, ','),
			''
		].join('\n'),
		expected: {
			readings: hourly.filter(({ ms }) => ms !== Date.UTC(2026, 2, 14, 5)),
			oddities: ['missing-value']
		}
	},
	{
		name: 'a row a year, months by name',
		file: [
			'Mean temperature (°C)',
			'Year,Jan,Feb,Mar,Apr,May,Jun,Jul,Aug,Sep,Oct,Nov,Dec',
			yearRow(2023),
			yearRow(2024),
			''
		].join('\n'),
		expected: { readings: monthly }
	},
	{
		name: 'a row a year, quoted months in capitals, no unit',
		file: [
			'"YEAR","JAN","FEB","MAR","APR","MAY","JUN","JUL","AUG","SEP","OCT","NOV","DEC"',
			yearRow(2023),
			yearRow(2024),
			''
		].join('\n'),
		expected: { question: 'unit', then: [{ answers: { unit: 'celsius' }, readings: monthly }] }
	},
	{
		name: 'a row a year, months as 1 … 12',
		file: [
			'Temperature °C',
			`Year,${months.map((m) => m + 1).join(',')}`,
			yearRow(2023),
			yearRow(2024),
			''
		].join('\n'),
		expected: { readings: monthly }
	}
];

const longHead = 'Time,Sensor,Quantity,Value,Unit';
const long: readonly Case[] = [
	{
		name: 'a row a quantity, with its unit',
		file: file([longHead], (p) => `${iso(p)},S1,temperature,${degrees(p)},°C\n${iso(p)},S1,humidity,61.0,%`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'a row a quantity under "parameter"',
		file: file(
			['timestamp;parameter;value'],
			(p) => `${iso(p)};Temperature (°C);${degrees(p)}\n${iso(p)};Humidity (%);61`
		),
		expected: { unit: 'celsius' }
	},
	{
		name: 'a row a sensor, two sensors that nothing tells apart',
		file: file(['Time;Sensor;Temp (°C)'], (p) => `${iso(p)};A7;${degrees(p)}\n${iso(p)};B2;${warmer(p)}`),
		expected: {
			question: 'temperature-column',
			then: [
				{ answers: { temperatureColumn: '1' } },
				{ answers: { temperatureColumn: '2' }, readings: second }
			]
		}
	},
	{
		name: 'blocks of one sensor after the other in one table',
		file:
			file(['Sensor;Time;Temp (°C)'], (p) => `Front;${row(p)}`) +
			journey.map((p) => `Rear;${iso(p)};${warmer(p)}\n`).join(''),
		expected: {
			question: 'part',
			choices: ['Front', 'Rear'],
			then: [{ answers: { part: 'first' } }, { answers: { part: 'second' }, readings: second }]
		}
	},
	{
		name: 'sensor numbers instead of names',
		file: file(
			['Time;Sensor ID;Temp (°C)'],
			(p) => `${iso(p)};101;${degrees(p)}\n${iso(p)};102;${warmer(p)}`
		),
		expected: {
			question: 'temperature-column',
			then: [
				{ answers: { temperatureColumn: '1' } },
				{ answers: { temperatureColumn: '2' }, readings: second }
			]
		}
	}
];

const part = (name: string, points: readonly Point[], title = 'Time;Temp (°C)'): string =>
	file([`Serial;${name}`, title], row, [], '\n', points);

const sections: readonly Case[] = [
	{
		name: 'two recordings of two serials one below the other',
		file: `${part('A11', journey)}\n${part('B22', second)}`,
		expected: {
			question: 'part',
			then: [
				{ answers: { part: 'first' }, serial: 'A11' },
				{ answers: { part: 'second' }, readings: second, serial: 'B22' }
			]
		}
	},
	{
		name: 'one recording continued on the next day under its head',
		file: `${part('A11', journey, 'Time;Temperature (°C)')}\n${file(head, row, [], '\n', later)}`,
		expected: { readings: [...journey, ...later], oddities: ['gap', 'header-repeated'] }
	},
	{
		name: 'a list of alarms above the readings',
		file: file(['Alarms', 'Time;Event;Value', '2026-03-15T02:00:00Z;High;6.3', '', 'Data', ...head], row),
		expected: {}
	},
	{
		name: 'a list of alarms below the readings',
		file: file(head, row, [
			'',
			'Events',
			'Time;Event',
			'2026-03-15T02:00:00Z;door open',
			'2026-03-15T03:00:00Z;door closed'
		]),
		expected: { oddities: ['footer-ignored'] }
	},
	{
		name: 'readings and then humidity as a section of its own',
		file: `${file(head, row)}\n${file(['Time;Humidity (%)'], (p) => `${iso(p)};61.5`)}`,
		expected: { oddities: ['footer-ignored'] }
	}
];

const cut: readonly Case[] = [
	{
		name: 'cut inside the last figure',
		file: file(head, row).slice(0, -2),
		expected: { readings: journey.slice(0, -1), oddities: ['cut-short'], counts: { 'cut-short': 1 } }
	},
	{
		name: 'cut inside the last time',
		file: file(head, row).slice(0, -12),
		expected: { readings: journey.slice(0, -1), oddities: ['cut-short'] }
	},
	{
		name: 'cut behind the last time',
		file: file(head, row).slice(0, -4),
		expected: { readings: journey.slice(0, -1), oddities: ['cut-short'] }
	},
	{
		name: 'both units, cut',
		file: file(['Time;Temp (°C);Temp (°F)'], (p) => `${row(p)};${fahrenheit(p)}`).slice(0, -2),
		expected: { readings: journey.slice(0, -1), oddities: ['cut-short', 'other-unit-column'] }
	},
	{
		name: 'dates before a day of its own, cut',
		file: file(['Datum;Zeit;Temp °C'], (p) => `${dmy(p)};${clock(p)};${degrees(p, ',')}`).slice(0, -6),
		expected: { readings: journey.slice(0, -1), oddities: ['cut-short'] }
	}
];

export const shapes: readonly Case[] = [...delimited, ...several, ...wide, ...long, ...sections, ...cut];
