import { degrees, fahrenheit, file, iso, journey, type Case, type Point } from './journey';

const head = ['Time;Temperature (°C)'];
const without = (...left: readonly number[]): Point[] => journey.filter((_, i) => !left.includes(i));
const swapped = (at: number, text: string, above = head): string =>
	file(above, (p, i) => `${iso(p)};${i === at ? text : degrees(p)}`);

/** Words for no value in a cell of their own. */
const words = [
	'',
	'-',
	'--',
	'---',
	'***',
	'####',
	'NaN',
	'NULL',
	'null',
	'N/A',
	'#N/A',
	'n.a.',
	'Err',
	'ERROR',
	'OPEN',
	'Short',
	'Fehler',
	'kein Messwert',
	'erreur',
	'sin datos',
	'sem leitura',
	'errore',
	'geen data',
	'brak',
	'hata',
	'欠測',
	'错误',
	'無',
	'No Data',
	'sensor fault',
	'Out of range',
	'LO',
	'HI',
	'OFL',
	'>OL',
	'-.-',
	'--.-',
	'----.-°C',
	'#DIV/0!',
	'1.#QNAN',
	'-1.#IND',
	'#VALUE!',
	'None',
	'(null)',
	'\\N',
	'not available',
	'нет данных',
	'없음',
	'ikke målt',
	'saknas',
	'nan°C'
];
/** Figures for no value: after a leap, or where no temperature can be. */
const sentinels = [
	'-127',
	'-127.0',
	'-999',
	'-999.9',
	'-9999',
	'9999',
	'999.9',
	'32767',
	'-32768',
	'6553.5',
	'3276.7',
	'-3276.8',
	'850',
	'1E+30',
	'-273.15',
	'-300',
	'85.0',
	'-99.9',
	'-40.0',
	'125.0',
	'99999',
	'-50.0',
	'255',
	'127.9'
];

const noBreak = '\u00a0';
const narrow = '\u202f';

