import { describe, expect, it } from 'vitest';
import type { Ingestion, ReadContext } from '../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../src/lib/domain/ingest/read-export';

const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 3, 20, 12),
	siteZone: 'Europe/Amsterdam',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
const read = (text: string): Ingestion => readExport(new TextEncoder().encode(text), context);
const startSeconds = Date.UTC(2024, 0, 1) / 1000;
const at = (i: number): string => new Date((startSeconds + i * 60) * 1000).toISOString();
const times = (count: number, row: (i: number) => string, between = ''): string =>
	Array.from({ length: count }, (_, i) => row(i)).join(between);

/** Processor seconds of this process: what others do meanwhile does not count. */
function secondsOf(work: () => Ingestion): { seconds: number; ingestion: Ingestion } {
	const before = process.cpuUsage();
	const ingestion = work();
	const { user, system } = process.cpuUsage(before);
	return { seconds: (user + system) / 1e6, ingestion };
}

function summaryOf(ingestion: Ingestion): unknown {
	if (ingestion.kind === 'ok') return ingestion.understanding.readings;
	return ingestion.kind === 'refused' ? ingestion.code : ingestion.question.code;
}

describe('files built to be heavy', () => {
	it.each<[string, () => string, string]>([
		['rows of 16,000 figures', () => `${'5,'.repeat(16_000)}\n`.repeat(300), 'too-many-columns'],
		['rows of 30,000 empty cells', () => `${';'.repeat(30_000)}\n`.repeat(300), 'no-readings'],
		[
			'a time and 12,000 figures a row',
			() => times(150, (i) => `${at(i)}${',4.5'.repeat(12_000)}\n`),
			'too-many-columns'
		],
		['rows of 2,000 times', () => `${`${at(0)},`.repeat(2000)}\n`.repeat(150), 'no-readings'],
		[
			'SenML with a sensor for every record',
			() => `[${times(60_000, (i) => `{"n":"t${i}","u":"Cel","t":${startSeconds + i},"v":4}`, ',')}]`,
			'too-many-columns'
		],
		[
			'objects with a key for every row',
			() => `[${times(60_000, (i) => `{"time":"${at(i)}","k${i}":4.5}`, ',')}]`,
			'temperature-column'
		],
		['an object of 60,000 objects', () => `{${times(60_000, (i) => `"k${i}":{"a":4}`, ',')}}`, 'no-readings']
	])(
		'%s are answered within ten seconds of processor time',
		(_, text, answer) => {
			const written = text();
			const { seconds, ingestion } = secondsOf(() => read(written));
			expect(summaryOf(ingestion)).toBe(answer);
			expect(seconds).toBeLessThan(10);
		},
		60_000
	);

	it('a table of a column a minute is no more than can be read', () => {
		const heads = times(
			1440,
			(i) => `${String(Math.floor(i / 60)).padStart(2, '0')}:${String(i % 60).padStart(2, '0')}`,
			';'
		);
		const day = (i: number): string =>
			`2026-03-${String(i + 1).padStart(2, '0')};${times(1440, (k) => (4 + (k % 9) / 10).toFixed(1), ';')}`;
		const text = `Temperature °C\nDate;${heads}\n${times(20, day, '\n')}\n`;
		expect(summaryOf(read(text))).toBe(20 * 1440);
	});

	it('cost four times as much when they are four times as long, and not sixteen times', () => {
		const records = (count: number): string =>
			`[{"bn":"urn:dev:a:","bt":${startSeconds},"bu":"Cel","n":"t","v":4.5},${times(count, (i) => `{"n":"t","t":${60 * (i + 1)},"v":${4 + (i % 9) / 10}}`, ',')}]`;
		const [short, long] = [records(10_000), records(40_000)];
		read(short);
		const best = (text: string, readings: number): number =>
			Math.min(
				...[1, 2, 3].map(() => {
					const { seconds, ingestion } = secondsOf(() => read(text));
					expect(summaryOf(ingestion)).toBe(readings);
					return seconds;
				})
			);
		expect(best(long, 40_001) / best(short, 10_001)).toBeLessThan(10);
	}, 60_000);
});

describe('SenML as columns', () => {
	it('gives each record its own row where a sensor reports twice in a moment, and joins what came at one', () => {
		const text = JSON.stringify([
			{ bn: 'urn:dev:a:', bt: startSeconds, n: 'temp', u: 'Cel', v: 4.5 },
			{ n: 'humidity', u: '%RH', v: 80 },
			{ n: 'temp', u: 'Cel', t: 60, v: 4.6 },
			{ n: 'temp', u: 'Cel', t: 60, v: 4.6 },
			{ n: 'humidity', u: '%RH', t: 60, v: 81 },
			{ n: 'temp', u: 'Cel', t: 120, v: 4.7 }
		]);
		const ingestion = read(text);
		if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion));
		const { channels, oddities } = ingestion.understanding;
		expect(channels.map(({ quantity, readings, missing }) => [quantity, readings, missing])).toEqual([
			['temperature', 3, 0],
			['humidity', 2, 0]
		]);
		expect(oddities.map(({ code, count }) => [code, count])).toContainEqual(['duplicate-dropped', 1]);
	});
});
