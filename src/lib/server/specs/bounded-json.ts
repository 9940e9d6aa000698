import { Refusal } from '../refusals';

/** A million readings with dates, milliseconds and blanks fit. */
const mostBytes = 60_000_000;
/** Readings lie three deep; the parser's time grows with depth. */
const deepest = 16;

const quote = 0x22;
const backslash = 0x5c;
const opening = new Set([0x5b, 0x7b]);
const closing = new Set([0x5d, 0x7d]);

/** Whether brackets ever nest deeper than `deepest`; text between quotes does not count. */
function isTooDeep(text: string): boolean {
	let depth = 0;
	let isQuoted = false;
	for (let at = 0; at < text.length; at++) {
		const code = text.charCodeAt(at);
		if (isQuoted) {
			if (code === backslash) at++;
			else if (code === quote) isQuoted = false;
		} else if (code === quote) isQuoted = true;
		else if (opening.has(code) && ++depth > deepest) return true;
		else if (closing.has(code)) depth--;
	}
	return false;
}

/** JSON of bounded size and depth. @throws Refusal naming what is wrong with it */
export function parseBoundedJson(text: string): unknown {
	if (text.length > mostBytes)
		throw new Refusal('too-large', 'The question is larger than 60 MB. Send fewer readings at a time.');
	if (isTooDeep(text)) throw new Refusal('invalid', `The JSON nests deeper than ${deepest} levels.`);
	try {
		return JSON.parse(text.replace(/^\uFEFF/, ''));
	} catch {
		throw new Refusal('invalid', 'The body is not JSON.');
	}
}
