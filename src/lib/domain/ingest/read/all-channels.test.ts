import { describe, expect, it } from 'vitest';
import type { Channel } from '../ingestion';
import { readExport } from '../read-export';
import { columnsAtOnce, nameOf } from './all-channels';
import { profileColumns } from '../layout/columns';
import { tableFromText } from '../delimited/table-from-text';

const at = (minute: number): string => `2026-04-13T10:${String(minute).padStart(2, '0')}:00Z`;

function channelsOf(head: string, ...rows: string[]): readonly Channel[] {
	const text = [head, ...rows.map((row, i) => `${at(i * 10)},${row}`), ''].join('\n');
	const ingestion = readExport(new TextEncoder().encode(text), {
		uploadedMs: Date.UTC(2026, 4, 1),
		siteZone: 'UTC',
		journeyFromMs: null,
		journeyToMs: null,
		answers: {}
	});
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion));
	return ingestion.understanding.channels;
}

describe('the channels of a file', () => {
	it('begin with the one that is assessed, then come in the order of their columns', () => {
		const channels = channelsOf('time,RH %,temp °C,light lx', '81,4.1,10', '82,4.2,11', '83,4.3,12');
		expect(channels.map(({ name, isPrimary }) => [name, isPrimary])).toEqual([
			['temp °C', true],
			['RH %', false],
			['light lx', false]
		]);
	});

	it.each([
		['RH (%)', 'humidity', '%'],
		['Light [lx]', 'light', 'lx'],
		['%RH', 'humidity', '%RH'],
		['Shock g', 'shock', 'g'],
		['Pressure hPa', 'other', 'hPa'],
		['Dew point °C', 'dew-point', '°C'],
		['Battery', 'other', null]
	])('keep %s as %s, in %s', (head, quantity, unit) => {
		const [, other] = channelsOf(`time,temp °C,${head}`, '4.1,61', '4.2,62', '4.3,64');
		expect(other).toMatchObject({ name: head, quantity });
		if (quantity !== 'dew-point') expect(other?.unit).toBe(unit);
	});

	it('have minimum, maximum and mean in °C where they are temperatures, none where they are not', () => {
		// 50, 59 and 68 °F are 10, 15 and 20 °C.
		const [, probe, humidity] = channelsOf(
			'time,temp mean °C,temp max °F,RH %',
			'4.0,50,81',
			'4.1,59,82',
			'4.2,68,83'
		);
		expect(probe).toMatchObject({ minCelsius: 10, maxCelsius: 20, meanCelsius: 15, unit: 'fahrenheit' });
		expect(humidity).toMatchObject({ minCelsius: null, maxCelsius: null, meanCelsius: null, trace: null });
	});

	it('count rows without a usable value, each for itself', () => {
		// −999 is no temperature, one cell is empty, one row ends early.
		const channels = channelsOf('time,temp °C,RH %', '4.1,81', '-999,82', '4.3,', '4.4', '4.5,85');
		expect(channels.map(({ name, readings, missing }) => [name, readings, missing])).toEqual([
			['temp °C', 4, 1],
			['RH %', 3, 2]
		]);
	});

	it('keep a figure of another quantity that would be impossible as a temperature', () => {
		const [, light] = channelsOf('time,temp °C,light lx', '4.1,0', '4.2,32000', '4.3,850');
		expect(light).toMatchObject({ readings: 3, missing: 0 });
	});

	it('have steps of their own where their values are missing', () => {
		const [, humidity] = channelsOf(
			'time,temp °C,RH %',
			'4.1,81',
			'4.2,82',
			'4.3,',
			'4.4,',
			'4.5,83',
			'4.6,84'
		);
		expect([...(humidity?.longSteps ?? [])]).toEqual([Date.parse(at(10)), Date.parse(at(40))]);
		expect(humidity?.usualIntervalMs).toBe(600_000);
	});
});

describe('columns', () => {
	it('are read together as far as the cells are not too many, at least one at a time', () => {
		expect([columnsAtOnce(1), columnsAtOnce(1_000_000), columnsAtOnce(5_000_000), columnsAtOnce(0)]).toEqual([
			4_000_000, 4, 1, 4_000_000
		]);
	});

	it('without a head are called by their place', () => {
		const table = tableFromText(`${at(0)},4.1\n${at(10)},4.2\n${at(20)},4.4\n`);
		if (!('rowCount' in table)) throw new Error('no table');
		expect(profileColumns(table).map(nameOf)).toEqual(['1', '2']);
	});
});
