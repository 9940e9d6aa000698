import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Ingestion, ReadContext } from '../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../src/lib/domain/ingest/read-export';

const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 3, 20),
	siteZone: 'UTC',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
// Source: npm vega-datasets 3.2.1, seattle-weather-hourly-normals.csv (NOAA hourly normals, °C): date, pressure,
// temperature, wind; 8,759 rows. Figures taken with awk over the file: min 3.1, max 24.4, mean 11.12762.
const hourly = readFileSync('node_modules/vega-datasets/data/seattle-weather-hourly-normals.csv');

function understood(ingestion: Ingestion) {
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion));
	const { understanding } = ingestion;
	const channel = understanding.channels[understanding.temperature];
	if (channel === undefined || channel.trace === null) throw new Error('no trace');
	return { understanding, channel, trace: channel.trace };
}

describe('a public year of hourly temperatures', () => {
	it('names no unit, so the unit is asked', () => {
		expect(readExport(hourly, context)).toMatchObject({ kind: 'question', question: { code: 'unit' } });
	});

	it('is read whole once that is answered', () => {
		const { understanding, channel } = understood(
			readExport(hourly, { ...context, answers: { unit: 'celsius' } })
		);
		expect(understanding.readings).toBe(8759);
		expect(new Date(understanding.firstMs).toISOString()).toBe('2010-01-01T01:00:00.000Z');
		expect(new Date(understanding.lastMs).toISOString()).toBe('2010-12-31T23:00:00.000Z');
		expect(understanding.usualIntervalMs).toBe(3_600_000);
		expect([channel.minCelsius, channel.maxCelsius]).toEqual([3.1, 24.4]);
		// Stated to five decimals above.
		expect(channel.meanCelsius).toBeCloseTo(11.12762, 5);
		expect(channel.name).toBe('temperature');
	});

	it('holds the hour that spring leaves out in Los Angeles, so its clock was kept all year', () => {
		const answers = { unit: 'celsius', zone: 'America/Los_Angeles' } as const;
		const { understanding } = understood(readExport(hourly, { ...context, answers }));
		expect(understanding.oddities).toMatchObject([{ code: 'clock-change', detail: 'kept' }]);
		// Pacific standard time, UTC−8, from the first to the last reading.
		expect(new Date(understanding.lastMs).toISOString()).toBe('2011-01-01T07:00:00.000Z');
		expect(understanding.readings).toBe(8759);
	});

	it('drops no reading: every row of the file stands in the trace with its line', () => {
		const { channel, trace } = understood(readExport(hourly, { ...context, answers: { unit: 'celsius' } }));
		const lines = hourly.toString('utf8').split('\n');
		trace.scaled.forEach((tenths, i) => {
			const cells = (lines[(channel.lines?.[i] ?? 0) - 1] ?? '').split(',');
			expect(tenths / 10 ** trace.decimals).toBe(Number(cells[2]));
		});
	});
});
