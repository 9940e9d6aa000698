import { decodeBytes } from './decode/decode-bytes';
import { tableFromText } from './delimited/table-from-text';
import type { Ingestion, ReadContext } from './ingestion';
import { parseDocument } from './json/parse-document';
import { tableFromEpcis } from './json/epcis';
import type { JsonNode } from './json/json-node';
import { isSenml, tableFromSenml } from './json/senml';
import { tableFromJson } from './json/table-from-json';
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
	const table = tableFromText(text);
	return 'code' in table ? refused(table.code, table.line, table.found) : readTable(table, encoding, context);
}

function readJson(text: string, encoding: string, context: ReadContext): Ingestion {
	const document = parseDocument(text);
	if ('code' in document) return refused(document.code, document.line, document.found);
	const table = standardTable(document.root, text) ?? tableFromJson(document.root, text);
	if ('code' in table) return refused(table.code, table.line, table.found);
	const ingestion = readTable(table, encoding, context);
	if (ingestion.kind !== 'ok' || document.cutAtLine === null) return ingestion;
	const cut = { code: 'cut-short', count: 1, lines: [document.cutAtLine], detail: null } as const;
	return {
		...ingestion,
		understanding: { ...ingestion.understanding, oddities: [...ingestion.understanding.oddities, cut] }
	};
}

/** Open standards are read as they say, before anything is inferred. */
function standardTable(root: JsonNode, text: string): ReturnType<typeof tableFromSenml> | null {
	return isSenml(root)
		? tableFromSenml(root, text)
		: text.includes('sensorElementList')
			? tableFromEpcis(root, text)
			: null;
}
