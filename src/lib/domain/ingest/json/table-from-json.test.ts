import { describe, expect, it } from 'vitest';
import type { Ingestion, ReadContext } from '../ingestion';
import { readExport } from '../read-export';

const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 3, 20),
	siteZone: 'UTC',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
const read = (text: string): Ingestion => readExport(new TextEncoder().encode(text), context);
const start = 1772359200;

function values(text: string): unknown {
	const ingestion = read(text);
	if (ingestion.kind !== 'ok') return ingestion.kind === 'refused' ? ingestion.code : ingestion.question.code;
	const { channels, temperature, firstMs } = ingestion.understanding;
	const trace = channels[temperature]?.trace;
	expect(firstMs).toBe(start * 1000);
	return [...(trace?.scaled ?? [])].map((n) => n / 10 ** (trace?.decimals ?? 0));
}
const iso = (i: number): string => new Date((start + i * 600) * 1000).toISOString();

describe('JSON', () => {
	it.each<[string, unknown]>([
		['a list of objects', [0, 1, 2].map((i) => ({ time: iso(i), celsius: 4 + i }))],
		[
			'readings deep inside metadata',
			{ a: { b: { unit: 'Cel', log: [0, 1, 2].map((i) => ({ at: iso(i), temp: 4 + i })) } } }
		],
		[
			'values inside objects',
			[0, 1, 2].map((i) => ({ time: iso(i), temperature: { value: 4 + i, unit: 'C' } }))
		],
		['columns', { unit: '°C', time: [0, 1, 2].map(iso), temperature: [4, 5, 6] }],
		['pairs', { unit: 'Cel', data: [0, 1, 2].map((i) => [(start + i * 600) * 1000, 4 + i]) }],
		['moments as keys', { unit: 'C', readings: Object.fromEntries([0, 1, 2].map((i) => [iso(i), 4 + i])) }],
		['numbers as strings', [0, 1, 2].map((i) => ({ time: String(start + i * 600), celsius: `${4 + i}.0` }))],
		[
			'a start, an interval and bare values',
			{ start: iso(0), interval: '10 min', unit: 'C', values: [4, 5, 6] }
		]
	])('is read as %s', (_name, json) => {
		expect(values(JSON.stringify(json))).toEqual([4, 5, 6]);
		expect(values(JSON.stringify(json, null, 2))).toEqual([4, 5, 6]);
	});

	it('is read line by line', () => {
		const lines = [0, 1, 2].map((i) => JSON.stringify({ time: iso(i), celsius: 4 + i }));
		expect(values(lines.join('\n'))).toEqual([4, 5, 6]);
		expect(values(`${lines.join('\n')}\n{"time":"2026-0`)).toEqual([4, 5, 6]);
	});

	it('takes null as no value', () => {
		expect(values(JSON.stringify([4, null, 6].map((celsius, i) => ({ time: iso(i), celsius }))))).toEqual([
			4, 6
		]);
	});

	it('with a list of nulls first is still read', () => {
		expect(values(JSON.stringify([4, 5, null].map((celsius, i) => ({ time: iso(i), celsius }))))).toEqual([
			4, 5
		]);
	});

	it('cannot reach a prototype through its keys', () => {
		const text = `[{"time":"${iso(0)}","__proto__":{"celsius":4}},{"time":"${iso(1)}","__proto__":{"celsius":5},"constructor":{"prototype":1}}]`;
		expect(values(text)).toEqual([4, 5]);
		expect(({} as Record<string, unknown>).celsius).toBeUndefined();
	});

	it('with several recordings asks which, and mixes none', () => {
		const readings = [0, 1, 2].map((i) => ({ t: start + i * 600, celsius: 4 + i }));
		expect(
			values(
				JSON.stringify([
					{ id: 1, readings },
					{ id: 2, readings }
				])
			)
		).toBe('part');
	});

	it.each([
		['[{"time":', 'truncated'],
		['{"a":1,}', 'broken-json'],
		['{"a" 1}', 'broken-json'],
		['[]', 'no-readings'],
		['{"error":"not found"}', 'no-readings'],
		['[1,2,3,"\u0001"]', 'broken-json']
	])('%j is refused as %s', (text, code) => {
		expect(read(text)).toMatchObject({ kind: 'refused', code });
	});
});