export const values: readonly Case[] = [
	...words.map((word) => ({
		name: `no value written as ${JSON.stringify(word)}`,
		file: swapped(7, word),
		expected: { readings: without(7), oddities: ['missing-value'], counts: { 'missing-value': 1 } }
	})),
	...sentinels.map((figure) => ({
		name: `no value written as the figure ${figure}`,
		file: swapped(7, figure),
		expected: { readings: without(7), oddities: ['impossible-value'], counts: { 'impossible-value': 1 } }
	})),
	{
		name: 'a run of one sentinel at the start',
		file: file(head, (p, i) => `${iso(p)};${i < 3 ? '-127.0' : degrees(p)}`),
		expected: {
			readings: without(0, 1, 2),
			oddities: ['impossible-value'],
			counts: { 'impossible-value': 3 }
		}
	},
	{
		name: 'goods near 85 °C and 100 °C are no fault when the readings lead there',
		file: file(head, (p, i) => `${iso(p)};${70 + i * 2}.0`),
		expected: { readings: journey.map(({ ms }, i) => ({ ms, tenths: 700 + i * 20 })) }
	},
	{
		name: 'dry ice near −99.9 °C and below is no fault when the readings lead there',
		file: file(head, (p, i) => `${iso(p)};${(-90 - i * 0.9).toFixed(1)}`),
		expected: { readings: journey.map(({ ms }, i) => ({ ms, tenths: -900 - i * 9 })) }
	},
	{
		name: 'a freezer held at −40.0 °C is no fault',
		file: file(head, (p, i) => `${iso(p)};${i % 2 === 0 ? '-40.0' : '-39.5'}`),
		expected: { readings: journey.map(({ ms }, i) => ({ ms, tenths: i % 2 === 0 ? -400 : -395 })) }
	},
	{
		name: 'Unicode minus',
		file: file(head, (p) => `${iso(p)};${degrees(p).replace('-', '\u2212')}`),
		expected: {}
	},
	{
		name: 'en dash for minus',
		file: file(head, (p) => `${iso(p)};${degrees(p).replace('-', '\u2013')}`),
		expected: {}
	},
	{
		name: 'a minus behind its figure',
		file: file(head, (p) => `${iso(p)};${degrees(p).replace(/^-(.*)$/, '$1-')}`),
		expected: {}
	},
	{
		name: 'a minus apart from its figure',
		file: file(head, (p) => `${iso(p)};${degrees(p).replace('-', '- ')}`),
		expected: {}
	},
	{
		name: 'plus signs',
		file: file(head, (p) => `${iso(p)};${p.tenths >= 0 ? '+' : ''}${degrees(p)}`),
		expected: {}
	},
	{
		name: 'figures without a leading zero',
		file: file(head, (p) => `${iso(p)};${degrees(p).replace(/^(-?)0\./, '$1.')}`),
		expected: {}
	},
	{
		name: 'figures padded with zeros',
		file: file(head, (p) => `${iso(p)};${degrees(p).replace(/^(-?)/, '$100')}`),
		expected: {}
	},
	{
		name: 'no-break space before the unit',
		file: file(['Time;Temp'], (p) => `${iso(p)};${degrees(p)}${noBreak}°C`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'narrow no-break space before the unit',
		file: file(['Time;Temp'], (p) => `${iso(p)};${degrees(p)}${narrow}°C`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'no-break spaces around the figure',
		file: file(head, (p) => `${iso(p)};${noBreak}${degrees(p)}${noBreak}`),
		expected: {}
	},
	{
		name: 'the unit glued to the figure',
		file: file(['Time;Temp'], (p) => `${iso(p)};${degrees(p)}C`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'the unit as a sign of its own',
		file: file(['Time;Temp'], (p) => `${iso(p)};${degrees(p)}℃`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'the unit spelled out',
		file: file(['Time;Temp'], (p) => `${iso(p)};${degrees(p)} degrees Celsius`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'the unit before the figure',
		file: file(['Time;Temp'], (p) => `${iso(p)};°C ${degrees(p)}`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'full-width digits',
		file: file(
			head,
			(p) => `${iso(p)};${degrees(p).replace(/\d/g, (d) => String.fromCharCode(0xff10 + Number(d)))}`
		),
		expected: {}
	},
	{
		name: 'figures as spreadsheet text',
		file: file(['Time,Temp (°C)'], (p) => `${iso(p)},="${degrees(p)}"`),
		expected: {}
	},
	{
		name: 'figures with an apostrophe before them',
		file: file(head, (p) => `${iso(p)};'${degrees(p)}`),
		expected: {}
	},
	{
		name: 'an asterisk that marks an alarm behind the figure',
		file: file(head, (p) => `${iso(p)};${degrees(p)}${p.tenths > 50 ? ' *' : ''}`),
		expected: {}
	},
	{
		name: 'H and L behind figures outside the limits',
		file: file(head, (p) => `${iso(p)};${degrees(p)}${p.tenths > 50 ? ' H' : p.tenths < 0 ? ' L' : ''}`),
		expected: {}
	},
	{
		name: 'figures in exponent form',
		file: file(head, (p) => `${iso(p)};${(p.tenths / 10).toExponential(3)}`),
		expected: {}
	},
	{
		name: 'more decimals than a logger resolves',
		file: file(head, (p) => `${iso(p)};${degrees(p)}00000`),
		expected: {}
	},
	{
		name: 'decimal commas quoted between commas',
		file: file(['Time,"Temp, °C"'], (p) => `${iso(p)},"${degrees(p, ',')}"`),
		expected: {}
	},
	{
		name: '°F in the head',
		file: file(['Time;Temp (°F)'], (p) => `${iso(p)};${fahrenheit(p)}`),
		expected: { unit: 'fahrenheit' }
	},
	{
		name: 'deg F in a row of units',
		file: file(['Time;Temp', 's;degF'], (p) => `${iso(p)};${fahrenheit(p)}`),
		expected: { unit: 'fahrenheit' }
	},
	{
		name: 'kelvin',
		file: file(['Time;Temp (K)'], (p) => `${iso(p)};${((p.tenths * 10 + 27315) / 100).toFixed(2)}`),
		expected: { unit: 'kelvin' }
	},
	{
		name: 'the unit in a column of its own',
		file: file(['Time;Temp;Unit'], (p) => `${iso(p)};${fahrenheit(p)};F`),
		expected: { unit: 'fahrenheit' }
	},
	{
		name: 'a column of units that changes in the middle',
		file: file(['Time;Temp;Unit'], (p, i) =>
			i < 12 ? `${iso(p)};${degrees(p)};C` : `${iso(p)};${fahrenheit(p)};F`
		),
		expected: { refused: 'two-recordings' }
	},
	{
		name: 'a unit that changes in the middle of the values',
		file: file(['Time;Temp'], (p, i) =>
			i < 12 ? `${iso(p)};${degrees(p)} °C` : `${iso(p)};${fahrenheit(p)} °F`
		),
		expected: { refused: 'two-recordings' }
	},
	{
		name: 'both units, which agree',
		file: file(['Time;Temp (°F);Temp (°C)'], (p) => `${iso(p)};${fahrenheit(p)};${degrees(p)}`),
		expected: { unit: 'celsius', oddities: ['other-unit-column'] }
	},
	{
		name: 'both units under names of their own',
		file: file(['Time;Celsius;Fahrenheit'], (p) => `${iso(p)};${degrees(p)};${fahrenheit(p)}`),
		expected: { unit: 'celsius', oddities: ['other-unit-column'] }
	},
	{
		name: 'both units, of which one stands still',
		file: file(['Time;Temp (°C);Temp (°F)'], (p) => `${iso(p)};${degrees(p)};35.60`),
		expected: { unit: 'celsius', oddities: ['other-unit-column', 'twin-disagrees'] }
	},
	{
		name: 'values of a hot room that can only be °F',
		file: file(['Time;Temp'], (p, i) => `${iso(p)};${(68 + (i % 5) * 1.8).toFixed(1)}`),
		expected: {
			question: 'unit',
			then: [
				{
					answers: { unit: 'fahrenheit' },
					readings: journey.map(({ ms }, i) => ({ ms, tenths: 200 + (i % 5) * 10 }))
				}
			]
		}
	},
	{
		name: 'values of 34 to 40 that may be either unit',
		file: file(['Time;Temp'], (p, i) => `${iso(p)};${34 + (i % 7)}`),
		expected: {
			question: 'unit',
			choices: ['celsius', 'fahrenheit'],
			then: [
				{
					answers: { unit: 'celsius' },
					readings: journey.map(({ ms }, i) => ({ ms, tenths: 340 + (i % 7) * 10 }))
				}
			]
		}
	}
];
