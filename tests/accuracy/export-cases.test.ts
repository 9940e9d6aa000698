import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { inspectAnswers, type InspectAnswer } from '../../src/lib/schemas/inspect';
import { inspect } from '../../src/lib/server/reads/inspect-export';

/** Written by make-export-cases.py, which counts the figures before it writes the file. */
interface Case {
	readonly name: string;
	readonly text: string;
	readonly answers: Record<string, string>;
	/** Field of the question that comes before any answer; null where none may come. */
	readonly asked: string | null;
	readonly choices: readonly string[];
	readonly site: string;
	readonly says: readonly string[];
	readonly lacks: readonly string[];
	readonly channels: readonly (readonly [name: string, quantity: string])[];
	readonly figures: Record<string, unknown> & { readonly meanCelsius: number };
}

const cases = JSON.parse(readFileSync('tests/accuracy/export-cases.json', 'utf8')) as Case[];
const nowMs = Date.parse('2026-05-01T00:00:00Z');

function read({ text, site }: Case, given: Record<string, string>): InspectAnswer {
	const bytes = new TextEncoder().encode(text);
	const { answer, faults } = inspect({ bytes, answers: inspectAnswers.parse(given), siteZone: site, nowMs });
	expect(faults).toEqual({});
	return answer;
}

describe('an export', () => {
	it.each(cases.map((one) => [one.name, one] as const))('%s', (_, one) => {
		if (one.asked !== null) {
			const [question] = read(one, {}).questions;
			expect(question?.field).toBe(one.asked);
			const offered = question?.choices.map(({ value }) => value) ?? [];
			expect(offered).toEqual(expect.arrayContaining([...one.choices]));
			expect([2, 3]).toContain(Math.max(2, offered.length));
		}
		const { channels, warnings } = read(one, one.answers);
		const { meanCelsius, ...exact } = one.figures;
		expect(channels.find(({ primary }) => primary)).toMatchObject(exact);
		expect(channels[0]?.meanCelsius).toBeCloseTo(meanCelsius, 9);
		const codes = warnings.map(({ code }) => code);
		expect(codes).toEqual(expect.arrayContaining([...one.says]));
		for (const code of one.lacks) expect(codes).not.toContain(code);
		if (one.channels.length > 0)
			expect(channels.map(({ name, quantity }) => [name, quantity])).toEqual(one.channels);
	});

	it('is there in all of them under a name of its own', () => {
		expect(new Set(cases.map(({ name }) => name)).size).toBe(cases.length);
		expect(cases.length).toBeGreaterThan(300);
	});
});
