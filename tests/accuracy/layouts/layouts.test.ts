import { describe, expect, it } from 'vitest';
import type { Ingestion, ReadContext } from '../../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../../src/lib/domain/ingest/read-export';
import { celsiusOf } from '../../../src/lib/domain/trace/trace';
import { encodings } from './encodings';
import { headers } from './headers';
import { journey, utf8, type Case, type Read } from './journey';
import { json } from './json';
import { refusals } from './refusals';
import { shapes } from './shapes';
import { standards } from './standards';
import { values } from './values';

const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 2, 20),
	siteZone: 'UTC',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};

function read(file: Case['file'], answers: Record<string, unknown> = {}): Ingestion {
	return readExport(typeof file === 'string' ? utf8(file) : file, { ...context, answers });
}

function expectRead(ingestion: Ingestion, expected: Read): void {
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion));
	const { channels, temperature, oddities, layout, declared } = ingestion.understanding;
	const { trace } = channels[temperature] ?? {};
	if (trace === null || trace === undefined) throw new Error('no trace');
	const celsius = celsiusOf(trace);
	const seen = Array.from(trace.times, (ms, i) => [
		new Date(ms).toISOString(),
		Math.round((celsius[i] ?? NaN) * 1e6) / 1e6
	]);
	expect(seen).toEqual(
		(expected.readings ?? journey).map(({ ms, tenths }) => [new Date(ms).toISOString(), tenths / 10])
	);
	const codes = oddities.map(({ code }) => code).filter((code) => code !== 'zone-assumed');
	expect([...new Set(codes)].sort()).toEqual([...(expected.oddities ?? [])].sort());
	for (const [code, count] of Object.entries(expected.counts ?? {}))
		expect([code, oddities.find((oddity) => oddity.code === code)?.count]).toEqual([code, count]);
	if (expected.channels !== undefined)
		expect(channels.map(({ name, quantity }) => [name, quantity])).toEqual(expected.channels);
	if (expected.serial !== undefined) expect(declared.serial).toBe(expected.serial);
	if (expected.unit !== undefined) expect(trace.unit).toBe(expected.unit);
	if (expected.encoding !== undefined) expect(layout.encoding).toBe(expected.encoding);
	if (expected.delimiter !== undefined) expect(layout.delimiter).toBe(expected.delimiter);
}

function check({ file, expected }: Case): void {
	const ingestion = read(file);
	if ('refused' in expected) {
		const codes = typeof expected.refused === 'string' ? [expected.refused] : expected.refused;
		expect(ingestion.kind === 'refused' ? ingestion.code : JSON.stringify(ingestion)).toBeOneOf([...codes]);
		if (expected.line !== undefined) expect(ingestion).toMatchObject({ line: expected.line });
		if (expected.found !== undefined) expect(ingestion).toMatchObject({ found: expected.found });
		return;
	}
	if (!('question' in expected)) return expectRead(ingestion, expected);
	if (ingestion.kind !== 'question') throw new Error(JSON.stringify(ingestion).slice(0, 600));
	expect(ingestion.question.code).toBe(expected.question);
	if (expected.choices !== undefined)
		expect(ingestion.question.choices.map(({ label }) => label)).toEqual(expected.choices);
	for (const { answers, ...then } of expected.then) expectRead(read(file, answers), then);
}

describe.each([
	['encodings', encodings],
	['heads and preambles', headers],
	['shapes of tables', shapes],
	['cells and units', values],
	['JSON', json],
	['open standards', standards],
	['what is not readable', refusals]
] as const)('odd files: %s', (_, cases) => {
	it.each(cases)('$name', check);
});

describe('the odd files', () => {
	it('are many, and each has a name of its own', () => {
		const all = [encodings, headers, shapes, values, json, standards, refusals].flat();
		expect(new Set(all.map(({ name }) => name)).size).toBe(all.length);
		expect(all.length).toBeGreaterThanOrEqual(120);
	});
});
