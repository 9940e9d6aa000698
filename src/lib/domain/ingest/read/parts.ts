import { sectionParts, type Choice, type Ingestion, type ReadContext } from '../ingestion';
import type { Sections, Table } from '../layout/table';
import { celsiusFromScaled } from '../../units';
import { readTable } from './read-table';
import { refused } from './refusals';

const noDeclared = { serial: null, tripName: null, startMs: null, intervalMinutes: null, zone: null };

/** Choices offered at once; the rest of a longer file can still be named. */
const offered = 3;

/**
 * Reads one of several sections of a file: the one that is answered; the only one that can be read; else it is asked,
 * each section shown as it would be read.
 */
export function readSections({ tables, names }: Sections, encoding: string, context: ReadContext): Ingestion {
	const at = sectionParts.findIndex((part) => part === context.answers.part);
	const asked = at < 0 ? undefined : tables[at];
	if (asked !== undefined) return withDecision(readTable(asked, encoding, context), at, names, 'answer');
	const tried = tables.map((table) => readTable(table, encoding, context));
	const readable = tried.flatMap((ingestion, i) => (ingestion.kind === 'refused' ? [] : [i]));
	const [first] = readable;
	if (first === undefined) return tried[0] ?? refused('no-readings');
	if (readable.length === 1)
		return withDecision(tried[first] ?? refused('no-readings'), first, names, 'only-one');
	const choices = readable.slice(0, offered).map((i) => choiceOf(tried[i], i, names[i] ?? ''));
	const [shown] = readable.map((i) => tables[i]);
	return {
		kind: 'question',
		question: {
			code: 'part',
			subject: names.filter((name) => name !== '').join(', '),
			choices,
			rows: shown === undefined ? [] : firstRows(shown),
			rowsBetween: Math.max(0, (shown?.rowCount ?? 0) - 2),
			why: 'several-parts'
		},
		declared: noDeclared
	};
}

function firstRows(table: Table): Extract<Ingestion, { kind: 'question' }>['question']['rows'] {
	return [0, 1]
		.filter((row) => row < table.rowCount)
		.map((row) => ({ line: table.lineOf(row), text: table.textOf(row).slice(0, 200), marks: [] }));
}

function choiceOf(ingestion: Ingestion | undefined, at: number, name: string): Choice {
	const base = {
		answer: { part: sectionParts[at] ?? 'first' },
		label: name,
		evidence: [],
		evidenceHours: null
	};
	if (ingestion?.kind === 'ok') {
		const { firstMs, lastMs, channels, temperature } = ingestion.understanding;
		const trace = channels[temperature]?.trace;
		const celsius = (i: number): number | null =>
			trace === null || trace === undefined
				? null
				: celsiusFromScaled(trace.scaled[i] ?? 0, trace.decimals, trace.unit);
		return {
			...base,
			firstMs,
			lastMs,
			firstCelsius: celsius(0),
			lastCelsius: celsius((trace?.times.length ?? 1) - 1)
		};
	}
	const choice = ingestion?.kind === 'question' ? ingestion.question.choices[0] : undefined;
	return {
		...base,
		firstMs: choice?.firstMs ?? null,
		lastMs: choice?.lastMs ?? null,
		firstCelsius: choice?.firstCelsius ?? null,
		lastCelsius: choice?.lastCelsius ?? null
	};
}

function withDecision(
	ingestion: Ingestion,
	at: number,
	names: readonly string[],
	because: 'answer' | 'only-one'
): Ingestion {
	if (ingestion.kind !== 'ok') return ingestion;
	const { understanding } = ingestion;
	const made = {
		field: 'part',
		value: sectionParts[at] ?? String(at + 1),
		because,
		detail: names[at] || null
	} as const;
	return { ...ingestion, understanding: { ...understanding, decisions: [...understanding.decisions, made] } };
}
