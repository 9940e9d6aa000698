import { decodeBytes } from './decode/decode-bytes';
import { tableFromText } from './delimited/table-from-text';
import type { Ingestion, ReadContext, RefusalCode } from './ingestion';
import { parseDocument } from './json/parse-document';
import { tableFromEpcis } from './json/epcis';
import type { JsonNode } from './json/json-node';
import { isSenml, tableFromSenml } from './json/senml';
import { tableFromJson } from './json/table-from-json';
import type { Sections, Table } from './layout/table';
import { readSections } from './read/parts';
import { readTable } from './read/read-table';
import { refused } from './read/refusals';
import { textKindOf } from './sniff/text-kind';

/**
 * Reads a logger export: decode, sniff, layout, read. The same bytes and context give the same answer in every engine:
 * an understanding, one question, or a refusal; it never throws on a file.
 */
export function readExport(bytes: Uint8Array, context: ReadContext): Ingestion {
	const decoded = decodeBytes(bytes);
	if ('code' in decoded) return refused(decoded.code, null, decoded.found);
	return textKindOf(decoded.text) === 'json'
		? readJson(decoded.text, decoded.encoding, context)
		: readDelimited(decoded.text, decoded.encoding, context);
}

function readDelimited(text: string, encoding: string, context: ReadContext): Ingestion {
	return readFound(tableFromText(text), encoding, context);
}

function readJson(text: string, encoding: string, context: ReadContext): Ingestion {
	const document = parseDocument(text);
	if ('code' in document) return refused(document.code, document.line, document.found);
	const table = standardTable(document.root, text) ?? tableFromJson(document.root, text);
	const ingestion = readFound(table, encoding, context);
	if (ingestion.kind !== 'ok' || document.cutAtLine === null) return ingestion;
	const cut = { code: 'cut-short', count: 1, lines: [document.cutAtLine], detail: null } as const;
	return {
		...ingestion,
		understanding: { ...ingestion.understanding, oddities: [...ingestion.understanding.oddities, cut] }
	};
}

type Found =
	| Table
	| Sections
	| { readonly code: RefusalCode; readonly line: number | null; readonly found: string | null };

/** One table is read; of several sections one is, by answer or question. */
function readFound(found: Found, encoding: string, context: ReadContext): Ingestion {
	if ('code' in found) return refused(found.code, found.line, found.found);
	return 'tables' in found ? readSections(found, encoding, context) : readTable(found, encoding, context);
}

/** Open standards are read as they say, before anything is inferred. */
function standardTable(
	root: JsonNode,
	text: string
):
	Table | { readonly code: RefusalCode; readonly line: number | null; readonly found: string | null } | null {
	return isSenml(root)
		? tableFromSenml(root, text)
		: text.includes('sensorElementList')
			? tableFromEpcis(root, text)
			: null;
}
