import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Answers, Ingestion, ReadContext } from '../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../src/lib/domain/ingest/read-export';

/** One export with the instants that a careful person reads in it. */
interface ClockCase {
	name: string;
	text: string;
	site?: string;
	uploaded?: string;
	journey?: [string, string];
	answers?: { dateOrder?: string; start?: string; intervalSeconds?: number };
	/** UTC ms of every reading. */
	times?: number[];
	says?: string[];
	lacks?: string[];
	orderBy?: string;
	asks?: string;
	choices?: { value: string; times: number[] }[];
	refusal?: string;
}

// Source: clock-cases.json, written by make-clock-cases.py: Python's datetime and zoneinfo (IANA database), no part of
// the reader. The RFC 3339 §5.8 timestamps and the hours of R's beaver1 (Reynolds 1994) are among them.
const { cases } = JSON.parse(readFileSync('tests/accuracy/clock-cases.json', 'utf8')) as {
	cases: ClockCase[];
};

const codes: Readonly<Record<string, string>> = {
	dateOrder: 'date-order',
	intervalSeconds: 'interval'
};

function contextOf({ site, uploaded, journey, answers }: ClockCase, more: Answers = {}): ReadContext {
	const { dateOrder, start, ...rest } = answers ?? {};
	const order = dateOrder?.toLowerCase();
	const isOrder = order === 'dmy' || order === 'mdy' || order === 'ymd';
	const zoned = uploaded === undefined || /Z|[+-]\d\d:\d\d$/.test(uploaded) ? uploaded : `${uploaded}Z`;
	return {
		uploadedMs: Date.parse(zoned ?? '2026-04-20T12:00:00Z'),
		siteZone: site ?? 'Europe/Berlin',
		journeyFromMs: journey === undefined ? null : Date.parse(journey[0]),
		journeyToMs: journey === undefined ? null : Date.parse(journey[1]),
		answers: {
			...rest,
			...(isOrder ? { dateOrder: order } : {}),
			...(start === undefined ? {} : { startMs: Date.parse(start) }),
			...more
		}
	};
}

function read(one: ClockCase, more: Answers = {}): Ingestion {
	return readExport(new TextEncoder().encode(one.text), contextOf(one, more));
}

function timesOf(ingestion: Ingestion): number[] {
	if (ingestion.kind !== 'ok') throw new Error(JSON.stringify(ingestion).slice(0, 400));
	const { channels, temperature } = ingestion.understanding;
	return [...(channels[temperature]?.trace?.times ?? [])];
}

const codesOf = (ingestion: Ingestion): string[] =>
	ingestion.kind === 'ok' ? ingestion.understanding.oddities.map(({ code }) => code) : [];

const settled = cases.filter(({ times }) => times !== undefined);
const open = cases.filter(({ asks }) => asks !== undefined);
const refused = cases.filter(({ refusal }) => refusal !== undefined);

describe('the times of a file', () => {
	it('are tried in hundreds of forms', () => {
		expect([settled.length > 550, open.length > 30, refused.length > 3]).toEqual([true, true, true]);
	});

	it.each(settled.map((one) => [one.name, one] as const))('are read to the instant: %s', (_, one) => {
		const ingestion = read(one);
		expect(timesOf(ingestion)).toEqual(one.times);
		for (const code of one.says ?? []) expect(codesOf(ingestion)).toContain(code);
		for (const code of one.lacks ?? []) expect(codesOf(ingestion)).not.toContain(code);
		if (one.orderBy !== undefined)
			expect(ingestion).toMatchObject({ understanding: { layout: { dateOrderBy: one.orderBy } } });
	});

	it.each(open.map((one) => [one.name, one] as const))(
		'are asked about, and each answer settles it: %s',
		(_, one) => {
			const ingestion = read(one);
			const code = codes[one.asks ?? ''] ?? one.asks;
			expect(ingestion).toMatchObject({ kind: 'question', question: { code } });
			if (ingestion.kind !== 'question') return;
			const { choices } = ingestion.question;
			expect(choices.length).toBeGreaterThan(one.asks === 'start' ? 0 : 1);
			expect(choices.length).toBeLessThan(4);
			for (const { answer, firstMs, lastMs } of choices) {
				const answered = read(one, answer);
				if (answered.kind === 'question') expect(answered.question.code).not.toBe(code);
				else expect(answered).toMatchObject({ kind: 'ok', understanding: { firstMs, lastMs } });
			}
			for (const { value, times } of one.choices ?? []) {
				const chosen = choices.find(({ answer }) =>
					Object.values(answer).some((text) => String(text).toLowerCase() === value.toLowerCase())
				);
				expect(timesOf(read(one, chosen?.answer ?? {}))).toEqual(times);
			}
		}
	);

	it.each(refused.map((one) => [one.name, one] as const))('are refused: %s', (_, one) => {
		expect(read(one)).toMatchObject({ kind: 'refused', code: one.refusal });
	});
});
