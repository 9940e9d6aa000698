import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import type { Answers, Ingestion, ReadContext, Understanding } from '../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../src/lib/domain/ingest/read-export';

/*
 * Truth: the journeys that tests/helpers/make-sample-uploads.mjs invents and writes out. It computes the expectations
 * from those journeys with its own arithmetic and never calls the reader.
 */
const folder = 'sample-uploads';

interface ExpectedOk {
	kind: 'ok';
	readings: number;
	firstAt: string;
	lastAt: string;
	minCelsius: number;
	maxCelsius: number;
	unit: string;
	oddities: string[];
	serial?: string;
	tripName?: string;
	zoneBy?: string;
	layout?: string;
	encoding?: string;
	counts?: Record<string, number>;
	lines?: Record<string, number[]>;
}
type Expected =
	| ExpectedOk
	| {
			kind: 'question';
			code: string;
			subject?: string;
			choices: string[];
			thenAnswer: Answers;
			then: ExpectedOk;
	  }
	| { kind: 'refused'; code: string; line?: number };
interface Sample {
	file: string;
	context: { uploadedAt: string; siteZone: string };
	expected: Expected;
}

const samples = readdirSync(join(folder, 'expected')).map(
	(name) => JSON.parse(readFileSync(join(folder, 'expected', name), 'utf8')) as Sample
);

function contextOf({ context }: Sample, answers: Answers = {}): ReadContext {
	const { uploadedAt, siteZone } = context;
	return { uploadedMs: Date.parse(uploadedAt), siteZone, journeyFromMs: null, journeyToMs: null, answers };
}

const bytesOf = ({ file }: Sample): Uint8Array => readFileSync(join(folder, file));

function understood(ingestion: Ingestion): Understanding {
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion));
	return ingestion.understanding;
}

function expectUnderstood(ingestion: Ingestion, expected: ExpectedOk): void {
	const understanding = understood(ingestion);
	const channel = understanding.channels[understanding.temperature];
	expect({
		readings: understanding.readings,
		firstAt: new Date(understanding.firstMs).toISOString(),
		lastAt: new Date(understanding.lastMs).toISOString(),
		minCelsius: channel?.minCelsius,
		maxCelsius: channel?.maxCelsius,
		unit: channel?.trace?.unit,
		oddities: understanding.oddities.map(({ code }) => code).sort()
	}).toEqual({
		readings: expected.readings,
		firstAt: expected.firstAt,
		lastAt: expected.lastAt,
		// Both sides divide once after whole numbers: the same digits, no tolerance.
		minCelsius: expected.minCelsius,
		maxCelsius: expected.maxCelsius,
		unit: expected.unit,
		oddities: expected.oddities
	});
	if (expected.serial !== undefined) expect(understanding.declared.serial).toBe(expected.serial);
	if (expected.tripName !== undefined) expect(understanding.declared.tripName).toBe(expected.tripName);
	if (expected.zoneBy !== undefined) expect(understanding.layout.zoneBy).toBe(expected.zoneBy);
	if (expected.layout !== undefined) expect(understanding.layout.kind).toBe(expected.layout);
	if (expected.encoding !== undefined) expect(understanding.layout.encoding).toBe(expected.encoding);
	for (const [code, count] of Object.entries(expected.counts ?? {})) {
		expect([code, understanding.oddities.find((oddity) => oddity.code === code)?.count]).toEqual([
			code,
			count
		]);
	}
	for (const [code, lines] of Object.entries(expected.lines ?? {})) {
		expect([code, understanding.oddities.find((oddity) => oddity.code === code)?.lines]).toEqual([
			code,
			lines
		]);
	}
}

describe('every sample export', () => {
	it('is covered by an expectation, and there are enough of them', () => {
		const files = readdirSync(folder).filter((name) => name !== 'README.md' && name !== 'expected');
		expect(samples.map(({ file }) => file).sort()).toEqual(files.sort());
		expect(files.length).toBeGreaterThanOrEqual(15);
	});

	it.each(samples)('$file is read as a careful person reads it', (sample) => {
		const ingestion = readExport(bytesOf(sample), contextOf(sample));
		const { expected } = sample;
		if (expected.kind === 'ok') return expectUnderstood(ingestion, expected);
		if (expected.kind === 'refused') {
			expect(ingestion).toMatchObject(expected);
			return;
		}
		expect(ingestion).toMatchObject({ kind: 'question', question: { code: expected.code } });
		if (ingestion.kind !== 'question') return;
		expect(ingestion.question.choices.map(({ label }) => label)).toEqual(expected.choices);
		if (expected.subject !== undefined) expect(ingestion.question.subject).toBe(expected.subject);
		expectUnderstood(readExport(bytesOf(sample), contextOf(sample, expected.thenAnswer)), expected.then);
	});

	it('gives each reading the line it stands on', () => {
		const sample = samples.find(({ file }) => file === 'asparagus-gap.csv');
		if (sample === undefined) throw new Error('sample missing');
		const [channel] = understood(readExport(bytesOf(sample), contextOf(sample))).channels;
		const lines = Buffer.from(bytesOf(sample)).toString('utf8').split('\n');
		channel?.trace?.times.forEach((ms, i) => {
			const line = lines[(channel.lines?.[i] ?? 0) - 1] ?? '';
			const tenths = channel.trace?.scaled[i] ?? 0;
			expect(line).toBe(`${new Date(ms).toISOString().replace('.000Z', 'Z')},${(tenths / 10).toFixed(1)}`);
		});
		expect(channel?.trace?.times.length).toBe(188);
	});
});
