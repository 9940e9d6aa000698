import { describe, expect, it } from 'vitest';
import type { Understanding } from '../ingestion';
import { readExport } from '../read-export';

function understood(head: string, rows: readonly (readonly [string, string])[]): Understanding {
	const lines = rows.map(([one, other], i) => `2026-04-13T10:${String(10 + i)}:00Z,${one},${other}`);
	const ingestion = readExport(new TextEncoder().encode([head, ...lines, ''].join('\n')), {
		uploadedMs: Date.UTC(2026, 4, 1),
		siteZone: 'UTC',
		journeyFromMs: null,
		journeyToMs: null,
		answers: {}
	});
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion));
	return ingestion.understanding;
}

const linesOf = ({ oddities }: Understanding, wanted: string): readonly number[] | undefined =>
	oddities.find(({ code }) => code === wanted)?.lines;

describe('a column in the other unit', () => {
	// F = C × 9/5 + 32: 4 °C is 39.2 °F, 5 °C is 41 °F, −40 is −40.
	const right = [
		['4.0', '39.2'],
		['5.0', '41.0'],
		['-40.0', '-40.0']
	] as const;

	it('is a check only, and agrees', () => {
		const found = understood('time,temp °C,temp °F', right);
		expect(found.channels[found.temperature]?.name).toBe('temp °C');
		expect(linesOf(found, 'other-unit-column')).toEqual([2]);
		expect(linesOf(found, 'twin-disagrees')).toBeUndefined();
	});

	it('is the same whichever stands first', () => {
		const found = understood(
			'time,temp °F,temp °C',
			right.map(([c, f]) => [f, c])
		);
		expect(found.channels[found.temperature]?.name).toBe('temp °C');
		expect(linesOf(found, 'twin-disagrees')).toBeUndefined();
	});

	it.each([
		// Half a tenth of a degree Celsius and half a tenth Fahrenheit (0.028 °C) may be rounded away.
		['within what both were rounded', '4.0', '39.3', false],
		['beyond it', '4.0', '39.5', true],
		['by whole degrees, each rounded to one', '4', '40', false],
		['by a degree more', '4', '42', true]
	])('that differs %s is told: %s °C, %s °F', (_, celsius, fahrenheit, isTold) => {
		const found = understood('time,temp °C,temp °F', [...right, [celsius, fahrenheit], ...right]);
		expect(linesOf(found, 'twin-disagrees')).toEqual(isTold ? [5] : undefined);
	});

	it('is not held against a value that is missing', () => {
		const found = understood('time,temp °C,temp °F', [...right, ['', '99.0'], ['4.0', '---']]);
		expect(linesOf(found, 'twin-disagrees')).toBeUndefined();
	});

	it('under another name is another sensor, and is asked about', () => {
		expect(() => understood('time,air °C,pulp °F', right)).toThrow(/temperature-column/);
	});
});
