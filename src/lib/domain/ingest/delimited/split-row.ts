/** `space` is one or more spaces, `spaces` two or more (a cell may then hold a single one). */
export const delimiters = ['\t', ';', '|', ',', '^', '~', 'spaces', 'space'] as const;
export type Delimiter = (typeof delimiters)[number];

const quote = 34;

/** Cells of one row. Quoted cells may hold delimiters, line breaks and doubled quotes (RFC 4180 §2). */
export function splitRow(text: string, delimiter: Delimiter): string[] {
	if (delimiter === 'spaces' || delimiter === 'space') {
		const bare = text.trim();
		if (bare === '') return [''];
		return bare.split(delimiter === 'space' ? /\s+/ : /\s{2,}|\t/);
	}
	if (!text.includes('"')) return text.split(delimiter);
	return splitQuoted(text, delimiter);
}

function splitQuoted(text: string, delimiter: string): string[] {
	const cells: string[] = [];
	let i = 0;
	for (;;) {
		const end = cellEnd(text, i, delimiter);
		cells.push(unquoted(text.slice(i, end)));
		if (end >= text.length) return cells;
		i = end + 1;
	}
}

/** Where a quote may open: behind spaces, and behind the `=` with which a spreadsheet is told to leave text alone. */
function quoteStart(text: string, from: number): number {
	let i = from;
	while (text.charCodeAt(i) === 32) i++;
	return text.charCodeAt(i) === 61 && text.charCodeAt(i + 1) === quote ? i + 1 : i;
}

/** Where the cell that starts at `from` ends: at the next delimiter outside quotes. */
function cellEnd(text: string, from: number, delimiter: string): number {
	let i = quoteStart(text, from);
	if (text.charCodeAt(i) === quote) {
		for (i++; i < text.length; i++) {
			if (text.charCodeAt(i) !== quote) continue;
			if (text.charCodeAt(i + 1) === quote) i++;
			else break;
		}
	} else i = from;
	const end = text.indexOf(delimiter, i);
	return end < 0 ? text.length : end;
}

function unquoted(cell: string): string {
	const bare = cell.trim().replace(/^=(?=")/, '');
	if (bare.length < 2 || bare.charCodeAt(0) !== quote || bare.charCodeAt(bare.length - 1) !== quote)
		return cell;
	return bare.slice(1, -1).replaceAll('""', '"');
}

/** Whether a quoted cell of this row is still open at its end, so that the next line belongs to it. */
export function hasOpenQuote(text: string, delimiter: Delimiter): boolean {
	if (delimiter === 'spaces' || delimiter === 'space' || !text.includes('"')) return false;
	let i = 0;
	while (i <= text.length) {
		const start = quoteStart(text, i);
		const end = cellEnd(text, i, delimiter);
		if (text.charCodeAt(start) === quote && end >= text.length) return !closes(text, start);
		i = end + 1;
	}
	return false;
}

function closes(text: string, from: number): boolean {
	for (let i = from + 1; i < text.length; i++) {
		if (text.charCodeAt(i) !== quote) continue;
		if (text.charCodeAt(i + 1) === quote) i++;
		else return true;
	}
	return false;
}
