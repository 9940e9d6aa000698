import { maxJsonDepth, maxJsonValues } from '../bounds';

export type OutlineFault = 'too-deep' | 'too-many-readings' | 'truncated';

/** Texts below this are parsed at once: the whole grammar names a fault better, and costs little. */
const longChars = 4 * 1024 * 1024;

const opens = (code: number): boolean => code === 91 || code === 123;
const closes = (code: number): boolean => code === 93 || code === 125;

/** Place behind the string that opens at `from`; the text's end where it never closes. */
function afterString(text: string, from: number): number {
	for (let at = text.indexOf('"', from + 1); at >= 0; at = text.indexOf('"', at + 1)) {
		let slashes = 0;
		while (text.charCodeAt(at - 1 - slashes) === 92) slashes++;
		if (slashes % 2 === 0) return at + 1;
	}
	return text.length;
}

/**
 * Looks at the brackets and commas of a long JSON text and keeps nothing: what is too deep, holds more values than any
 * reading needs, or never ends is told before a value of it is held. Several texts in a row may end in a cut one.
 */
export function outlineFault(text: string): { code: OutlineFault; at: number } | null {
	if (text.length < longChars) return null;
	let [depth, values, whole] = [0, 0, 0];
	for (let i = 0; i < text.length; i++) {
		const code = text.charCodeAt(i);
		if (code === 34) i = afterString(text, i) - 1;
		else if (opens(code)) {
			values++;
			if (++depth > maxJsonDepth + 1) return { code: 'too-deep', at: i };
		} else if (closes(code)) {
			if (--depth === 0) whole++;
		} else if (code === 44 || code === 58) values++;
		if (values > maxJsonValues) return { code: 'too-many-readings', at: i };
	}
	return depth > 0 && whole < 2 ? { code: 'truncated', at: text.length } : null;
}
