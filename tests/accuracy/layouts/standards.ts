import type { Case, Point } from './journey';

const text = (value: unknown): string => JSON.stringify(value);
const at = (when: string, tenths: number): Point => ({ ms: Date.parse(when), tenths });

/*
 * SenML: RFC 8428 §5.1 (examples of the section named beside each). "Now" of the examples with relative times is the
 * moment of receipt, which the dock confirms.
 */
const senml: readonly Case[] = [
	{
		name: 'RFC 8428 5.1.1, one record without a time',
		file: text([{ n: 'urn:dev:ow:10e2073a01080063', u: 'Cel', v: 23.1 }]),
		expected: { refused: ['one-reading', 'no-time'] }
	},
	{
		name: 'RFC 8428 5.1.3, base time, base name, and two devices with temperature and humidity',
		file: text([
			{ bn: 'urn:dev:ow:10e2073a01080063', bt: 1.320067464e9, bu: '%RH', v: 20 },
			{ u: 'lon', v: 24.30621 },
			{ u: 'lat', v: 60.07965 },
			{ t: 60, v: 20.3 },
			{ u: 'lon', t: 60, v: 24.30622 },
			{ u: 'lat', t: 60, v: 60.07965 },
			{ t: 120, v: 20.7 }
		]),
		expected: { refused: 'no-temperature' }
	},
	{
		name: 'RFC 8428 5.1.2, seconds before now',
		file: text([
			{
				bn: 'urn:dev:ow:10e2073a01080063:',
				bt: 1.276020076001e9,
				bu: 'Cel',
				bver: 5,
				n: 'temperature',
				v: 20.1
			},
			...[-5, -4, -3, -2, -1].map((t, i) => ({ n: 'temperature', t, v: 21.2 + i / 10 }))
		]),
		expected: {
			readings: [
				at('2010-06-08T18:01:11.001Z', 212),
				at('2010-06-08T18:01:12.001Z', 213),
				at('2010-06-08T18:01:13.001Z', 214),
				at('2010-06-08T18:01:14.001Z', 215),
				at('2010-06-08T18:01:15.001Z', 216),
				at('2010-06-08T18:01:16.001Z', 201)
			],
			oddities: ['resorted']
		}
	},
	{
		name: 'resolved records of 1276020076 and 1276020091 seconds',
		file: text([
			{ n: 'urn:dev:ow:10e2073a01080063', u: 'Cel', t: 1.276020076e9, v: 23.5 },
			{ n: 'urn:dev:ow:10e2073a01080063', u: 'Cel', t: 1.276020091e9, v: 23.6 }
		]),
		expected: {
			readings: [at('2010-06-08T18:01:16Z', 235), at('2010-06-08T18:01:31Z', 236)],
			unit: 'celsius'
		}
	},
	{
		name: 'times relative to now, confirmed as the upload',
		file: text([
			{ bn: 'dev:a', bu: 'Cel', t: -120, v: 4.1 },
			{ t: -60, v: 4.2 },
			{ t: 0, v: 4.3 }
		]),
		expected: {
			question: 'start',
			then: [
				{
					answers: { startMs: Date.UTC(2026, 2, 20) },
					readings: [
						at('2026-03-19T23:58:00Z', 41),
						at('2026-03-19T23:59:00Z', 42),
						at('2026-03-20T00:00:00Z', 43)
					]
				}
			]
		}
	},
	{
		name: 'base value added to each value, base unit, base time added to each time',
		file: text([
			{ bn: 'dev:a', bt: 1773511200, bu: 'Cel', bv: 4, t: 0, v: 0.1 },
			{ t: 60, v: 0.2 },
			{ t: 120, v: -0.3 }
		]),
		expected: {
			readings: [
				at('2026-03-14T18:00:00Z', 41),
				at('2026-03-14T18:01:00Z', 42),
				at('2026-03-14T18:02:00Z', 37)
			]
		}
	},
	{
		name: 'temperature and humidity of one device, by name',
		file: text([
			{ bn: 'dev:7:', bt: 1773511200, n: 'temp', u: 'Cel', v: 4.1 },
			{ n: 'hum', u: '%RH', v: 60 },
			{ n: 'temp', u: 'Cel', t: 60, v: 4.2 },
			{ n: 'hum', u: '%RH', t: 60, v: 61 }
		]),
		expected: { readings: [at('2026-03-14T18:00:00Z', 41), at('2026-03-14T18:01:00Z', 42)] }
	},
	{
		name: 'two sensors of temperature are asked about',
		file: text([
			{ bn: 'dev:7:', bt: 1773511200, bu: 'Cel', n: 'front', v: 4.1 },
			{ n: 'rear', v: 6.1 },
			{ n: 'front', t: 60, v: 4.2 },
			{ n: 'rear', t: 60, v: 6.2 }
		]),
		expected: {
			question: 'temperature-column',
			then: [
				{
					answers: { temperatureColumn: '2' },
					readings: [at('2026-03-14T18:00:00Z', 61), at('2026-03-14T18:01:00Z', 62)]
				}
			]
		}
	},
	{
		name: 'SenML in kelvin',
		file: text([
			{ bn: 'd', bt: 1773511200, bu: 'K', v: 277.25 },
			{ t: 60, v: 277.35 }
		]),
		expected: { readings: [at('2026-03-14T18:00:00Z', 41), at('2026-03-14T18:01:00Z', 42)], unit: 'kelvin' }
	},
	{
		name: 'strings, booleans and data are no readings',
		file: text([
			{ bn: 'd:', bt: 1773511200, n: 'temp', u: 'Cel', v: 4.1 },
			{ n: 'label', vs: 'Machine Room' },
			{ n: 'open', vb: false },
			{ n: 'nfc-reader', vd: 'aGkgCg' },
			{ n: 'temp', u: 'Cel', t: 60, v: 4.2 }
		]),
		expected: { readings: [at('2026-03-14T18:00:00Z', 41), at('2026-03-14T18:01:00Z', 42)] }
	},
	{
		name: 'sums are no values',
		file: text([
			{ bn: 'd', bt: 1773511200, bu: 'Cel', v: 4.1, s: 100 },
			{ t: 60, v: 4.2, s: 342 }
		]),
		expected: { readings: [at('2026-03-14T18:00:00Z', 41), at('2026-03-14T18:01:00Z', 42)] }
	},
	{
		name: 'milliseconds where the standard has seconds',
		file: text([
			{ n: 'd', u: 'Cel', t: 1773511200000, v: 4.1 },
			{ n: 'd', u: 'Cel', t: 1773511260000, v: 4.2 }
		]),
		expected: { refused: ['implausible-dates', 'no-time'] }
	},
	{
		name: 'a label that must be understood and is not (RFC 8428 §4.4)',
		file: text([
			{ bn: 'd', bt: 1773511200, bu: 'Cel', v: 4.1, scale_: 2 },
			{ t: 60, v: 4.2 }
		]),
		expected: { refused: ['no-readings', 'broken-json', 'no-temperature'] }
	},
	{
		name: 'further labels that need not be understood',
		file: text([
			{ bn: 'd', bt: 1773511200, bu: 'Cel', v: 4.1, room: 'A' },
			{ t: 60, v: 4.2 }
		]),
		expected: { readings: [at('2026-03-14T18:00:00Z', 41), at('2026-03-14T18:01:00Z', 42)] }
	}
];

