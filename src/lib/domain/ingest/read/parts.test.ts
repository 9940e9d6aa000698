import { describe, expect, it } from 'vitest';
import type { Answers, Ingestion } from '../ingestion';
import { readExport } from '../read-export';

function read(text: string, answers: Answers = {}): Ingestion {
	return readExport(new TextEncoder().encode(text), {
		uploadedMs: Date.UTC(2026, 4, 1),
		siteZone: 'UTC',
		journeyFromMs: null,
		journeyToMs: null,
		answers
	});
}

/** A recording of three readings on a day, under heads of its own. */
const recording = (serial: string, day: number, celsius: number, head = 'time;temp °C'): string =>
	[`Serial;${serial}`, head, ...[0, 1, 2].map((i) => `2026-04-${day} 10:${i}0;${celsius}.${i}`), ''].join(
		'\n'
	);

const two = `${recording('A1', 13, 4)}\n${recording('B2', 14, 6)}`;

describe('several recordings in one file', () => {
	it('are asked about, each shown by its name, its ends and its figures', () => {
		const ingestion = read(two);
		if (ingestion.kind !== 'question') throw new Error(ingestion.kind);
		const { code, why, choices } = ingestion.question;
		expect([code, why]).toEqual(['part', 'several-parts']);
		expect(
			choices.map(({ answer, label, firstMs, lastCelsius }) => [answer.part, label, firstMs, lastCelsius])
		).toEqual([
			['first', 'A1', Date.UTC(2026, 3, 13, 10), 4.2],
			['second', 'B2', Date.UTC(2026, 3, 14, 10), 6.2]
		]);
	});

	it.each([
		['first', Date.UTC(2026, 3, 13, 10), 'A1'],
		['second', Date.UTC(2026, 3, 14, 10), 'B2']
	] as const)('are read by the answer %s, and by nothing of the other', (part, firstMs, serial) => {
		const ingestion = read(two, { part });
		if (ingestion.kind !== 'ok') throw new Error(ingestion.kind);
		const { understanding } = ingestion;
		expect([understanding.firstMs, understanding.readings, understanding.declared.serial]).toEqual([
			firstMs,
			3,
			serial
		]);
		expect(understanding.decisions).toContainEqual({
			field: 'part',
			value: part,
			because: 'answer',
			detail: serial
		});
	});

	it('beyond the third are not offered at once and can be named all the same', () => {
		const days = [11, 12, 13, 14, 15];
		const five = days.map((day, i) => recording(`L${i + 1}`, day, day)).join('\n');
		const ingestion = read(five);
		expect(ingestion.kind === 'question' && ingestion.question.choices.length).toBe(3);
		const fifth = read(five, { part: 'fifth' });
		expect(fifth.kind === 'ok' && fifth.understanding.firstMs).toBe(Date.UTC(2026, 3, 15, 10));
	});

	it('that do not all hold temperatures leave nothing to ask', () => {
		const ingestion = read(`${recording('A1', 13, 4)}\n${recording('B2', 14, 6, 'time;humidity %')}`);
		expect(ingestion.kind === 'ok' && ingestion.understanding.readings).toBe(3);
	});

	it('lead to the next question of the one that is chosen', () => {
		const open = `${recording('A1', 13, 4, 'time;temp')}\n${recording('B2', 14, 6, 'time;temp')}`;
		const ingestion = read(open, { part: 'second' });
		expect(ingestion.kind === 'question' && ingestion.question.code).toBe('unit');
	});

	it('under the same heads and of the same logger, one after the other, are one', () => {
		const ingestion = read(`${recording('A1', 13, 4)}\n${recording('A1', 14, 6)}`);
		expect(ingestion.kind === 'ok' && ingestion.understanding.readings).toBe(6);
	});
});
