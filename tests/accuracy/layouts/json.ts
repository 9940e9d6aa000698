import { degrees, iso, journey, type Case, type Point } from './journey';

const text = (value: unknown): string => JSON.stringify(value);
const celsius = ({ tenths }: Point): number => tenths / 10;
const rows = journey.map((p) => ({ time: iso(p), temperature: celsius(p) }));
const second = journey.map(({ ms, tenths }) => ({ ms, tenths: tenths + 123 }));
const seconds = ({ ms }: Point): number => ms / 1000;
const unit = 'celsius';
const deep = (levels: number): string => '['.repeat(levels) + ']'.repeat(levels);

export const json: readonly Case[] = [
	{
		name: 'objects with a unit in the key',
		file: text(journey.map((p) => ({ ts: iso(p), temp_c: celsius(p), rh: 60 }))),
		expected: { unit }
	},
	{
		name: 'objects without a unit',
		file: text(rows),
		expected: { question: 'unit', then: [{ answers: { unit } }] }
	},
	{
		name: 'metadata above the readings',
		file: text({ device: { serial: 'X-900', unit: 'C' }, data: { readings: rows } }),
		expected: { unit, serial: 'X-900' }
	},
	{
		name: 'metadata below the readings',
		file: text({ readings: rows, meta: { unit: '°C' } }),
		expected: { unit }
	},
	{
		name: 'readings many levels down',
		file: text({ a: { b: { c: { d: [{ e: { log: rows } }] } } }, temperatureUnit: 'Celsius' }),
		expected: { unit }
	},
	{
		name: 'an object of value and unit inside each reading',
		file: text(
			journey.map((p) => ({
				t: iso(p),
				sensors: { temp: { value: celsius(p), unit: 'C' }, hum: { value: 60, unit: '%' } }
			}))
		),
		expected: { unit }
	},
	{
		name: 'a list of sensors inside each reading',
		file: text(
			journey.map((p) => ({
				time: iso(p),
				values: [
					{ type: 'temperature', value: celsius(p), unit: 'C' },
					{ type: 'humidity', value: 60, unit: '%' }
				]
			}))
		),
		expected: { unit }
	},
	{
		name: 'columns side by side',
		file: text({ unit: 'C', time: journey.map(iso), temperature: journey.map(celsius) }),
		expected: { unit }
	},
	{
		name: 'columns with epoch seconds',
		file: text({ unit: 'C', data: { ts: journey.map(seconds), temp: journey.map(celsius) } }),
		expected: { unit }
	},
	{
		name: 'pairs',
		file: text({ unit: 'C', data: journey.map((p) => [p.ms, celsius(p)]) }),
		expected: { unit }
	},
	{
		name: 'pairs under names of columns',
		file: text({
			columns: ['time', 'temperature_c', 'humidity'],
			rows: journey.map((p) => [iso(p), celsius(p), 60])
		}),
		expected: { unit }
	},
	{
		name: 'a table whose first row is its head',
		file: text([['time', 'temp (°C)'], ...journey.map((p) => [iso(p), celsius(p)])]),
		expected: { unit }
	},
	{
		name: 'moments as keys',
		file: text({ unit: 'C', values: Object.fromEntries(journey.map((p) => [iso(p), celsius(p)])) }),
		expected: { unit }
	},
	{
		name: 'JSON Lines',
		file: journey.map((p) => text({ time: iso(p), temp_c: celsius(p) })).join('\n'),
		expected: { unit }
	},
	{
		name: 'JSON Lines below a line of metadata',
		file: [text({ serial: 'Z1', unit: 'C' }), ...rows.map(text)].join('\n'),
		expected: { unit, serial: 'Z1' }
	},
	{
		name: 'JSON Lines cut in the last line',
		file: journey
			.map((p) => text({ time: iso(p), temp_c: celsius(p) }))
			.join('\n')
			.slice(0, -9),
		expected: { readings: journey.slice(0, -1), oddities: ['cut-short'] }
	},
	{
		name: 'numbers as strings',
		file: text(journey.map((p) => ({ time: iso(p), temp_c: degrees(p) }))),
		expected: { unit }
	},
	{
		name: 'numbers as strings with decimal commas',
		file: text(journey.map((p) => ({ time: iso(p), temp_c: degrees(p, ',') }))),
		expected: { unit }
	},
	{
		name: 'numbers as strings with their unit',
		file: text(journey.map((p) => ({ time: iso(p), temp: `${degrees(p)} °C` }))),
		expected: { unit }
	},
	{
		name: 'nulls',
		file: text(journey.map((p, i) => ({ time: iso(p), temp_c: i === 4 ? null : celsius(p) }))),
		expected: { readings: journey.filter((_, i) => i !== 4), oddities: ['missing-value'] }
	},
	{
		name: 'readings that lack the key',
		file: text(journey.map((p, i) => (i === 4 ? { time: iso(p) } : { time: iso(p), temp_c: celsius(p) }))),
		expected: { readings: journey.filter((_, i) => i !== 4), oddities: ['missing-value'] }
	},
	{
		name: 'a key that only later readings have',
		file: text(
			journey.map((p, i) =>
				i < 20 ? { time: iso(p), temp_c: celsius(p) } : { time: iso(p), temp_c: celsius(p), note: 'door' }
			)
		),
		expected: {}
	},
	{
		name: 'NaN as some writers have it',
		file: text(journey.map((p, i) => ({ time: iso(p), temp_c: i === 4 ? 'x!' : celsius(p) }))).replace(
			'"x!"',
			'NaN'
		),
		expected: { readings: journey.filter((_, i) => i !== 4), oddities: ['missing-value'] }
	},
	{
		name: 'a value of true is no reading',
		file: text(journey.map((p, i) => ({ time: iso(p), temp_c: i === 4 ? true : celsius(p) }))),
		expected: { readings: journey.filter((_, i) => i !== 4), oddities: ['missing-value'] }
	},
	{
		name: 'a key named __proto__',
		file: `{"__proto__":{"unit":"F"},"constructor":1,"unit":"C","data":${text(rows)}}`,
		expected: { question: 'unit', then: [{ answers: { unit } }] }
	},
	{
		name: 'the same key twice: the last counts',
		file: `[${journey.map((p) => `{"time":"${iso(p)}","temp_c":99.5,"temp_c":${degrees(p)}}`).join(',')}]`,
		expected: { unit }
	},
	{
		name: 'two devices in one document',
		file: text({
			unit: 'C',
			devices: [
				{ serial: 'A11', readings: rows },
				{ serial: 'B22', readings: second.map((p) => ({ time: iso(p), temperature: celsius(p) })) }
			]
		}),
		expected: {
			question: 'part',
			then: [
				{ answers: { part: 'first' }, serial: 'A11' },
				{ answers: { part: 'second' }, readings: second, serial: 'B22' }
			]
		}
	},
	{
		name: 'two devices in one list',
		file: text(
			journey.flatMap((p) => [
				{ time: iso(p), device: 'A7', temp_c: celsius(p) },
				{ time: iso(p), device: 'B2', temp_c: celsius(p) + 12.3 }
			])
		).replace(/(\.\d)\d{5,}/g, '$1'),
		expected: { question: 'temperature-column', then: [{ answers: { temperatureColumn: '1' } }] }
	},
	{
		name: 'alarms listed beside the readings',
		file: text({
			unit: 'C',
			alarms: [
				{ time: iso(journey[3] as Point), limit: 8 },
				{ time: iso(journey[9] as Point), limit: 8 }
			],
			readings: rows
		}),
		expected: { unit }
	},
	{
		name: 'two probes in each reading',
		file: text(journey.map((p) => ({ time: iso(p), probe1_c: celsius(p), probe2_c: 20.5 }))),
		expected: { question: 'temperature-column', then: [{ answers: { temperatureColumn: '1' } }] }
	},
	{
		name: 'both units in each reading',
		file: text(
			journey.map((p) => ({ time: iso(p), temp_c: celsius(p), temp_f: (p.tenths * 18 + 3200) / 100 }))
		),
		expected: { unit, oddities: ['other-unit-column'] }
	},
	{
		name: 'date and time under two keys',
		file: text(
			journey.map((p) => ({ date: iso(p).slice(0, 10), time: iso(p).slice(11, 16), temp_c: celsius(p) }))
		),
		expected: {}
	},
	{
		name: 'an extended-JSON date',
		file: text(journey.map((p) => ({ ts: { $date: iso(p) }, temp_c: celsius(p) }))),
		expected: {}
	},
	{
		name: 'start and interval with bare values',
		file: text({
			start: '2026-03-14T18:00:00Z',
			intervalSeconds: 1800,
			unit: 'C',
			values: journey.map(celsius)
		}),
		expected: { unit }
	},
	{
		name: 'GeoJSON-like features',
		file: text({
			type: 'FeatureCollection',
			features: journey.map((p) => ({
				type: 'Feature',
				geometry: { type: 'Point', coordinates: [4.9, 52.3] },
				properties: { time: iso(p), temp_c: celsius(p) }
			}))
		}),
		expected: { unit }
	},
	{ name: 'an empty object', file: '{}', expected: { refused: 'no-readings' } },
	{ name: 'an empty list', file: '[]', expected: { refused: 'no-readings' } },
	{
		name: 'an error message as JSON',
		file: '{"error":"unauthorised","status":401,"time":"2026-03-14T18:00:00Z"}',
		expected: { refused: 'no-readings' }
	},
	{
		name: 'cut in the middle',
		file: text({ unit: 'C', data: rows }).slice(0, 300),
		expected: { refused: 'truncated', line: 1 }
	},
	{
		name: 'a comma too many',
		file: text(rows).replace('},{', '},,{'),
		expected: { refused: 'broken-json', line: 1 }
	},
	{
		name: 'a fault named with its line',
		file: JSON.stringify(rows, null, 1).replace('"temperature": 3', '"temperature" 3'),
		expected: { refused: 'broken-json', line: 12 }
	},
	{ name: 'nested deeper than anything real', file: deep(100_000), expected: { refused: 'too-deep' } },
	{ name: 'a string that never closes', file: '[{"time":"2026-03-14', expected: { refused: 'truncated' } }
];