const device = 'urn:epc:id:giai:4000001.111';
type Report = Record<string, unknown>;
const temperature = (value: number | null, more: Report = {}): Report => ({
	type: 'Temperature',
	...(value === null ? {} : { value }),
	uom: 'CEL',
	...more
});
function event(elements: readonly unknown[], more: Report = {}): Report {
	return {
		type: 'ObjectEvent',
		action: 'OBSERVE',
		eventTime: '2019-04-02T15:00:00.000+01:00',
		eventTimeZoneOffset: '+01:00',
		sensorElementList: elements,
		...more
	};
}
const document = (...events: readonly unknown[]): string =>
	text({
		'@context': ['https://ref.gs1.org/standards/epcis/2.0.0/epcis-context.jsonld'],
		type: 'EPCISDocument',
		schemaVersion: '2.0',
		epcisBody: { eventList: events }
	});
const times = ['14:05', '14:35', '14:55'];
const three: readonly Point[] = [
	at('2019-04-02T13:05:00Z', 260),
	at('2019-04-02T13:35:00Z', 261),
	at('2019-04-02T13:55:00Z', 262)
];
const element = (time: string, reports: readonly Report[]): Report => ({
	sensorMetadata: { time: `2019-04-02T${time}:00.000+01:00`, deviceID: device },
	sensorReport: reports
});

