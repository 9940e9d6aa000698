import type { Entry } from './table';

const pair = /^\s*[#*/;"']*\s*([^:：=;\t|]{1,60}?)\s*(?::(?!\d\d\b)|：|=|;|\t|\|)\s*(.*?)\s*[;,|"\t]*$/;

/** `Interval (s),600` above a table with another delimiter. */
const commaPair = /^\s*([^,]{1,60}?)\s*,\s*([^,]*?\d[^,]*?)\s*$/;

/** Reads one line outside the readings as key and value; null when it is neither. */
export function entryOf(line: string, cells: readonly string[], lineNumber: number): Entry | null {
	const filled = cells.map((cell) => cell.trim()).filter((cell) => cell !== '');
	const isWords = /^[^;,|\t]*$/.test(line) && /^\s*\S+(?: \S+)*?:\s/.test(line);
	if (
		filled.length >= 2 &&
		!isWords &&
		!(filled[0] ?? '')
			.replace(/h{1,2}:m{2}(?::s{2})?/gi, '')
			.slice(0, -1)
			.includes(':')
	) {
		const key = (filled[0] ?? '').replace(/[:=]\s*$/, '').replace(/^[#*/'"\s]+/, '');
		const value = filled
			.slice(1)
			.join(' ')
			.replace(/^[:=]\s*/, '');
		if (/\p{L}/u.test(key)) return { key, value, line: lineNumber };
	}
	const match = pair.exec(line) ?? commaPair.exec(line);
	if (match === null || !/\p{L}/u.test(match[1] ?? '')) return null;
	return {
		key: (match[1] ?? '').replace(/^["']|["']$/g, ''),
		value: (match[2] ?? '').replace(/^["']|["']$/g, ''),
		line: lineNumber
	};
}
