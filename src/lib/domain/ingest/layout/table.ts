import type { Decision, Oddity } from '../ingestion';

/** A key and value that stood outside the readings: preamble line, footer line, JSON metadata. */
export interface Entry {
	readonly key: string;
	readonly value: string;
	readonly line: number;
}

/** The text that rows are cut from, for a reader that needs no string of its own for each cell. */
export interface RowText {
	readonly text: string;
	/** Character code of the delimiter: one character, outside quotes. */
	readonly delimiter: number;
	startOf(row: number): number;
	endOf(row: number): number;
}

/** Readings as rows of cells, whatever the file was written in. Rows are split when asked for, not kept. */
export interface Table {
	readonly kind: 'delimited' | 'json' | 'senml' | 'epcis';
	readonly delimiter: string | null;
	/** Column heads; JSON keys; empty when the file has none. */
	readonly header: readonly string[];
	readonly headerLine: number | null;
	/** The heads as the file has them, where those above were made of what stands in its rows (names of sensors). */
	readonly makeHeader?: readonly string[];
	/** Units by column, from a row of their own. */
	readonly units: readonly string[];
	readonly entries: readonly Entry[];
	/** Text outside the readings, for facts that are no key and value. */
	readonly freeText: string;
	readonly rowCount: number;
	cells(row: number): readonly string[];
	/** 1-based line in the file. */
	lineOf(row: number): number;
	/** The row as it stands in the file, for showing. */
	textOf(row: number): string;
	/** Null or absent where rows are no stretches of text with one delimiter. */
	readonly rowText?: RowText | null;
	/** True when the last row lacks the line end that all others have. */
	readonly isUnterminated: boolean;
	/** Blank cells are moments at which a channel was not due, not values that are missing. */
	readonly isSparse?: boolean;
	/** What was decided or seen while the table was found, told as it stands. */
	readonly decisions?: readonly Decision[];
	readonly oddities?: readonly Oddity[];
}

/** Several sections of one file, each a recording of its own: one is to be read. */
export interface Sections {
	readonly tables: readonly Table[];
	/** What each is called in the file; empty where it has no name. */
	readonly names: readonly string[];
}
