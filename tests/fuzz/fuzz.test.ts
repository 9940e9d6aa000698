import { describe, expect, it } from 'vitest';
import type { Understanding } from '../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../src/lib/domain/ingest/read-export';
import { mutated } from './mutate';
import { runFuzz, sampleFiles } from './run-fuzz';
import { lacking } from './stands-in-file';

describe('5,000 damaged files', () => {
	it('never throw, never hang, and never give readings that are not in them', () => {
		const counts = runFuzz(1_000_000, 5000);
		expect(counts.faults).toEqual([]);
		expect(counts.ok + counts.question + counts.refused).toBe(5000);
		// The run is worth something only where each of the ends is met.
		expect(Math.min(counts.ok, counts.question, counts.refused, counts.warned)).toBeGreaterThan(200);
	}, 120_000);

	it('are the same every time', () => {
		const samples = sampleFiles();
		expect(mutated(samples, 7)).toEqual(mutated(samples, 7));
		expect(mutated(samples, 7)).not.toEqual(mutated(samples, 8));
	});
});

describe('the criterion', () => {
	const text =
		'time,temperature °C\n2026-04-01T08:00:00Z,4.5\n2026-04-01T08:10:00Z,4.6\n2026-04-01T08:20:00Z,-4.7\n';
	const bytes = Buffer.from(text);
	const understood = (): Understanding => {
		const ingestion = readExport(bytes, {
			uploadedMs: Date.UTC(2026, 3, 20),
			siteZone: 'UTC',
			journeyFromMs: null,
			journeyToMs: null,
			answers: {}
		});
		if (ingestion.kind !== 'ok') throw new Error(ingestion.kind);
		return ingestion.understanding;
	};

	it('finds every reading of a whole file', () => {
		expect(lacking(bytes, understood())).toBeNull();
	});

	it.each([
		['a value', { from: '4.6', to: '4.8' }, /no 4.6/],
		['a minute', { from: '08:10', to: '08:11' }, /no 2026-04-01T08:10/],
		// Offsets reach a day either way, so that only a day further off is missed for certain.
		['a day', { from: '04-01T08:20', to: '04-05T08:20' }, /no 2026-04-01T08:20/],
		['a year', { from: '2026-04-01T08:00', to: '2025-04-01T08:00' }, /no 2026/],
		['a line', { from: 'time,', to: 'time,\n' }, /line 2/]
	])('misses %s that the file does not hold', (_, { from, to }, lack) => {
		expect(lacking(Buffer.from(text.replace(from, to)), understood())).toMatch(lack);
	});
});
