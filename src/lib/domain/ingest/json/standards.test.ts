import { describe, expect, it } from 'vitest';
import type { Ingestion, ReadContext } from '../ingestion';
import { readExport } from '../read-export';

const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 3, 20),
	siteZone: 'Europe/Berlin',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
const read = (json: unknown, answers: ReadContext['answers'] = {}): Ingestion =>
	readExport(new TextEncoder().encode(JSON.stringify(json)), { ...context, answers });

function shown(ingestion: Ingestion): unknown {
	if (ingestion.kind !== 'ok') return ingestion.kind === 'refused' ? ingestion.code : ingestion.question.code;
	const { channels, firstMs, lastMs, temperature, layout } = ingestion.understanding;
	const trace = channels[temperature]?.trace;
	return {
		kind: layout.kind,
		first: new Date(firstMs).toISOString(),
		last: new Date(lastMs).toISOString(),
		values: [...(trace?.scaled ?? [])].map((n) => n / 10 ** (trace?.decimals ?? 0))
	};
}

describe('SenML', () => {
	const device = 'urn:dev:ow:10e2073a01080063';
	const expected = {
		kind: 'senml',
		first: '2010-06-08T18:01:16.000Z',
		last: '2010-06-08T18:01:31.000Z',
		values: [23.5, 23.6]
	};

	it('of two records with times is read (RFC 8428 §5.1.3 and §5.1.4 form)', () => {
		expect(
			shown(
				read([
					{ n: device, u: 'Cel', t: 1276020076, v: 23.5 },
					{ n: device, u: 'Cel', t: 1276020091, v: 23.6 }
				])
			)
		).toEqual(expected);
		expect(
			shown(
				read([
					{ bn: device, bu: 'Cel', bt: 1276020076, v: 23.5 },
					{ t: 15, v: 23.6 }
				])
			)
		).toEqual(expected);
	});

	it('of several devices asks which one (RFC 8428 §5.1.5 form)', () => {
		const records = [
			{ bn: '2001:db8::2/', bt: 1320078429, n: 'temperature', u: 'Cel', v: 25.2 },
			{ n: 'humidity', u: '%RH', v: 30 },
			{ bn: '2001:db8::1/', n: 'temperature', u: 'Cel', v: 12.3 },
			{ n: 'humidity', u: '%RH', v: 67 }
		];
		expect(shown(read(records))).toBe('temperature-column');
	});

	it('takes times below 2^28 as relative, and asks from when (RFC 8428 §4.5.3)', () => {
		const records = [
			{ bn: device, bu: 'Cel', t: -600, v: 5.1 },
			{ t: 0, v: 5.2 }
		];
		expect(shown(read(records))).toBe('start');
		expect(shown(read(records, { startMs: Date.UTC(2026, 3, 20) }))).toEqual({
			kind: 'senml',
			first: '2026-04-19T23:50:00.000Z',
			last: '2026-04-20T00:00:00.000Z',
			values: [5.1, 5.2]
		});
	});

	it('refuses milliseconds, which the standard does not know', () => {
		expect(
			shown(
				read([
					{ n: device, u: 'Cel', t: 1276020076000, v: 23.5 },
					{ n: device, u: 'Cel', t: 1276020091000, v: 23.6 }
				])
			)
		).toBe('implausible-dates');
	});

	it('adds a base value', () => {
		expect(
			shown(
				read([
					{ bn: device, bu: 'Cel', bt: 1276020076, bv: 20, v: 3.5 },
					{ t: 15, v: 3.6 }
				])
			)
		).toEqual(expected);
	});
});

// Form and figures: GS1 EPCIS repository, JSON/WithSensorData, examples 1, 9 and 13.
describe('EPCIS sensor elements', () => {
	const document = (sensorElementList: unknown[]): unknown => ({
		type: 'EPCISDocument',
		epcisBody: {
			eventList: [{ type: 'ObjectEvent', eventTime: '2019-04-02T15:00:00.000+01:00', sensorElementList }]
		}
	});
	const element = (time: string, ...sensorReport: unknown[]): unknown => ({
		sensorMetadata: { time, deviceID: 'urn:epc:id:giai:4000001.111' },
		sensorReport
	});
	const celsius = (value: number, more = {}): unknown => ({
		type: 'Temperature',
		value,
		uom: 'CEL',
		...more
	});

	it('give the temperature only, at its own times', () => {
		const others = [
			{ type: 'AbsoluteHumidity', value: 12.1, uom: 'A93' },
			{ type: 'Speed', value: 160, uom: 'KMH' },
			{ type: 'Illuminance', value: 800, uom: 'LUX' }
		];
		const elements = [
			['05', 26],
			['35', 26.1],
			['55', 26.2]
		].map(([minute, value]) =>
			element(`2019-04-02T14:${minute}:00.000+01:00`, celsius(Number(value)), ...others)
		);
		expect(shown(read(document(elements)))).toEqual({
			kind: 'epcis',
			first: '2019-04-02T13:05:00.000Z',
			last: '2019-04-02T13:55:00.000Z',
			values: [26, 26.1, 26.2]
		});
	});

	it('with an error and no value are no reading, never zero', () => {
		const elements = ['05', '15', '25'].map((minute, i) =>
			element(
				`2019-04-02T14:${minute}:00+01:00`,
				i === 1 ? { type: 'Temperature', exception: 'ERROR_CONDITION' } : celsius(26)
			)
		);
		const ingestion = read(document(elements));
		expect(shown(ingestion)).toMatchObject({ values: [26, 26] });
		expect(ingestion).toMatchObject({ understanding: { oddities: [{ code: 'missing-value', count: 1 }] } });
	});

	it('of two components are two channels, and asked about', () => {
		const elements = ['05', '15'].map((minute) =>
			element(
				`2019-04-02T14:${minute}:00+01:00`,
				celsius(20.9, { component: 'ambience' }),
				celsius(20.7, { component: 'outer_package' })
			)
		);
		expect(shown(read(document(elements)))).toBe('temperature-column');
	});
});