/* GS1 EPCIS 2.0, repository gs1/EPCIS, folder JSON/WithSensorData: shapes and figures of the examples named. */
const epcis: readonly Case[] = [
	{
		name: 'EPCIS example 1, three elements with four quantities',
		file: document(
			event(
				times.map((time, i) =>
					element(time, [
						temperature([26.0, 26.1, 26.2][i] ?? 0),
						{ type: 'AbsoluteHumidity', value: 12.1, uom: 'A93' },
						{ type: 'Speed', value: 160, uom: 'KMH' },
						{ type: 'Illuminance', value: 800, uom: 'LUX' }
					])
				)
			)
		),
		expected: { readings: three, unit: 'celsius', serial: device }
	},
	{
		name: 'EPCIS example 5, six reports with a time of their own',
		file: document(
			event([
				{
					sensorMetadata: { deviceID: device },
					sensorReport: [0, 1, 2, 3, 4, 5].map((i) =>
						temperature(26 + i / 10, { time: `2019-04-02T14:${i}5:00.000+01:00` })
					)
				}
			])
		),
		expected: { readings: [0, 1, 2, 3, 4, 5].map((i) => at(`2019-04-02T13:${i}5:00Z`, 260 + i)) }
	},
	{
		name: 'EPCIS example 9, an error without a value is missing and never 0',
		file: document(
			event([
				...times.map((time, i) => element(time, [temperature([26.0, 26.1, 26.2][i] ?? 0)])),
				element('14:57', [temperature(null, { exception: 'ERROR_CONDITION' })])
			])
		),
		expected: { readings: three, oddities: ['missing-value'], counts: { 'missing-value': 1 } }
	},
	{
		name: 'EPCIS, an alarm beside a value keeps the value',
		file: document(
			event(
				times.map((time, i) =>
					element(time, [
						temperature([26.0, 26.1, 26.2][i] ?? 0, i === 1 ? { exception: 'ALARM_CONDITION' } : {})
					])
				)
			)
		),
		expected: { readings: three }
	},
	{
		name: 'EPCIS example 13, ambience and package are two channels',
		file: document(
			event(
				['14:05', '14:35'].map((time, i) =>
					element(time, [
						temperature(20.9 + i / 10, { component: 'gs1:Ambience' }),
						temperature(20.7 + i / 10, { component: 'gs1:OuterPackage' })
					])
				)
			)
		),
		expected: {
			question: 'temperature-column',
			then: [
				{
					answers: { temperatureColumn: '2' },
					readings: [at('2019-04-02T13:05:00Z', 207), at('2019-04-02T13:35:00Z', 208)]
				}
			]
		}
	},
	{
		name: 'EPCIS, two reports of one type that nothing tells apart are two channels',
		file: document(
			event(
				['14:05', '14:35'].map((time, i) =>
					element(time, [temperature(20.9 + i / 10), temperature(20.7 + i / 10)])
				)
			)
		),
		expected: {
			question: 'temperature-column',
			then: [
				{
					answers: { temperatureColumn: '1' },
					readings: [at('2019-04-02T13:05:00Z', 209), at('2019-04-02T13:35:00Z', 210)]
				}
			]
		}
	},
	{
		name: 'EPCIS example 2, minimum, maximum and mean of an interval',
		file: document(
			event(
				['14', '15'].map((hour, i) => ({
					sensorMetadata: {
						startTime: `2019-04-02T${hour}:00:01.000+01:00`,
						endTime: `2019-04-02T${hour}:59:00.000+01:00`,
						deviceID: device
					},
					sensorReport: [
						{
							type: 'Temperature',
							minValue: 26.0,
							maxValue: 26.2 + i,
							meanValue: 26.1 + i / 10,
							sDev: 0.1,
							uom: 'CEL'
						}
					]
				}))
			)
		),
		expected: { readings: [at('2019-04-02T13:59:00Z', 261), at('2019-04-02T14:59:00Z', 262)] }
	},
	{
		name: 'EPCIS, the same inline field in metadata and report is refused (TCR-53)',
		file: document(
			event(
				times.map((time) => element(time, [temperature(26, { time: `2019-04-02T${time}:00.000+01:00` })]))
			)
		),
		expected: { refused: ['no-readings', 'two-recordings', 'broken-json'] }
	},
	{
		name: 'EPCIS in °F',
		file: document(
			event(
				times.map((time, i) => element(time, [temperature([78.8, 78.98, 79.16][i] ?? 0, { uom: 'FAH' })]))
			)
		),
		expected: { readings: three, unit: 'fahrenheit' }
	},
	{
		name: 'EPCIS in kelvin',
		file: document(
			event(
				times.map((time, i) => element(time, [temperature([299.15, 299.25, 299.35][i] ?? 0, { uom: 'KEL' })]))
			)
		),
		expected: { readings: three, unit: 'kelvin' }
	},
	...[
		'gs1:Temperature',
		'gs1:MT-Temperature',
		'https://gs1.org/voc/Temperature',
		'https://ref.gs1.org/voc/Temperature'
	].map((type) => ({
		name: `EPCIS with the type written ${type}`,
		file: document(
			event(times.map((time, i) => element(time, [temperature([26.0, 26.1, 26.2][i] ?? 0, { type })])))
		),
		expected: { readings: three }
	})),
	{
		name: 'EPCIS events without a time of their own stand at the time of the event',
		file: document(
			...times.map((time, i) =>
				event([{ sensorReport: [temperature([26.0, 26.1, 26.2][i] ?? 0)] }], {
					eventTime: `2019-04-02T${time}:00.000+01:00`
				})
			)
		),
		expected: { readings: three }
	},
	{
		name: 'EPCIS, one event alone',
		file: text(event(times.map((time, i) => element(time, [temperature([26.0, 26.1, 26.2][i] ?? 0)])))),
		expected: { readings: three }
	},
	{
		name: 'EPCIS without any temperature',
		file: document(
			event(times.map((time) => element(time, [{ type: 'Illuminance', value: 800, uom: 'LUX' }])))
		),
		expected: { refused: 'no-temperature' }
	}
];

export const standards: readonly Case[] = [...senml, ...epcis];
