import type { Content, ContentTable, CustomTableLayout, TableCell } from 'pdfmake/interfaces';
import { palette, sizePoints } from './palette';
import { label, sentence, words } from './type-styles';

interface Column {
	readonly head: string;
	readonly width: number | '*';
	readonly align?: 'left' | 'right';
}

interface Ledger {
	readonly title: string;
	readonly finding: string | null;
	readonly columns: readonly Column[];
	readonly rows: readonly (readonly Content[])[];
	readonly width: number;
	/** Rows of long prose may go on overleaf: kept whole they could be higher than a page, and would be cut. */
	readonly areRowsLong?: boolean;
}

const titleRows = 1;
const headRows = 2;

/** Ink opens the table under its title, a hairline parts the rows, ink closes it. */
function ruled(columns: readonly Column[]): CustomTableLayout {
	return {
		hLineWidth: (i, node) => (i === 0 ? 0 : i === titleRows ? 1.1 : i === node.table.body.length ? 0.8 : 0.6),
		hLineColor: (i, node) => (i === titleRows || i === node.table.body.length ? palette.ink : palette.rule),
		vLineWidth: () => 0,
		paddingLeft: (i) => padLeft(columns, i),
		paddingRight: (i) => padRight(columns, i),
		paddingTop: (i) => (i === 0 ? 0 : 3.2),
		paddingBottom: () => 3
	};
}

/** Words after a column of figures need air: the figures end where the words begin. */
function padLeft(columns: readonly Column[], i: number): number {
	if (i === 0) return 0;
	return columns[i - 1]?.align === 'right' && columns[i]?.align !== 'right' ? 9 : 3;
}

function padRight(columns: readonly Column[], i: number): number {
	return i === columns.length - 1 ? 0 : 3;
}

/** The open column gets what is left, as a number: left open, one long word would push the table off the page. */
function widthsOf({ columns, width }: Ledger): number[] {
	const taken = columns.reduce((sum, column, i) => {
		const own = column.width === '*' ? 0 : column.width;
		return sum + own + padLeft(columns, i) + padRight(columns, i);
	}, 0);
	return columns.map((column) => (column.width === '*' ? width - taken : column.width));
}

/** A section's title: name, and its finding in one line, so that the heads alone tell the story. */
export function sectionTitle(title: string, finding: string | null): Content {
	const name = words(title, { size: sizePoints.section, bold: true });
	if (finding === null) return name;
	return {
		columns: [
			{ ...name, width: 'auto' },
			{ ...sentence(finding, { size: 8.4 }), width: '*', margin: [0, 2, 0, 0] }
		],
		columnGap: 9
	};
}

/**
 * A ruled ledger. The title is a header row of the table: it never stands alone at the foot of a page, and
 * returns with the heads where a long table goes on.
 */
export function ledger(table: Ledger): ContentTable {
	const blanks = Array.from({ length: table.columns.length - 1 }, (): TableCell => ({ text: '' }));
	const title: TableCell[] = [
		{ stack: [sectionTitle(table.title, table.finding)], colSpan: table.columns.length },
		...blanks
	];
	const heads = table.columns.map((column): TableCell => ({
		...label(column.head, { alignment: column.align ?? 'left' }),
		verticalAlignment: 'bottom'
	}));
	const rows = table.rows.map((row) =>
		row.map((cell, i): TableCell => ({ stack: [cell], alignment: table.columns[i]?.align ?? 'left' }))
	);
	return {
		table: {
			headerRows: headRows,
			keepWithHeaderRows: table.areRowsLong === true ? 0 : 1,
			dontBreakRows: table.areRowsLong !== true,
			widths: widthsOf(table),
			body: [title, heads, ...rows]
		},
		layout: ruled(table.columns),
		margin: [0, 14, 0, 0]
	};
}

/** A line under a table. */
export function noteBelow(text: string): Content {
	return sentence(text, { margin: [0, 4, 0, 0], size: 8.4 });
}
