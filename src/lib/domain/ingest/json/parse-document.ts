import type { RefusalCode } from '../ingestion';
import { outlineFault } from './json-outline';
import { parseJson, type JsonNode } from './json-node';
import { lineFinder } from './line-finder';

export type JsonDocument =
	| { readonly root: JsonNode; readonly cutAtLine: number | null }
	| { readonly code: RefusalCode; readonly line: number | null; readonly found: string | null };

// Record separators begin each value of a JSON text sequence (RFC 7464).
// eslint-disable-next-line no-control-regex
const space = /[\s,\ufeff\u001e]*/y;

/** A JSON text, or JSON Lines: values one after the other, taken as one list. A last line cut short is dropped, told. */
export function parseDocument(text: string): JsonDocument {
	const lineOf = lineFinder(text);
	const fault = outlineFault(text);
	if (fault !== null) return { code: fault.code, line: lineOf(fault.at), found: excerpt(text, fault.at) };
	const values: JsonNode[] = [];
	let cutAtLine: number | null = null;
	for (let at = skip(text, 0); at < text.length;) {
		const parsed = parseJson(text, at);
		if ('code' in parsed) {
			if (parsed.code === 'truncated' && values.length >= 2) {
				cutAtLine = lineOf(parsed.at);
				break;
			}
			return { code: parsed.code, line: lineOf(parsed.at), found: excerpt(text, parsed.at) };
		}
		values.push(parsed.node);
		at = skip(text, parsed.end);
	}
	const [only] = values;
	if (values.length === 1 && only !== undefined) return { root: only, cutAtLine };
	return { root: { type: 'array', at: 0, items: values }, cutAtLine };
}

function skip(text: string, from: number): number {
	space.lastIndex = from;
	return from + (space.exec(text)?.[0].length ?? 0);
}

function excerpt(text: string, at: number): string {
	return text
		.slice(Math.max(0, at - 20), at + 20)
		.replace(/\s+/g, ' ')
		.trim();
}
