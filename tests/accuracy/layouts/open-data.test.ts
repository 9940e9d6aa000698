import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Answers, Channel } from '../../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../../src/lib/domain/ingest/read-export';
import { beaverCelsius, beaverTimes } from '../beaver';
import { utf8 } from './journey';

function channelOf(bytes: Uint8Array, answers: Answers): Channel {
	const ingestion = readExport(bytes, {
		uploadedMs: Date.UTC(2026, 3, 20),
		siteZone: 'UTC',
		journeyFromMs: null,
		journeyToMs: null,
		answers
	});
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion).slice(0, 500));
	const channel = ingestion.understanding.channels[ingestion.understanding.temperature];
	if (channel === undefined) throw new Error('no channel');
	return channel;
}

describe('open data of a whole year', () => {
	// Source: npm vega-datasets 1.31.1, data/seattle-temps.csv: hourly normals in °F at -08:00; 8,759 rows, 37.5 to
	// 75.9 °F, mean 52.0304 °F; and vega-datasets 3.2.1, seattle-weather-hourly-normals.csv: the same in °C.
	const fahrenheit = readFileSync('node_modules/vega-datasets-v1/data/seattle-temps.csv');
	const celsius = readFileSync('node_modules/vega-datasets/data/seattle-weather-hourly-normals.csv');

	it('in °F and in °C is the same to what tenths of a degree allow', () => {
		const inF = channelOf(fahrenheit, { unit: 'fahrenheit' });
		const inC = channelOf(celsius, { unit: 'celsius', zone: '-08:00' });
		expect([inF.readings, inC.readings]).toEqual([8759, 8759]);
		expect([inF.firstMs, inF.lastMs]).toEqual([inC.firstMs, inC.lastMs]);
		// Means of the sources agree to 0.001 °C.
		expect(Math.abs((inF.meanCelsius ?? 0) - (inC.meanCelsius ?? 0))).toBeLessThan(0.002);
		expect(inF.meanCelsius).toBeCloseTo(((52.0304 - 32) * 5) / 9, 4);
		expect(inF.minCelsius).toBeCloseTo(((37.5 - 32) * 5) / 9, 9);
		expect(inF.maxCelsius).toBeCloseTo(((75.9 - 32) * 5) / 9, 9);
	});
});

describe('a real transmitter', () => {
	it('is read back to each hundredth', () => {
		const rows = beaverTimes.map((ms, i) => `${new Date(ms).toISOString()},${beaverCelsius[i]?.toFixed(2)}`);
		const channel = channelOf(utf8(['time,temp (°C)', ...rows, ''].join('\n')), {});
		expect(channel.readings).toBe(114);
		expect([...(channel.trace?.scaled ?? [])].map((hundredths) => hundredths / 100)).toEqual(beaverCelsius);
		expect([...(channel.trace?.times ?? [])]).toEqual(beaverTimes);
		expect(channel.longSteps.length).toBe(2);
	});
});
