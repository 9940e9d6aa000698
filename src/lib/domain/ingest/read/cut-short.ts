import type { Table } from '../layout/table';
import type { Gathered } from './gathered';

/**
 * A last line without the line end that all others have may have been cut inside its figure: it has when it shows
 * fewer decimals or characters of time than every row before it. Its reading is then left out.
 */
export function isLastRowCut(table: Table, gathered: Gathered): boolean {
	const { count } = gathered;
	if (!table.isUnterminated || count < 4 || gathered.footerLines.length > 0) return false;
	const last = count - 1;
	const cells = table.cells(gathered.rows[last] ?? 0);
	const above = table.cells(gathered.rows[last - 1] ?? 0);
	if (cells.length < above.length) return true;
	return gathered.values.some(({ column, decimals, isMissing }) => {
		// Nothing, or a figure up to its decimal sign, below a row that has one.
		if (isMissing[last] !== 0)
			return isMissing[last - 1] === 0 && /^\s*[-+]?\d*[.,]?$/.test(cells[column] ?? '');
		const usual = decimals[0] ?? 0;
		for (let i = 0; i < last; i++) if (isMissing[i] === 0 && decimals[i] !== usual) return false;
		return (decimals[last] ?? 0) < usual;
	});
}

/** The same rows without the last one, which is told as cut short. */
export function withoutCutRow(table: Table, gathered: Gathered): Gathered {
	const lastFooter = gathered.footerLines.at(-1);
	const isCutFooter = table.isUnterminated && gathered.footerLines.length === 1 && lastFooter !== undefined;
	// A lone unfinished line after the readings is no footer but the reading that was being written.
	if (isCutFooter && looksLikeStart(table, gathered)) {
		return {
			...gathered,
			footerLines: [],
			faults: [...gathered.faults, { code: 'cut-short', line: lastFooter }]
		};
	}
	if (!isLastRowCut(table, gathered)) return gathered;
	const line = gathered.lines[gathered.count - 1] ?? 0;
	return {
		...gathered,
		count: gathered.count - 1,
		faults: [...gathered.faults, { code: 'cut-short', line }]
	};
}

function looksLikeStart(table: Table, gathered: Gathered): boolean {
	const text = table.textOf(gathered.footerFrom).trim();
	const above = table.textOf(gathered.rows[gathered.count - 1] ?? 0).trim();
	// Digits stand where digits stood in the row above, as far as the line got.
	const shape = (line: string): string => line.replace(/\d/g, '0');
	return text.length > 0 && text.length < above.length && shape(above).startsWith(shape(text));
}
